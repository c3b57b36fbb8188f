import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

export const membersQuery = (id: string) =>
  queryOptions({
    queryKey: keys.conferences.members(id),
    queryFn: ({ signal }) => call(api.GET('/api/conferences/{id}/members', { params: { path: { id } }, signal })),
  });
