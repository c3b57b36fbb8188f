import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

export type Outcome = Schemas['OutcomeDto'];

/** All versions, newest first. */
export const outcomesQuery = (caseId: string) =>
  queryOptions({
    queryKey: keys.cases.outcomes(caseId),
    queryFn: ({ signal }) => call(api.GET('/api/cases/{caseId}/outcomes', { params: { path: { caseId } }, signal })),
  });
