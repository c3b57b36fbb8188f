import { infiniteQueryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

const PAGE_SIZE = 100;

/** Who saved the case when, newest first. */
export const versionsQuery = (id: string) =>
  infiniteQueryOptions({
    queryKey: keys.cases.versions(id),
    queryFn: ({ pageParam, signal }) =>
      call(api.GET('/api/cases/{id}/versions', { params: { path: { id }, query: { limit: PAGE_SIZE, cursor: pageParam } }, signal })),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.nextCursor ?? undefined,
  });
