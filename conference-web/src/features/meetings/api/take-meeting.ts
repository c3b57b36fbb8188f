import { hashKey, type QueryClient } from '@tanstack/react-query';
import { keys } from '@/lib/query-keys';
import type { Meeting } from './get-meeting';

/** Shows the meeting that an answer brought, and asks again for the lists that it stands in. */
export function takeMeeting(client: QueryClient, meeting: Meeting): Promise<void> {
  const one = keys.meetings.one(meeting.id);
  client.setQueryData(one, meeting);
  return client.invalidateQueries({ queryKey: keys.meetings.everything, predicate: ({ queryHash }) => queryHash !== hashKey(one) });
}
