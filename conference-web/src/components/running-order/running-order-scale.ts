/** A case's place in the running order. */
export interface Slot {
  id: string;
  minutes: number;
}

export interface PlacedSlot<T extends Slot> {
  slot: T;
  /** Minutes after the meeting's start, as planned. */
  from: number;
  to: number;
  /** False from the first slot on that would end after the meeting does: the order is kept, so all after it wait too. */
  fits: boolean;
}

export interface RunningOrderScale<T extends Slot> {
  placed: PlacedSlot<T>[];
  plannedMinutes: number;
  /** Between the last slot that fits and the meeting's end. */
  freeMinutes: number;
  /** What all slots together need beyond the meeting's minutes; 0 where all fit. */
  overMinutes: number;
}

/** Puts slots one after the other from the meeting's start. */
export function layOutSlots<T extends Slot>(slots: readonly T[], meetingMinutes: number): RunningOrderScale<T> {
  let at = 0;
  let used = 0;
  let isFull = false;
  const placed = slots.map((slot) => {
    const from = at;
    at += slot.minutes;
    isFull ||= at > meetingMinutes;
    if (!isFull) used = at;
    return { slot, from, to: at, fits: !isFull };
  });
  return { placed, plannedMinutes: at, freeMinutes: Math.max(0, meetingMinutes - used), overMinutes: Math.max(0, at - meetingMinutes) };
}

const LEAST_PX = 4;
const MOST_PX = 20;
const LONGEST_PX = 2600;

/** Pixels for a minute: the shortest slot gets the height its text needs, where that does not make the ruler endless. */
export function pixelsPerMinute(slots: readonly Slot[], meetingMinutes: number, neededPx: number): number {
  const shortest = Math.min(...slots.map(({ minutes }) => minutes), meetingMinutes);
  const total = Math.max(meetingMinutes, slots.reduce((sum, { minutes }) => sum + minutes, 0), 1);
  const wanted = Math.ceil(neededPx / Math.max(shortest, 1));
  return Math.max(LEAST_PX, Math.min(wanted, MOST_PX, Math.floor(LONGEST_PX / total)));
}

export interface Tick {
  /** Minutes after the start. */
  minute: number;
  /** A tick with its time written. */
  isNamed: boolean;
}

const MINUTE_MS = 60_000;

/** Ticks at round clock times, every five minutes, and the quarter hours named where the start and the end leave room. */
export function clockTicks(startsAt: string | Date, meetingMinutes: number, perMinutePx: number): Tick[] {
  const start = new Date(startsAt).getTime() / MINUTE_MS;
  const namedEvery = perMinutePx < 2 ? 30 : 15;
  const room = 18 / perMinutePx;
  const ticks: Tick[] = [];
  for (let at = Math.ceil(start / 5) * 5; at <= start + meetingMinutes; at += 5) {
    const minute = at - start;
    ticks.push({ minute, isNamed: at % namedEvery === 0 && minute > room && minute < meetingMinutes - room });
  }
  return ticks;
}

/** Where a dragged slot belongs: past a neighbour once its middle has passed the neighbour's middle. */
export function indexAfterDrag(middles: readonly number[], index: number, middle: number): number {
  let to = index;
  while (to > 0 && middle < middles[to - 1]!) to -= 1;
  while (to < middles.length - 1 && middle > middles[to + 1]!) to += 1;
  return to;
}

/** The list with one entry at another place. */
export function moved<T>(list: readonly T[], from: number, to: number): T[] {
  const rest = [...list];
  const [entry] = rest.splice(from, 1);
  if (entry === undefined) return rest;
  rest.splice(Math.max(0, Math.min(to, rest.length)), 0, entry);
  return rest;
}
