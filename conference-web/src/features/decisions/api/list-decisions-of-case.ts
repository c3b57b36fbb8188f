import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

export type Decision = Schemas['DecisionDto'];
export type DecisionContent = Schemas['DecisionContentDto'];

/** All versions, newest first; a draft only for who may write it. */
export const decisionsOfCaseQuery = (caseId: string) =>
  queryOptions({
    queryKey: keys.cases.decisions(caseId),
    queryFn: ({ signal }) => call(api.GET('/api/cases/{caseId}/decisions', { params: { path: { caseId } }, signal })),
  });
