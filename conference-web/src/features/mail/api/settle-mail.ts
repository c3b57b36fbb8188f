import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

export function useRetryMail() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => call(api.POST('/api/mail/{id}/retry', { params: { path: { id: Number(id) } } })),
    onSettled: () => client.invalidateQueries({ queryKey: keys.mails }),
  });
}

export function useDropMail() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id, reason }: { id: string; reason: string }) =>
      call(api.POST('/api/mail/{id}/drop', { params: { path: { id: Number(id) } }, body: { reason } })),
    onSettled: () => client.invalidateQueries({ queryKey: keys.mails }),
  });
}
