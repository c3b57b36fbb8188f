import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

export const sessionsQuery = () =>
  queryOptions({
    queryKey: keys.sessions,
    queryFn: ({ signal }) => call(api.GET('/api/auth/sessions', { signal })),
    staleTime: 0,
  });
