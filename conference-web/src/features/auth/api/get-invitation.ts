import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

export const invitationQuery = (token: string) =>
  queryOptions({
    queryKey: keys.invitation(token),
    queryFn: ({ signal }) => call(api.GET('/api/auth/invitations/{token}', { params: { path: { token } }, signal })),
    staleTime: Infinity,
  });
