import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

/** What looks like an identifier in the text. For the presenter and the coordinator only. */
export const identifiersQuery = (id: string) =>
  queryOptions({
    queryKey: keys.cases.identifiers(id),
    queryFn: ({ signal }) => call(api.GET('/api/cases/{id}/identifiers', { params: { path: { id } }, signal })),
  });
