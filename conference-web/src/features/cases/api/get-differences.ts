import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

/** What changed from one version to a later one, field by field in words. */
export const differencesQuery = (id: string, version: number, since: number) =>
  queryOptions({
    queryKey: keys.cases.differences(id, version, since),
    queryFn: ({ signal }) =>
      call(api.GET('/api/cases/{id}/versions/{version}/differences', { params: { path: { id, version }, query: { since } }, signal })),
    // two saved versions never change
    staleTime: Infinity,
  });
