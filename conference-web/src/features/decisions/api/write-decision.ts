import { type QueryClient, useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';
import { type Decision, decisionsOfCaseQuery } from './list-decisions-of-case';

/** Puts a decision's newest state in its place among the versions of the case. */
export function keepDecision(client: QueryClient, decision: Decision): void {
  client.setQueryData(decisionsOfCaseQuery(decision.caseId).queryKey, (list) =>
    list && {
      items: list.items.some(({ id }) => id === decision.id)
        ? list.items.map((other) => (other.id === decision.id ? decision : other))
        : [decision, ...list.items],
    },
  );
}

/** Saves the draft; begins one where there is none. Not a hook: the draft is saved also while its page is left. */
export const writeDecision = (caseId: string, body: Schemas['WriteDecisionDto']) =>
  call(api.PUT('/api/cases/{caseId}/decision', { params: { path: { caseId } }, body }));

/** Begins the draft; the server chooses the option that the last round rates highest to start with. */
export function useBeginDecision(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => writeDecision(caseId, { dissent: [] }),
    onSuccess: (decision) => keepDecision(client, decision),
    // somebody else may have begun it
    onError: () => client.invalidateQueries({ queryKey: keys.cases.decisions(caseId) }),
  });
}
