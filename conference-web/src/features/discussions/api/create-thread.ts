import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

export function useCreateThread(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Schemas['CreateThreadDto']) => call(api.POST('/api/cases/{caseId}/threads', { params: { path: { caseId } }, body })),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.cases.threads(caseId) }),
  });
}
