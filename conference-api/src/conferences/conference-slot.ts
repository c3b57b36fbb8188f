import { CalcInputError } from '../calc/common/calc-input-error.js';
import { meetingDates } from '../calc/planning/meeting-dates.js';
import { invalid } from '../common/problems/problem.js';
import type { Conference } from './entities/conference.entity.js';

const FIELDS: Record<string, string> = { timeZone: 'timeZone', start: 'slotStart', rrule: 'slotRule' };

/** Throws 422 by field where zone, first meeting and rule do not give a meeting. */
export function requireSlot({ timeZone, slotStart, slotRule }: Pick<Conference, 'timeZone' | 'slotStart' | 'slotRule'>): void {
  try {
    meetingDates({ timeZone, start: slotStart, rrule: slotRule, count: 1 });
  } catch (error) {
    if (!(error instanceof CalcInputError)) throw error;
    const field = FIELDS[error.field] ?? error.field;
    throw invalid(field, error.code, error.message.replaceAll(error.field, field));
  }
}

/** Wednesday at five in the afternoon, the first after the day: where nobody has said otherwise yet. */
export function defaultSlotStart(today: Date): string {
  const day = new Date(today);
  day.setUTCDate(day.getUTCDate() + ((3 - day.getUTCDay() + 7) % 7 || 7));
  return `${day.toISOString().slice(0, 10)}T17:00`;
}
