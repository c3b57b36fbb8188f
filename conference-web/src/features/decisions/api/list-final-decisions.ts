import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

export type FinalDecision = Schemas['FinalDecisionDto'];

/** What the treating surgeon said, newest first. */
export const finalDecisionsQuery = (caseId: string) =>
  queryOptions({
    queryKey: keys.cases.finalDecisions(caseId),
    queryFn: ({ signal }) => call(api.GET('/api/cases/{caseId}/final-decisions', { params: { path: { caseId } }, signal })),
  });
