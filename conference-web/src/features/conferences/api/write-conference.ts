import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

export function useCreateConference() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Schemas['CreateConferenceDto']) => call(api.POST('/api/conferences', { body })),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.conferences.everything }),
  });
}

export function useUpdateConference(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Schemas['UpdateConferenceDto']) => call(api.PATCH('/api/conferences/{id}', { params: { path: { id } }, body })),
    // a stale version is refused: what is there now must be fetched for the second try too
    onSettled: () => client.invalidateQueries({ queryKey: keys.conferences.everything }),
  });
}
