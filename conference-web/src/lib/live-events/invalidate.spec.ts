import { LIVE_EVENT_KINDS } from '@kerfside/calc/vocabulary/events.js';
import { QueryClient } from '@tanstack/react-query';
import { keys } from '../query-keys';
import { invalidateFor, staleKeys } from './invalidate';

it('makes something old for every kind of event', () => {
  for (const kind of LIVE_EVENT_KINDS) expect(staleKeys({ id: '1', kind, caseId: 'a', meetingId: 'm' })).not.toHaveLength(0);
});

it('asks again for what a remark changes, and for nothing of another case', () => {
  const client = new QueryClient();
  for (const key of [keys.cases.threads('a'), keys.cases.threads('b'), keys.cases.rounds('a'), keys.cases.list({ mine: true }), keys.unread])
    client.setQueryData(key, {});
  invalidateFor(client, { id: '1', kind: 'remarks-changed', caseId: 'a', meetingId: null });
  const isOld = (key: readonly unknown[]) => client.getQueryState(key)?.isInvalidated;
  expect(isOld(keys.cases.threads('a'))).toBe(true);
  expect(isOld(keys.cases.list({ mine: true }))).toBe(true);
  expect(isOld(keys.unread)).toBe(true);
  expect(isOld(keys.cases.threads('b'))).toBe(false);
  expect(isOld(keys.cases.rounds('a'))).toBe(false);
});

it('reaches all that stands under a case when the case itself has changed', () => {
  const client = new QueryClient();
  client.setQueryData(keys.cases.one('a'), {});
  client.setQueryData(keys.cases.differences('a', 3), {});
  invalidateFor(client, { id: '2', kind: 'case-changed', caseId: 'a', meetingId: null });
  expect(client.getQueryState(keys.cases.one('a'))?.isInvalidated).toBe(true);
  expect(client.getQueryState(keys.cases.differences('a', 3))?.isInvalidated).toBe(true);
});
