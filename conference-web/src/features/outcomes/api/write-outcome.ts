import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

/** Reports the outcome; a later one is an amendment. */
export function useWriteOutcome(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Schemas['WriteOutcomeDto']) => call(api.POST('/api/cases/{caseId}/outcomes', { params: { path: { caseId } }, body })),
    onSuccess: () => Promise.all([keys.cases.all(caseId), keys.cases.lists].map((queryKey) => client.invalidateQueries({ queryKey }))),
  });
}
