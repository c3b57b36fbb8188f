import { Problem } from '../common/problems/problem.js';
import { defaultSlotStart, requireSlot } from './conference-slot.js';

const slot = { timeZone: 'Europe/London', slotStart: '2026-01-07T07:30', slotRule: 'FREQ=WEEKLY;BYDAY=WE' };
const fieldOf = (change: Partial<typeof slot>): string | null => {
  try {
    requireSlot({ ...slot, ...change });
    return null;
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
    return error.errors[0]!.field;
  }
};

describe('requireSlot', () => {
  it.each([
    [{}, null],
    [{ slotRule: 'FREQ=MONTHLY;BYDAY=1WE' }, null],
    [{ timeZone: 'Europe/Nowhere' }, 'timeZone'],
    [{ timeZone: '+01:00' }, 'timeZone'],
    [{ slotStart: '2026-02-30T07:30' }, 'slotStart'],
    [{ slotStart: '2026-01-07T25:00' }, 'slotStart'],
    [{ slotRule: 'EVERY WEDNESDAY' }, 'slotRule'],
    [{ slotRule: 'FREQ=SECONDLY' }, 'slotRule'],
  ])('%j is refused at %s', (change, field) => expect(fieldOf(change)).toBe(field));
});

describe('defaultSlotStart', () => {
  // 2 Dec 2026 is a Wednesday (any calendar)
  it.each([
    ['2026-12-01T09:00:00Z', '2026-12-02T17:00'],
    ['2026-12-02T09:00:00Z', '2026-12-09T17:00'],
    ['2026-12-03T23:59:00Z', '2026-12-09T17:00'],
  ])('from %s is %s', (today, start) => expect(defaultSlotStart(new Date(today))).toBe(start));
});
