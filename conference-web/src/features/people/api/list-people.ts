import { infiniteQueryOptions, keepPreviousData } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

export const peopleQuery = (filter: { query?: string }) =>
  infiniteQueryOptions({
    queryKey: keys.people.list(filter),
    queryFn: ({ pageParam, signal }) => call(api.GET('/api/people', { params: { query: { ...filter, limit: 50, cursor: pageParam } }, signal })),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.nextCursor ?? undefined,
    placeholderData: keepPreviousData,
  });
