import { meetingDates } from '@kerfside/calc/planning/meeting-dates.js';
import { clocksAgree, instantOf, wallTime } from './zoned-time';

// Checked against the server's reading, which rests on the Temporal polyfill: another library with its own arithmetic.
const byServer = (start: string, timeZone: string) => meetingDates({ timeZone, start, rrule: 'FREQ=DAILY', count: 1 }).utc[0];

describe('a wall time of a zone', () => {
  // RFC 5545, 3.3.5: its own examples of a gap and an overlap in New York in 2007
  test('that comes twice is the first', () => {
    expect(instantOf('2007-11-04T01:30', 'America/New_York')).toBe('2007-11-04T05:30:00.000Z');
  });
  test('that the clocks skip takes the offset before the gap', () => {
    expect(instantOf('2007-03-11T02:30', 'America/New_York')).toBe('2007-03-11T07:30:00.000Z');
  });

  test.each(['Europe/London', 'America/New_York', 'Australia/Lord_Howe', 'Asia/Kathmandu', 'Pacific/Apia'])('agrees with the server in %s', (zone) => {
    for (const day of ['2026-01-15', '2026-03-08', '2026-03-29', '2026-04-05', '2026-07-01', '2026-10-04', '2026-10-25', '2026-11-01'])
      for (const time of ['00:30', '01:30', '01:45', '02:15', '02:30', '07:30', '23:45'])
        expect(instantOf(`${day}T${time}`, zone)).toBe(byServer(`${day}T${time}`, zone));
  });

  test('comes back as it was written', () => {
    expect(wallTime(instantOf('2026-12-09T07:30', 'Europe/London')!, 'Europe/London')).toBe('2026-12-09T07:30');
  });

  test('is nothing while half a date is typed', () => {
    expect(instantOf('', 'Europe/London')).toBeNull();
    expect(instantOf('2026-13-09T07:30', 'Europe/London')).toBeNull();
  });
});

test('two zones agree only where their clocks show the same', () => {
  expect(clocksAgree('2026-12-09T07:30:00Z', 'Europe/London', 'Europe/Lisbon')).toBe(true);
  expect(clocksAgree('2026-12-09T07:30:00Z', 'Europe/London', 'Europe/Paris')).toBe(false);
});
