import type { OutboxState } from '@kerfside/calc/vocabulary/mail.js';
import { infiniteQueryOptions, keepPreviousData } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

export const mailQuery = (filter: { state?: OutboxState }) =>
  infiniteQueryOptions({
    queryKey: keys.mail(filter),
    queryFn: ({ pageParam, signal }) => call(api.GET('/api/mail', { params: { query: { ...filter, limit: 50, cursor: pageParam } }, signal })),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.nextCursor ?? undefined,
    placeholderData: keepPreviousData,
    // mail moves without an event of its own
    refetchInterval: 15_000,
    staleTime: 0,
  });
