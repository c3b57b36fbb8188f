import { infiniteQueryOptions, keepPreviousData } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

export interface MeetingListFilter {
  when: 'upcoming' | 'past';
  /** All conferences one belongs to when left out. */
  conferenceId?: string;
}

const PAGE_SIZE = 10;

export const meetingListQuery = ({ when, conferenceId }: MeetingListFilter) =>
  infiniteQueryOptions({
    queryKey: keys.meetings.list({ when, conferenceId }),
    queryFn: ({ pageParam, signal }) => {
      const query = { when, limit: PAGE_SIZE, cursor: pageParam };
      return conferenceId
        ? call(api.GET('/api/conferences/{conferenceId}/meetings', { params: { path: { conferenceId }, query }, signal }))
        : call(api.GET('/api/meetings', { params: { query }, signal }));
    },
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.nextCursor ?? undefined,
    placeholderData: keepPreviousData,
  });
