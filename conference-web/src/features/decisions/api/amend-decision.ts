import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

/** Begins a new version that will replace the signed one. */
export function useAmendDecision(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id, reason }: { id: string; reason: string }) => call(api.POST('/api/decisions/{id}/amend', { params: { path: { id } }, body: { reason } })),
    onSettled: () => client.invalidateQueries({ queryKey: keys.cases.decisions(caseId) }),
  });
}
