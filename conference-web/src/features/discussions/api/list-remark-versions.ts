import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

/** The texts that a remark had, newest first. */
export const remarkVersionsQuery = (id: string) =>
  queryOptions({
    queryKey: keys.remarkVersions(id),
    queryFn: ({ signal }) => call(api.GET('/api/remarks/{id}/versions', { params: { path: { id } }, signal })),
  });
