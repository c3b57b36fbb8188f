import { meetingDatesAfter } from './meeting-dates.js';

// Instants computed with Python's zoneinfo for these slots.
const iso = (dates: Date[]) => dates.map((date) => date.toISOString());

describe('the next dates of a slot', () => {
  it('keep the wall time over the change of the clocks', () => {
    const slot = { timeZone: 'Europe/London', start: '2026-03-18T07:30', rrule: 'FREQ=WEEKLY;BYDAY=WE', count: 3 };
    expect(iso(meetingDatesAfter(slot, new Date('2026-03-18T07:30:00Z')))).toEqual(['2026-03-25T07:30:00.000Z', '2026-04-01T06:30:00.000Z', '2026-04-08T06:30:00.000Z']);
    const sydney = { timeZone: 'Australia/Sydney', start: '2026-03-30T07:30', rrule: 'FREQ=WEEKLY;BYDAY=MO', count: 2 };
    expect(iso(meetingDatesAfter(sydney, new Date('2026-03-30T00:00:00Z')))).toEqual(['2026-04-05T21:30:00.000Z', '2026-04-12T21:30:00.000Z']);
  });

  it('keep the rhythm of every other week, years after its first date', () => {
    const slot = { timeZone: 'Europe/Paris', start: '2020-01-02T08:00', rrule: 'FREQ=WEEKLY;INTERVAL=2', count: 3 };
    expect(iso(meetingDatesAfter(slot, new Date('2026-10-10T00:00:00Z')))).toEqual(['2026-10-15T06:00:00.000Z', '2026-10-29T07:00:00.000Z', '2026-11-12T07:00:00.000Z']);
  });

  it('are none where the rule has ended', () => {
    const slot = { timeZone: 'UTC', start: '2026-01-07T07:30', rrule: 'FREQ=WEEKLY;COUNT=3', count: 8 };
    expect(meetingDatesAfter(slot, new Date('2026-02-01T00:00:00Z'))).toEqual([]);
    expect(meetingDatesAfter(slot, new Date('2026-01-08T00:00:00Z'))).toHaveLength(2);
  });
});
