import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

export function useWriteFinalDecision(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Schemas['WriteFinalDecisionDto']) =>
      call(api.POST('/api/cases/{caseId}/final-decisions', { params: { path: { caseId } }, body })),
    onSuccess: () => Promise.all([keys.cases.all(caseId), keys.cases.lists].map((queryKey) => client.invalidateQueries({ queryKey }))),
  });
}
