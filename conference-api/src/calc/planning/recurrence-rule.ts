import { CalcInputError } from '../common/calc-input-error.js';

export type Frequency = 'DAILY' | 'WEEKLY' | 'MONTHLY' | 'YEARLY';

/** A checked RFC 5545 rule that recurs daily or more rarely. */
export interface RecurrenceRule {
  freq: Frequency;
  interval: number;
  /** Most instances, where the rule says. */
  count: number | null;
  /** Last instant, inclusive, in milliseconds since 1970 UTC. */
  until: number | null;
  wkst: string;
  byDay: string[] | null;
  byHour: number[] | null;
  byMinute: number[] | null;
  byMonth: number[] | null;
  byMonthDay: number[] | null;
  byYearDay: number[] | null;
  byWeekNo: number[] | null;
  bySetPos: number[] | null;
}

const FREQUENCIES = ['DAILY', 'WEEKLY', 'MONTHLY', 'YEARLY'] as const;
const TOO_OFTEN = ['SECONDLY', 'MINUTELY', 'HOURLY'];
const WEEKDAYS = ['MO', 'TU', 'WE', 'TH', 'FR', 'SA', 'SU'];
const MOST_TIMES_A_DAY = 24;

/** Numeric lists: smallest and largest size of a value, and whether −value counts from the end. */
const LISTS: Record<string, { min: number; max: number; signed: boolean }> = {
  BYSECOND: { min: 0, max: 60, signed: false },
  BYMINUTE: { min: 0, max: 59, signed: false },
  BYHOUR: { min: 0, max: 23, signed: false },
  BYMONTHDAY: { min: 1, max: 31, signed: true },
  BYYEARDAY: { min: 1, max: 366, signed: true },
  BYWEEKNO: { min: 1, max: 53, signed: true },
  BYMONTH: { min: 1, max: 12, signed: false },
  BYSETPOS: { min: 1, max: 366, signed: true },
};
const OTHER_PARTS = ['FREQ', 'INTERVAL', 'COUNT', 'UNTIL', 'WKST', 'BYDAY'];

/** Which parts RFC 5545 forbids beside a frequency. */
const FORBIDDEN: Record<Frequency, string[]> = {
  DAILY: ['BYYEARDAY', 'BYWEEKNO'],
  WEEKLY: ['BYYEARDAY', 'BYWEEKNO', 'BYMONTHDAY'],
  MONTHLY: ['BYYEARDAY', 'BYWEEKNO'],
  YEARLY: [],
};

type Parts = Map<string, string>;

/**
 * Reads an RRULE value, with or without its `RRULE:` prefix, in any letter case.
 *
 * Source: RFC 5545, 3.3.10.
 *
 * @throws CalcInputError with field `rrule` for anything the RFC forbids, an UNTIL that
 * is not in UTC, and rules that recur each hour or more often.
 */
export function parseRule(text: string): RecurrenceRule {
  const parts = splitParts(text);
  const freq = readFrequency(parts);
  refuseForbidden(parts, freq);
  if (parts.has('COUNT') && parts.has('UNTIL')) throw bad('A rule may not have both COUNT and UNTIL.');
  const rule: RecurrenceRule = {
    freq,
    interval: readCount(parts, 'INTERVAL') ?? 1,
    count: readCount(parts, 'COUNT'),
    until: readUntil(parts.get('UNTIL')),
    wkst: readWeekday(parts.get('WKST') ?? 'MO'),
    byDay: readByDay(parts, freq),
    byHour: readList(parts, 'BYHOUR'),
    byMinute: readList(parts, 'BYMINUTE'),
    byMonth: readList(parts, 'BYMONTH'),
    byMonthDay: readList(parts, 'BYMONTHDAY'),
    byYearDay: readList(parts, 'BYYEARDAY'),
    byWeekNo: readList(parts, 'BYWEEKNO'),
    bySetPos: readList(parts, 'BYSETPOS'),
  };
  refuseTooOften(rule, readList(parts, 'BYSECOND'));
  refuseUnsettled(rule);
  return rule;
}

function bad(message: string, code = 'rule'): CalcInputError {
  return new CalcInputError('rrule', code, message);
}

function splitParts(text: string): Parts {
  const value = text.trim().toUpperCase().replace(/^RRULE:/, '');
  const parts: Parts = new Map();
  for (const piece of value.split(';')) {
    const [, name = '', content = ''] = /^([A-Z]+)=(.+)$/.exec(piece) ?? [];
    if (name === '') throw bad('The rule must be parts of the form NAME=VALUE, divided by semicolons.');
    if (!OTHER_PARTS.includes(name) && LISTS[name] === undefined) {
      throw bad(`${name} is not a part of an RFC 5545 rule.`);
    }
    if (parts.has(name)) throw bad(`${name} is given twice.`);
    parts.set(name, content);
  }
  return parts;
}

function readFrequency(parts: Parts): Frequency {
  const text = parts.get('FREQ');
  if (text === undefined) throw bad('The rule needs a FREQ.');
  if (TOO_OFTEN.includes(text)) throw tooOften();
  const freq = FREQUENCIES.find((frequency) => frequency === text);
  if (freq === undefined) throw bad('FREQ must be DAILY, WEEKLY, MONTHLY or YEARLY.');
  return freq;
}

function tooOften(): CalcInputError {
  return bad('A meeting cannot recur each hour or more often.', 'too-often');
}

function refuseForbidden(parts: Parts, freq: Frequency): void {
  const forbidden = FORBIDDEN[freq].find((name) => parts.has(name));
  if (forbidden !== undefined) throw bad(`${forbidden} may not stand beside FREQ=${freq}.`);
  const others = [...parts.keys()].filter((name) => name.startsWith('BY') && name !== 'BYSETPOS');
  if (parts.has('BYSETPOS') && others.length === 0) {
    throw bad('BYSETPOS needs another BY part beside it.');
  }
}

function readCount(parts: Parts, name: 'INTERVAL' | 'COUNT'): number | null {
  const text = parts.get(name);
  if (text === undefined) return null;
  if (!/^\d{1,9}$/.test(text) || Number(text) === 0) throw bad(`${name} must be a whole number from 1.`);
  return Number(text);
}

function readUntil(text: string | undefined): number | null {
  if (text === undefined) return null;
  const match = /^(\d{4})(\d\d)(\d\d)T(\d\d)(\d\d)(\d\d)Z$/.exec(text);
  if (match === null) throw bad('UNTIL must be a moment in UTC, like 20261224T000000Z.', 'until-utc');
  const [year, month, day, hour, minute, second] = match.slice(1).map(Number) as [number, ...number[]];
  const iso = `${match[1]}-${match[2]}-${match[3]}T${match[4]}:${match[5]}:${match[6]}.000Z`;
  const date = new Date(0);
  date.setUTCFullYear(year, (month as number) - 1, day);
  date.setUTCHours(hour as number, minute as number, second as number);
  if (date.toISOString() !== iso) throw bad('UNTIL is not a date of the calendar.');
  return date.getTime();
}

function readWeekday(text: string): string {
  if (!WEEKDAYS.includes(text)) throw bad('WKST must be one of MO, TU, WE, TH, FR, SA, SU.');
  return text;
}

function readByDay(parts: Parts, freq: Frequency): string[] | null {
  const text = parts.get('BYDAY');
  if (text === undefined) return null;
  return text.split(',').map((day) => {
    const match = /^([+-]?)(\d{1,2})?(MO|TU|WE|TH|FR|SA|SU)$/.exec(day);
    if (match === null || (match[1] !== '' && match[2] === undefined)) {
      throw bad(`${day} is not a BYDAY value.`);
    }
    if (match[2] === undefined) return day;
    const ordinal = Number(match[2]);
    if (ordinal < 1 || ordinal > 53) throw bad('The number in BYDAY must be from 1 to 53.');
    if ((freq !== 'MONTHLY' && freq !== 'YEARLY') || parts.has('BYWEEKNO')) {
      throw bad('A numbered BYDAY stands with FREQ=MONTHLY or YEARLY only, and not beside BYWEEKNO.');
    }
    return `${match[1] === '-' ? '-' : ''}${ordinal}${match[3]}`;
  });
}

function readList(parts: Parts, name: string): number[] | null {
  const text = parts.get(name);
  const limits = LISTS[name];
  if (text === undefined || limits === undefined) return null;
  const numbers = text.split(',').map((piece) => {
    const size = Math.abs(Number(piece));
    const wellFormed = limits.signed ? /^[+-]?\d{1,3}$/.test(piece) : /^\d{1,2}$/.test(piece);
    if (!wellFormed || size < limits.min || size > limits.max) {
      throw bad(`${piece} is not a ${name} value.`);
    }
    return Number(piece);
  });
  return [...new Set(numbers)].sort((a, b) => a - b);
}

function refuseTooOften({ byHour, byMinute }: RecurrenceRule, bySecond: number[] | null): void {
  if (bySecond !== null && (bySecond.length > 1 || bySecond[0] !== 0)) {
    throw bad('Meetings start on a whole minute: BYSECOND may only be 0.', 'too-often');
  }
  const hours = byHour?.length ?? 1;
  const times = hours * (byMinute?.length ?? 1);
  if (hours === 24 || times > MOST_TIMES_A_DAY) throw tooOften();
}

/**
 * Days counted within the year (BYYEARDAY, or BYMONTHDAY with a numbered BYDAY) and narrowed
 * by weekday: libraries disagree on these, so a wrong date is worse than a refusal.
 */
function refuseUnsettled({ freq, byDay, byMonthDay, byYearDay }: RecurrenceRule): void {
  if (freq !== 'YEARLY' || byDay === null) return;
  const numbered = byDay.some((day) => day.length > 2);
  if (byYearDay !== null || (byMonthDay !== null && numbered)) {
    throw bad('BYDAY beside BYYEARDAY, or numbered beside BYMONTHDAY, is not supported in a yearly rule.', 'unsupported');
  }
}
