import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';
import { takeMeeting } from './take-meeting';

/** The whole agenda at once; refused where another version was saved meanwhile. */
export function useSetAgenda(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Schemas['SetAgendaDto']) => call(api.PUT('/api/meetings/{id}/agenda', { params: { path: { id } }, body })),
    onSuccess: async (meeting) => {
      await takeMeeting(client, meeting);
      void client.invalidateQueries({ queryKey: keys.cases.lists });
    },
    // a refusal may mean that the agenda is another one by now
    onError: () => client.invalidateQueries({ queryKey: keys.meetings.one(id) }),
  });
}
