import { infiniteQueryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

/** The signed decisions of a conference, newest number first. */
export const decisionListQuery = (conferenceId: string) =>
  infiniteQueryOptions({
    queryKey: keys.decisions.list(conferenceId),
    queryFn: ({ pageParam, signal }) =>
      call(
        api.GET('/api/conferences/{conferenceId}/decisions', {
          params: { path: { conferenceId }, query: { limit: 30, cursor: pageParam } },
          signal,
        }),
      ),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.nextCursor ?? undefined,
  });
