import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

/** The server ends the other sessions with it. */
export function useChangePassword() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Schemas['ChangePasswordDto']) => call(api.POST('/api/auth/password', { body })),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.sessions }),
  });
}
