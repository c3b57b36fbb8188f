import { type QueryClient, useMutation, useQueryClient } from '@tanstack/react-query';
import type { Role } from '@kerfside/calc/vocabulary/people.js';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

interface Member {
  conferenceId: string;
  personId: string;
}

const membershipsChanged = (client: QueryClient) =>
  Promise.all([keys.conferences.everything, keys.people.everything, keys.me].map((queryKey) => client.invalidateQueries({ queryKey })));

export function useSetMember() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ conferenceId: id, personId, role }: Member & { role: Role }) =>
      call(api.PUT('/api/conferences/{id}/members/{personId}', { params: { path: { id, personId } }, body: { role } })),
    onSuccess: () => membershipsChanged(client),
  });
}

export function useRemoveMember() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ conferenceId: id, personId }: Member) =>
      call(api.DELETE('/api/conferences/{id}/members/{personId}', { params: { path: { id, personId } } })),
    onSuccess: () => membershipsChanged(client),
  });
}
