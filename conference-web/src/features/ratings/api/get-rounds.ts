import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

export type Round = Schemas['RoundDto'];
export type Ballot = Schemas['BallotDto'];
export type OptionFigures = Schemas['OptionFiguresDto'];

/** Both rounds, with the panel's figures where they may be seen. */
export const roundsQuery = (caseId: string) =>
  queryOptions({
    queryKey: keys.cases.rounds(caseId),
    queryFn: ({ signal }) => call(api.GET('/api/cases/{caseId}/rounds', { params: { path: { caseId } }, signal })),
  });
