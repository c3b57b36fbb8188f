import { formatDate, formatDateTimeWithZone, formatDay, formatTime } from './dates';

// Offsets and clock changes: the IANA time zone database (Europe/London, Europe/Berlin, Asia/Kathmandu).
// Weekdays: ISO 8601 calendar; 7 December 2026 is a Monday.

it('writes a date with the short month and no leading zero', () => {
  expect(formatDate('2026-12-07T12:00:00.000Z', 'UTC')).toBe('7 Dec 2026');
  expect(formatDate('2026-09-30T12:00:00.000Z', 'UTC')).toBe('30 Sep 2026');
  expect(formatDay('2026-12-07T12:00:00.000Z', 'UTC')).toBe('Mon 7 Dec 2026');
});

it('has every month in three letters', () => {
  const months = Array.from({ length: 12 }, (_, month) => formatDate(new Date(Date.UTC(2026, month, 15)), 'UTC').split(' ')[1]);
  expect(months.join(' ')).toBe('Jan Feb Mar Apr May Jun Jul Aug Sep Oct Nov Dec');
});

it('takes the day of the zone, not that of Greenwich', () => {
  expect(formatDate('2026-12-07T23:30:00.000Z', 'Europe/Berlin')).toBe('8 Dec 2026');
  expect(formatDate('2026-12-07T02:00:00.000Z', 'America/New_York')).toBe('6 Dec 2026');
});

it('follows summer time', () => {
  expect(formatTime('2026-07-01T16:00:00.000Z', 'Europe/London')).toBe('17:00');
  expect(formatTime('2026-12-01T16:00:00.000Z', 'Europe/London')).toBe('16:00');
  expect(formatTime('2026-12-01T16:00:00.000Z', 'Asia/Kathmandu')).toBe('21:45');
});

it('writes midnight as 00:00', () => {
  expect(formatTime('2026-12-07T00:00:00.000Z', 'UTC')).toBe('00:00');
});

it('names the zone where several people must agree on a time', () => {
  expect(formatDateTimeWithZone('2026-12-07T17:30:00.000Z', 'Europe/London')).toBe('7 Dec 2026, 17:30 GMT');
  expect(formatDateTimeWithZone('2026-07-06T16:30:00.000Z', 'Europe/London')).toBe('6 Jul 2026, 17:30 BST');
});
