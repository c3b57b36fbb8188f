import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

/** Says that a question is answered, or opens it again. */
export function useAnswerThread(caseId: string, threadId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (answered: boolean) => call(api.PUT('/api/threads/{id}/answered', { params: { path: { id: threadId } }, body: { answered } })),
    onSuccess: () =>
      Promise.all([client.invalidateQueries({ queryKey: keys.cases.threads(caseId) }), client.invalidateQueries({ queryKey: keys.cases.lists })]),
  });
}
