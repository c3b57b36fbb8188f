import type { AgendaItemState } from '@kerfside/calc/vocabulary/meetings.js';

const MINUTE_MS = 60_000;

/** Which case is being talked about, since when, and how long each had before. Kept by the chair's own page. */
export interface SlotClock {
  currentId: string | null;
  /** Milliseconds since 1970; null while the clock stands. */
  since: number | null;
  spent: Record<string, number>;
}

export interface ClockedItem {
  id: string;
  minutes: number;
  state: AgendaItemState;
}

export const EMPTY_CLOCK: SlotClock = { currentId: null, since: null, spent: {} };

/** Milliseconds that a slot has had so far. */
export const spentOn = ({ currentId, since, spent }: SlotClock, id: string, now: number): number =>
  (spent[id] ?? 0) + (currentId === id && since !== null ? Math.max(0, now - since) : 0);

const settled = (clock: SlotClock, now: number): SlotClock['spent'] =>
  clock.currentId ? { ...clock.spent, [clock.currentId]: spentOn(clock, clock.currentId, now) } : clock.spent;

/** Goes on to a case; what the one before it had is kept, so coming back goes on from there. */
export const chooseSlot = (clock: SlotClock, id: string, now: number, isRunning: boolean): SlotClock =>
  clock.currentId === id ? clock : { currentId: id, since: isRunning ? now : null, spent: settled(clock, now) };

export const stopClock = (clock: SlotClock, now: number): SlotClock => ({ ...clock, since: null, spent: settled(clock, now) });

export const startClock = (clock: SlotClock, now: number): SlotClock => (clock.since === null && clock.currentId ? { ...clock, since: now } : clock);

const MOVED_MS = 60 * MINUTE_MS;

/** Where the running order begins: at its planned time, or where the meeting began if it was held at quite another. */
export function orderStart({ startsAt, startedAt }: { startsAt: string; startedAt: string | null }): string {
  return startedAt !== null && Math.abs(Date.parse(startedAt) - Date.parse(startsAt)) > MOVED_MS ? startedAt : startsAt;
}

export interface Forecast {
  /** When the last case ends if each takes its minutes from here. */
  endsAt: Date;
  /** Against the running order as planned: more than 0 is behind, less is ahead. */
  driftMinutes: number;
  /** Past the meeting's end; 0 where all is over by then. */
  overMinutes: number;
}

/**
 * Where the running order has got to. What is decided or deferred is over; the current case has what is left of its
 * minutes, or nothing once they are used up; the others have theirs.
 * Common practice, no source.
 */
export function forecast(meeting: { startsAt: string; startedAt: string | null; minutes: number; items: readonly ClockedItem[] }, clock: SlotClock, now: number): Forecast {
  const left = meeting.items
    .filter(({ state }) => state === 'listed')
    .reduce((sum, { id, minutes }) => sum + Math.max(0, minutes * MINUTE_MS - spentOn(clock, id, now)), 0);
  const start = Date.parse(orderStart(meeting));
  const planned = meeting.items.reduce((sum, { minutes }) => sum + minutes, 0);
  const end = now + left;
  return {
    endsAt: new Date(end),
    driftMinutes: (end - start) / MINUTE_MS - planned,
    overMinutes: Math.max(0, (end - start) / MINUTE_MS - meeting.minutes),
  };
}

/** `4 min behind`, `3 min ahead`, `On time`. */
export function driftWords(driftMinutes: number): string {
  const minutes = Math.round(Math.abs(driftMinutes));
  if (minutes < 1) return 'On time';
  return `${minutes} min ${driftMinutes > 0 ? 'behind' : 'ahead'}`;
}

/** `12:05`, and with a minus once the time is used up. */
export function clockFace(ms: number): string {
  const seconds = Math.trunc(Math.abs(ms) / 1000);
  const minutes = Math.floor(seconds / 60);
  return `${ms <= -1000 ? '\u2212' : ''}${minutes}:${String(seconds % 60).padStart(2, '0')}`;
}
