import type { QueryClient, QueryKey } from '@tanstack/react-query';
import type { LiveEventKind } from '@kerfside/calc/vocabulary/events.js';
import { keys } from '../query-keys';

export interface LiveEvent {
  id: string;
  kind: LiveEventKind;
  caseId: string | null;
  meetingId: string | null;
}

/** What of the page's data an event makes old. */
export function staleKeys({ kind, caseId, meetingId }: LiveEvent): QueryKey[] {
  const ofCase = (...of: ((id: string) => QueryKey)[]) => (caseId ? of.map((key) => key(caseId)) : []);
  const { cases, meetings } = keys;
  switch (kind) {
    case 'case-changed':
      return [cases.lists, meetings.everything, ...ofCase(cases.all)];
    case 'images-changed':
      return ofCase(cases.one, cases.images, cases.readiness);
    case 'remarks-changed':
      return [cases.lists, keys.unread, ...ofCase(cases.threads)];
    case 'rating-changed':
      return [cases.lists, ...ofCase(cases.rounds, cases.one)];
    case 'meeting-changed':
      return [keys.meetings.everything, ...(meetingId ? [meetings.one(meetingId)] : []), ...ofCase(cases.one)];
    case 'decision-changed':
      return [cases.lists, keys.decisions.everything, meetings.everything, ...ofCase(cases.all)];
    case 'membership-changed':
      return [keys.me, keys.conferences.everything, cases.everything, meetings.everything];
  }
}

export function invalidateFor(client: QueryClient, event: LiveEvent): void {
  for (const queryKey of staleKeys(event) ?? []) void client.invalidateQueries({ queryKey });
}
