/** Wall-clock parts of a moment in a zone, as though they were UTC. */
function wallMs(at: number, timeZone: string): number {
  const format = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    year: 'numeric',
    month: 'numeric',
    day: 'numeric',
    hour: 'numeric',
    minute: 'numeric',
    hourCycle: 'h23',
  });
  const parts = Object.fromEntries(format.formatToParts(at).map(({ type, value }) => [type, Number(value)]));
  return Date.UTC(parts.year!, parts.month! - 1, parts.day, parts.hour, parts.minute);
}

/** What the zone's clocks show, for a datetime-local field: `2026-12-09T07:30`. */
export const wallTime = (at: string | Date, timeZone: string): string => new Date(wallMs(new Date(at).getTime(), timeZone)).toISOString().slice(0, 16);

/** Whether both zones' clocks show the same at that moment. */
export const clocksAgree = (at: string | Date, one: string, other: string): boolean => wallTime(at, one) === wallTime(at, other);

const DAY_MS = 86_400_000;

/**
 * The moment when the zone's clocks show a `YYYY-MM-DDTHH:mm`; null where that is no date. A time that the clocks
 * skip is read with the offset before the gap, one that comes twice is the first (RFC 5545, 3.3.5).
 */
export function instantOf(wall: string, timeZone: string): string | null {
  const asUtc = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}$/.test(wall) ? Date.parse(`${wall}Z`) : NaN;
  if (Number.isNaN(asUtc)) return null;
  const offsetAt = (at: number) => wallMs(at, timeZone) - at;
  const before = asUtc - offsetAt(asUtc - DAY_MS);
  const after = asUtc - offsetAt(asUtc + DAY_MS);
  const real = [before, after].filter((at) => wallMs(at, timeZone) === asUtc);
  return new Date(real.length > 0 ? Math.min(...real) : before).toISOString();
}
