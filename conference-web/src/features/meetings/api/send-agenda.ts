import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { takeMeeting } from './take-meeting';

export function useSendAgenda(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (baseVersion: number) => call(api.POST('/api/meetings/{id}/agenda/send', { params: { path: { id } }, body: { baseVersion } })),
    onSuccess: ({ meeting }) => takeMeeting(client, meeting),
  });
}
