import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

export const decisionQuery = (id: string) =>
  queryOptions({
    queryKey: keys.decisions.one(id),
    queryFn: ({ signal }) => call(api.GET('/api/decisions/{id}', { params: { path: { id } }, signal })),
  });
