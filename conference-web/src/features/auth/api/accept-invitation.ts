import { useMutation } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { useSession } from '@/lib/auth/session';

/** Signs the person in at once. */
export function useAcceptInvitation(token: string) {
  const { takeToken } = useSession();
  return useMutation({
    mutationFn: async (body: Schemas['AcceptInvitationDto']) =>
      takeToken(await call(api.POST('/api/auth/invitations/{token}/accept', { params: { path: { token } }, body }))),
  });
}
