import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

export function useSignDecision(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Schemas['SignDecisionDto']) => call(api.POST('/api/cases/{caseId}/decision/sign', { params: { path: { caseId } }, body })),
    // after a refusal too: it may have been signed by the try before, whose answer got lost
    onSettled: () =>
      Promise.all(
        [keys.cases.all(caseId), keys.cases.lists, keys.decisions.everything, keys.meetings.everything].map((queryKey) => client.invalidateQueries({ queryKey })),
      ),
  });
}
