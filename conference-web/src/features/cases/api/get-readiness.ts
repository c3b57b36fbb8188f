import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

export const readinessQuery = (id: string) =>
  queryOptions({
    queryKey: keys.cases.readiness(id),
    queryFn: ({ signal }) => call(api.GET('/api/cases/{id}/readiness', { params: { path: { id } }, signal })),
  });
