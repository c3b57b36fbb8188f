import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

export function useCreateRemark(caseId: string, threadId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Schemas['CreateRemarkDto']) => call(api.POST('/api/threads/{id}/remarks', { params: { path: { id: threadId } }, body })),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.cases.threads(caseId) }),
  });
}
