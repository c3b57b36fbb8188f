import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

export const caseQuery = (id: string) =>
  queryOptions({
    queryKey: keys.cases.one(id),
    queryFn: ({ signal }) => call(api.GET('/api/cases/{id}', { params: { path: { id } }, signal })),
  });
