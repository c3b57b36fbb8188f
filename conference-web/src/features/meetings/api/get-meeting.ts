import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

export type Meeting = Schemas['MeetingDto'];
export type AgendaItem = Schemas['AgendaItemDto'];

export const meetingQuery = (id: string) =>
  queryOptions({
    queryKey: keys.meetings.one(id),
    queryFn: ({ signal }) => call(api.GET('/api/meetings/{id}', { params: { path: { id } }, signal })),
  });
