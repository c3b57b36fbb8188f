import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

/** Open cases that could be listed, with what each lacks. */
export const listableCasesQuery = (id: string) =>
  queryOptions({
    queryKey: keys.meetings.listable(id),
    queryFn: ({ signal }) => call(api.GET('/api/meetings/{id}/listable-cases', { params: { path: { id } }, signal })),
  });
