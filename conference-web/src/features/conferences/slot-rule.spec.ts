import { meetingDates } from '@kerfside/calc/planning/meeting-dates.js';
import fc from 'fast-check';
import { slotKind, slotRule } from './slot-rule';

const kinds = ['weekly', 'fortnightly', 'monthly'] as const;
const days = fc.date({ min: new Date('2026-01-01T00:00:00Z'), max: new Date('2035-12-31T00:00:00Z'), noInvalidDate: true });

// Checked with an RFC 5545 library (rrule-temporal, behind meetingDates): the first date of the rule is the start itself.
it('makes rules whose first meeting is the one that was chosen', () => {
  fc.assert(
    fc.property(days, fc.constantFrom(...kinds), (day, kind) => {
      const start = `${day.toISOString().slice(0, 10)}T17:00`;
      const rrule = slotRule(kind, start);
      const [first] = meetingDates({ timeZone: 'UTC', start, rrule: rrule ?? '', count: 1 }).utc;
      expect(first?.slice(0, 16)).toBe(start);
    }),
    { numRuns: 60 },
  );
});

// RFC 5545, 3.3.10: "2TU" in a monthly rule is the second Tuesday, "-1" the last.
it('says which weekday of the month', () => {
  expect(slotRule('monthly', '2026-12-08T17:00')).toBe('FREQ=MONTHLY;BYDAY=2TU');
  expect(slotRule('monthly', '2026-12-30T17:00')).toBe('FREQ=MONTHLY;BYDAY=-1WE');
  expect(slotRule('fortnightly', '2026-12-09T17:00')).toBe('FREQ=WEEKLY;INTERVAL=2;BYDAY=WE');
  expect(slotRule('weekly', '')).toBeNull();
});

it('knows its own rules again, and leaves others as they are', () => {
  for (const kind of kinds) expect(slotKind(slotRule(kind, '2026-12-09T17:00')!, '2026-12-09T17:00')).toBe(kind);
  expect(slotKind('FREQ=DAILY;BYDAY=MO,TU', '2026-12-09T17:00')).toBe('own');
  expect(slotKind('FREQ=WEEKLY;BYDAY=TH', '2026-12-09T17:00')).toBe('own');
});
