import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

export function useInvitePerson() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Schemas['InvitePersonDto']) => call(api.POST('/api/people/invitations', { body })),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.people.everything }),
  });
}
