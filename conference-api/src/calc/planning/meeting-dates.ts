import { RRuleTemporal } from 'rrule-temporal';
import { Temporal } from 'temporal-polyfill';
import { CalcInputError } from '../common/calc-input-error.js';
import type { FieldSpec } from '../common/field-spec.js';
import { requireInteger, requireString } from '../common/input-checks.js';
import { parseRule, type Frequency, type RecurrenceRule } from './recurrence-rule.js';

export interface MeetingDatesInput {
  /** IANA name, such as `Europe/London`. */
  timeZone: string;
  /** First meeting by the zone's clocks, `YYYY-MM-DDTHH:mm`. */
  start: string;
  /** RFC 5545 rule, such as `FREQ=WEEKLY;BYDAY=WE`. */
  rrule: string;
  /** Most dates to give, 1–500. */
  count: number;
}

export interface MeetingDatesAnswer {
  /** Moments as `Date.prototype.toISOString` writes them, ascending. */
  utc: string[];
  definition: string;
  cautions: string[];
}

export const MEETING_DATES_FIELDS: readonly FieldSpec[] = [
  { name: 'timeZone', type: 'string' },
  { name: 'start', type: 'string' },
  { name: 'rrule', type: 'string' },
  { name: 'count', type: 'number' },
];

const MOST_DATES = 500;

/** Periods looked through before giving up, times the rule's interval. */
const HORIZON: Record<Frequency, { unit: 'days' | 'weeks' | 'months' | 'years'; periods: number }> = {
  DAILY: { unit: 'days', periods: 36_525 },
  WEEKLY: { unit: 'weeks', periods: 5_218 },
  MONTHLY: { unit: 'months', periods: 6_000 },
  YEARLY: { unit: 'years', periods: 1_000 },
};
const EVERY_MONTH = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12];
const MOST_DAYS: Record<Frequency, number> = { DAILY: 1, WEEKLY: 7, MONTHLY: 31, YEARLY: 366 };
const LAST_DAY = Temporal.PlainDateTime.from('9999-12-31T23:59:59');

/**
 * The moments of a recurring meeting, in UTC. Wall time stays put over clock changes;
 * a time that the clocks skip is read with the offset before the gap (so it falls later),
 * one that comes twice is the first. Dates are those that the rule itself generates:
 * a start that does not match the rule is not one of them, and a caution says so.
 *
 * Source: RFC 5545, 3.3.10 (rules) and 3.3.5 (times in gaps and overlaps).
 *
 * @throws CalcInputError for an unknown zone, a start not of the calendar, a rule that is
 * not RFC 5545's, recurs each hour or more often, or never recurs, or a count outside 1–500.
 */
export function meetingDates(input: MeetingDatesInput): MeetingDatesAnswer {
  const timeZone = readZone(input.timeZone);
  const start = readStart(input.start);
  const rule = parseRule(requireString(input.rrule, 'rrule', 1000));
  const count = requireInteger(input.count, 'count', 1, MOST_DATES);
  const wanted = Math.min(count, rule.count ?? count);

  const { instants, ended } = generate(rule, start, timeZone, wanted);
  const first = instants[0];
  if (first === undefined) {
    throw new CalcInputError('rrule', 'never-recurs', 'This rule gives no date at all.');
  }
  const cautions: string[] = [];
  if (first !== toInstant(start, timeZone)) {
    cautions.push('The start is not a date of the rule; the first meeting is the rule’s first date after it.');
  }
  if (instants.length < wanted && !ended) {
    cautions.push('The rule recurs too rarely to find all the dates asked for.');
  }
  return {
    utc: instants.map((instant) => new Date(instant).toISOString()),
    definition:
      'RFC 5545 recurrence by the zone’s clocks; skipped times take the offset before the gap, ' +
      'repeated times are the first (3.3.5).',
    cautions,
  };
}

/**
 * The first `count` (1–500) moments of a recurring meeting that lie after `after`, ascending; fewer where
 * the rule ends. Else as `meetingDates`, whose source it shares.
 *
 * @throws CalcInputError as `meetingDates`, but not where the rule has no date after `after`: then there are none.
 */
export function meetingDatesAfter(input: MeetingDatesInput, after: Date): Date[] {
  const rule = parseRule(requireString(input.rrule, 'rrule', 1000));
  const wanted = requireInteger(input.count, 'count', 1, MOST_DATES);
  const { instants } = generate(rule, readStart(input.start), readZone(input.timeZone), wanted, after.getTime());
  return instants.map((instant) => new Date(instant));
}

function readZone(value: unknown): string {
  const name = requireString(value, 'timeZone', 100);
  const unknown = new CalcInputError('timeZone', 'time-zone', 'timeZone must be an IANA zone, like Europe/London.');
  // Fixed offsets are accepted by some engines, but they are no zones: they know no clock changes.
  if (!/^[A-Za-z][A-Za-z0-9_+\-/]*$/.test(name)) throw unknown;
  try {
    return new Intl.DateTimeFormat('en', { timeZone: name }).resolvedOptions().timeZone;
  } catch {
    throw unknown;
  }
}

function readStart(value: unknown): Temporal.PlainDateTime {
  const text = requireString(value, 'start', 40);
  const wrong = new CalcInputError('start', 'date', 'start must be a local date and time, YYYY-MM-DDTHH:mm.');
  if (!/^\d{4}-\d\d-\d\dT([01]\d|2[0-3]):[0-5]\d$/.test(text) || text.startsWith('0000')) throw wrong;
  try {
    return Temporal.PlainDateTime.from(text, { overflow: 'reject' });
  } catch {
    throw wrong;
  }
}

/** Milliseconds since 1970 of a wall time; `compatible` is RFC 5545's reading of gaps and overlaps. */
function toInstant(wall: Temporal.PlainDateTime, timeZone: string): number {
  return wall.toZonedDateTime(timeZone, { disambiguation: 'compatible' }).epochMilliseconds;
}

/**
 * The library runs on wall times as though they were UTC, because in a zone it leaves
 * out instances that fall into a gap, where a meeting should still be held.
 */
function generate(rule: RecurrenceRule, start: Temporal.PlainDateTime, timeZone: string, wanted: number, after = -Infinity) {
  const instants = new Set<number>();
  if (positionsOutOfReach(rule)) return { instants: [], ended: true };
  const until = rule.until ?? Infinity;
  let ended = rule.until !== null;
  let seen = 0;
  const visit = (wall: { toString(): string }): boolean => {
    const instant = toInstant(Temporal.ZonedDateTime.from(wall.toString()).toPlainDateTime(), timeZone);
    if (instant > until) return false;
    if (instant > after) instants.add(instant);
    seen += 1;
    ended ||= seen === rule.count;
    return instants.size < wanted && seen !== rule.count;
  };
  try {
    new RRuleTemporal(libraryOptions(rule, start)).all(visit);
  } catch (error) {
    // The library gives up by throwing once a rule has gone too long without a date.
    if (!/exceeded|Out-of-bounds/.test(String(error))) throw error;
  }
  return { instants: [...instants].sort((a, b) => a - b), ended };
}

function libraryOptions(rule: RecurrenceRule, start: Temporal.PlainDateTime) {
  const { unit, periods } = HORIZON[rule.freq];
  const listed = {
    byDay: rule.byDay,
    byHour: rule.byHour,
    byMinute: rule.byMinute,
    // In a yearly rule the library narrows BYMONTHDAY by weekday only if months are named.
    byMonth: rule.byMonth ?? (rule.freq === 'YEARLY' && rule.byMonthDay && rule.byDay ? EVERY_MONTH : null),
    byMonthDay: rule.byMonthDay,
    byYearDay: rule.byYearDay,
    byWeekNo: rule.byWeekNo,
    bySetPos: rule.bySetPos,
  };
  return {
    freq: rule.freq,
    interval: rule.interval,
    wkst: rule.wkst,
    ...Object.fromEntries(Object.entries(listed).filter(([, list]) => list !== null)),
    dtstart: start.toZonedDateTime('UTC'),
    until: lastWallTime(start, unit, periods * rule.interval).toZonedDateTime('UTC'),
    maxIterations: 40_000,
  };
}

function lastWallTime(start: Temporal.PlainDateTime, unit: string, periods: number): Temporal.PlainDateTime {
  try {
    const last = start.add({ [unit]: periods });
    return Temporal.PlainDateTime.compare(last, LAST_DAY) < 0 ? last : LAST_DAY;
  } catch {
    return LAST_DAY; // Beyond what the calendar can hold.
  }
}

/** Whether BYSETPOS asks for more instances than a period can hold; the library would search long. */
function positionsOutOfReach({ freq, byDay, byHour, byMinute, bySetPos }: RecurrenceRule): boolean {
  if (bySetPos === null) return false;
  const days = freq === 'WEEKLY' ? (byDay?.length ?? 1) : MOST_DAYS[freq];
  const most = days * (byHour?.length ?? 1) * (byMinute?.length ?? 1);
  return bySetPos.every((position) => Math.abs(position) > most);
}
