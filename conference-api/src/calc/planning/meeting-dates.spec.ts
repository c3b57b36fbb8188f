import fc from 'fast-check';
import { meetingDates, type MeetingDatesInput } from './meeting-dates.js';

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];
const HOURS_BEHIND_UTC = { EDT: 4, EST: 5 };

/** Moments of 9:00 as the RFC lists them: `1997 EDT Sep 2,9; Oct 7 | 1997 EST Oct 28`. */
function newYork(listing: string, hour = 9, minute = 0): string[] {
  return listing.split('|').flatMap((part) => {
    const [, year, zone, days = ''] = /^\s*(\d{4}) (EDT|EST) (.*)$/.exec(part) ?? [];
    const behind = HOURS_BEHIND_UTC[zone as keyof typeof HOURS_BEHIND_UTC];
    return days.trim().split('; ').flatMap((monthDays) => {
      const [month = '', list = ''] = monthDays.split(' ');
      return list.split(',').map((day) =>
        new Date(Date.UTC(Number(year), MONTHS.indexOf(month), Number(day), hour + behind, minute)).toISOString(),
      );
    });
  });
}

const from = (start: string, rrule: string, count: number, timeZone = 'America/New_York') =>
  meetingDates({ timeZone, start, rrule, count }).utc;

describe('meetingDates', () => {
  // RFC 5545, section 3.8.5.3, in its order: rule, start, listed instances, and whether the list is all.
  test.each([
    ['FREQ=WEEKLY;COUNT=10', '1997-09-02', '1997 EDT Sep 2,9,16,23,30; Oct 7,14,21 | 1997 EST Oct 28; Nov 4', true],
    ['FREQ=WEEKLY;UNTIL=19971224T000000Z', '1997-09-02', '1997 EDT Sep 2,9,16,23,30; Oct 7,14,21 | 1997 EST Oct 28; Nov 4,11,18,25; Dec 2,9,16,23', true],
    ['FREQ=DAILY;COUNT=10', '1997-09-02', '1997 EDT Sep 2,3,4,5,6,7,8,9,10,11', true],
    ['FREQ=DAILY;INTERVAL=10;COUNT=5', '1997-09-02', '1997 EDT Sep 2,12,22; Oct 2,12', true],
    ['FREQ=WEEKLY;INTERVAL=2;WKST=SU', '1997-09-02', '1997 EDT Sep 2,16,30; Oct 14 | 1997 EST Oct 28; Nov 11,25; Dec 9,23 | 1998 EST Jan 6,20; Feb 3,17', false],
    ['FREQ=WEEKLY;UNTIL=19971007T000000Z;WKST=SU;BYDAY=TU,TH', '1997-09-02', '1997 EDT Sep 2,4,9,11,16,18,23,25,30; Oct 2', true],
    ['FREQ=WEEKLY;COUNT=10;WKST=SU;BYDAY=TU,TH', '1997-09-02', '1997 EDT Sep 2,4,9,11,16,18,23,25,30; Oct 2', true],
    ['FREQ=WEEKLY;INTERVAL=2;UNTIL=19971224T000000Z;WKST=SU;BYDAY=MO,WE,FR', '1997-09-01', '1997 EDT Sep 1,3,5,15,17,19,29; Oct 1,3,13,15,17 | 1997 EST Oct 27,29,31; Nov 10,12,14,24,26,28; Dec 8,10,12,22', true],
    ['FREQ=WEEKLY;INTERVAL=2;COUNT=8;WKST=SU;BYDAY=TU,TH', '1997-09-02', '1997 EDT Sep 2,4,16,18,30; Oct 2,14,16', true],
    ['FREQ=MONTHLY;COUNT=10;BYDAY=1FR', '1997-09-05', '1997 EDT Sep 5; Oct 3 | 1997 EST Nov 7; Dec 5 | 1998 EST Jan 2; Feb 6; Mar 6; Apr 3 | 1998 EDT May 1; Jun 5', true],
    ['FREQ=MONTHLY;UNTIL=19971224T000000Z;BYDAY=1FR', '1997-09-05', '1997 EDT Sep 5; Oct 3 | 1997 EST Nov 7; Dec 5', true],
    ['FREQ=MONTHLY;INTERVAL=2;COUNT=10;BYDAY=1SU,-1SU', '1997-09-07', '1997 EDT Sep 7,28 | 1997 EST Nov 2,30 | 1998 EST Jan 4,25; Mar 1,29 | 1998 EDT May 3,31', true],
    ['FREQ=MONTHLY;COUNT=6;BYDAY=-2MO', '1997-09-22', '1997 EDT Sep 22; Oct 20 | 1997 EST Nov 17; Dec 22 | 1998 EST Jan 19; Feb 16', true],
    ['FREQ=MONTHLY;BYMONTHDAY=-3', '1997-09-28', '1997 EDT Sep 28 | 1997 EST Oct 29; Nov 28; Dec 29 | 1998 EST Jan 29; Feb 26', false],
    ['FREQ=MONTHLY;COUNT=10;BYMONTHDAY=2,15', '1997-09-02', '1997 EDT Sep 2,15; Oct 2,15 | 1997 EST Nov 2,15; Dec 2,15 | 1998 EST Jan 2,15', true],
    ['FREQ=MONTHLY;COUNT=10;BYMONTHDAY=1,-1', '1997-09-30', '1997 EDT Sep 30; Oct 1 | 1997 EST Oct 31; Nov 1,30; Dec 1,31 | 1998 EST Jan 1,31; Feb 1', true],
    ['FREQ=MONTHLY;INTERVAL=18;COUNT=10;BYMONTHDAY=10,11,12,13,14,15', '1997-09-10', '1997 EDT Sep 10,11,12,13,14,15 | 1999 EST Mar 10,11,12,13', true],
    ['FREQ=MONTHLY;INTERVAL=2;BYDAY=TU', '1997-09-02', '1997 EDT Sep 2,9,16,23,30 | 1997 EST Nov 4,11,18,25 | 1998 EST Jan 6,13,20,27; Mar 3,10,17,24,31', false],
    ['FREQ=YEARLY;COUNT=10;BYMONTH=6,7', '1997-06-10', '1997 EDT Jun 10; Jul 10 | 1998 EDT Jun 10; Jul 10 | 1999 EDT Jun 10; Jul 10 | 2000 EDT Jun 10; Jul 10 | 2001 EDT Jun 10; Jul 10', true],
    ['FREQ=YEARLY;INTERVAL=2;COUNT=10;BYMONTH=1,2,3', '1997-03-10', '1997 EST Mar 10 | 1999 EST Jan 10; Feb 10; Mar 10 | 2001 EST Jan 10; Feb 10; Mar 10 | 2003 EST Jan 10; Feb 10; Mar 10', true],
    ['FREQ=YEARLY;INTERVAL=3;COUNT=10;BYYEARDAY=1,100,200', '1997-01-01', '1997 EST Jan 1 | 1997 EDT Apr 10; Jul 19 | 2000 EST Jan 1 | 2000 EDT Apr 9; Jul 18 | 2003 EST Jan 1 | 2003 EDT Apr 10; Jul 19 | 2006 EST Jan 1', true],
    ['FREQ=YEARLY;BYDAY=20MO', '1997-05-19', '1997 EDT May 19 | 1998 EDT May 18 | 1999 EDT May 17', false],
    ['FREQ=YEARLY;BYWEEKNO=20;BYDAY=MO', '1997-05-12', '1997 EDT May 12 | 1998 EDT May 11 | 1999 EDT May 17', false],
    ['FREQ=YEARLY;BYMONTH=3;BYDAY=TH', '1997-03-13', '1997 EST Mar 13,20,27 | 1998 EST Mar 5,12,19,26 | 1999 EST Mar 4,11,18,25', false],
    ['FREQ=YEARLY;BYDAY=TH;BYMONTH=6,7,8', '1997-06-05', '1997 EDT Jun 5,12,19,26; Jul 3,10,17,24,31; Aug 7,14,21,28 | 1998 EDT Jun 4,11,18,25; Jul 2,9,16,23,30; Aug 6,13,20,27', false],
    ['FREQ=MONTHLY;BYDAY=FR;BYMONTHDAY=13', '1997-09-02', '1998 EST Feb 13; Mar 13; Nov 13 | 1999 EDT Aug 13 | 2000 EDT Oct 13', false],
    ['FREQ=MONTHLY;BYDAY=SA;BYMONTHDAY=7,8,9,10,11,12,13', '1997-09-13', '1997 EDT Sep 13; Oct 11 | 1997 EST Nov 8; Dec 13 | 1998 EST Jan 10; Feb 7; Mar 7 | 1998 EDT Apr 11; May 9; Jun 13', false],
    ['FREQ=YEARLY;INTERVAL=4;BYMONTH=11;BYDAY=TU;BYMONTHDAY=2,3,4,5,6,7,8', '1996-11-05', '1996 EST Nov 5 | 2000 EST Nov 7 | 2004 EST Nov 2', false],
    ['FREQ=MONTHLY;COUNT=3;BYDAY=TU,WE,TH;BYSETPOS=3', '1997-09-04', '1997 EDT Sep 4; Oct 7 | 1997 EST Nov 6', true],
    ['FREQ=MONTHLY;BYDAY=MO,TU,WE,TH,FR;BYSETPOS=-2', '1997-09-29', '1997 EDT Sep 29 | 1997 EST Oct 30; Nov 27; Dec 30 | 1998 EST Jan 29; Feb 26; Mar 30', false],
    ['FREQ=WEEKLY;INTERVAL=2;COUNT=4;BYDAY=TU,SU;WKST=MO', '1997-08-05', '1997 EDT Aug 5,10,19,24', true],
    ['FREQ=WEEKLY;INTERVAL=2;COUNT=4;BYDAY=TU,SU;WKST=SU', '1997-08-05', '1997 EDT Aug 5,17,19,31', true],
    ['FREQ=MONTHLY;BYMONTHDAY=15,30;COUNT=5', '2007-01-15', '2007 EST Jan 15,30; Feb 15 | 2007 EDT Mar 15,30', true],
  ])('RFC 5545: %s from %s', (rrule, day, listing, whole) => {
    const expected = newYork(listing);
    expect(from(`${day}T09:00`, rrule, whole ? 500 : expected.length)).toEqual(expected);
  });

  // RFC 5545, 3.8.5.3: both rules for every day in January for three years.
  test.each(['FREQ=YEARLY;UNTIL=20000131T140000Z;BYMONTH=1;BYDAY=SU,MO,TU,WE,TH,FR,SA', 'FREQ=DAILY;UNTIL=20000131T140000Z;BYMONTH=1'])(
    'RFC 5545: %s, UNTIL inclusive',
    (rrule) => {
      const january = Array.from({ length: 31 }, (_, i) => i + 1).join(',');
      const expected = newYork(`1998 EST Jan ${january} | 1999 EST Jan ${january} | 2000 EST Jan ${january}`);
      expect(from('1998-01-01T09:00', rrule, 500)).toEqual(expected);
    },
  );

  // RFC 5545, 3.8.5.3: every 20 minutes from 9:00 to 16:40; 3.3.10: two times on January's Sundays.
  test('RFC 5545: several times a day', () => {
    const rule = 'FREQ=DAILY;BYHOUR=9,10,11,12,13,14,15,16;BYMINUTE=0,20,40';
    const dates = from('1997-09-02T09:00', rule, 48);
    expect(dates.slice(0, 4)).toEqual(['13:00', '13:20', '13:40', '14:00'].map((t) => `1997-09-02T${t}:00.000Z`));
    expect(dates[23]).toBe('1997-09-02T20:40:00.000Z');
    expect(dates[24]).toBe('1997-09-03T13:00:00.000Z');
    const sundays = 'FREQ=YEARLY;INTERVAL=2;BYMONTH=1;BYDAY=SU;BYHOUR=8,9;BYMINUTE=30';
    expect(from('1997-01-05T08:30', sundays, 9)).toEqual([
      ...[5, 12, 19, 26].flatMap((day) => [8, 9].flatMap((hour) => newYork(`1997 EST Jan ${day}`, hour, 30))),
      ...newYork('1999 EST Jan 3', 8, 30),
    ]);
  });

  // RFC 5545, 3.3.5, its two examples: 2:30 does not exist (03:30 EDT), 1:30 comes twice (EDT).
  test('RFC 5545: gap and overlap', () => {
    expect(from('2007-03-11T02:30', 'FREQ=YEARLY', 1)).toEqual(['2007-03-11T07:30:00.000Z']);
    expect(from('2007-11-04T01:30', 'FREQ=YEARLY', 1)).toEqual(['2007-11-04T05:30:00.000Z']);
  });

  // Python's zoneinfo 3.11 with fold=0.
  test.each([
    ['Europe/London', '2026-03-18T07:30', 'FREQ=WEEKLY;BYDAY=WE', '2026-03-18T07:30 2026-03-25T07:30 2026-04-01T06:30 2026-04-08T06:30'],
    ['Europe/Paris', '2026-10-15T08:00', 'FREQ=WEEKLY;BYDAY=TH', '2026-10-15T06:00 2026-10-22T06:00 2026-10-29T07:00 2026-11-05T07:00'],
    ['America/New_York', '2026-03-03T07:00', 'FREQ=WEEKLY;BYDAY=TU', '2026-03-03T12:00 2026-03-10T11:00 2026-03-17T11:00'],
    ['Australia/Sydney', '2026-03-30T07:30', 'FREQ=WEEKLY;BYDAY=MO', '2026-03-29T20:30 2026-04-05T21:30 2026-04-12T21:30'],
  ])('%s from %s over a clock change', (timeZone, start, rrule, expected) => {
    const minutes = expected.split(' ');
    expect(from(start, rrule, minutes.length, timeZone)).toEqual(minutes.map((minute) => `${minute}:00.000Z`));
  });

  // The same zone data: a series that meets a gap is held an hour later that day and then at its own time.
  test('a start in a gap, and a series through one, keep their wall time afterwards', () => {
    expect(from('2026-03-29T01:30', 'FREQ=WEEKLY', 2, 'Europe/London')).toEqual([
      '2026-03-29T01:30:00.000Z',
      '2026-04-05T00:30:00.000Z',
    ]);
    expect(from('2026-03-22T01:30', 'FREQ=WEEKLY;COUNT=3', 9, 'Europe/London')).toEqual([
      '2026-03-22T01:30:00.000Z',
      '2026-03-29T01:30:00.000Z',
      '2026-04-05T00:30:00.000Z',
    ]);
  });

  test('the smaller of COUNT and count holds; the prefix and letter case do not matter', () => {
    expect(from('2026-01-07T07:30', 'RRULE:FREQ=WEEKLY;COUNT=2', 5)).toHaveLength(2);
    expect(from('2026-01-07T07:30', 'freq=weekly;count=9', 5)).toHaveLength(5);
  });

  test('a start that does not match is no date of the rule, with a caution', () => {
    const answer = meetingDates({ timeZone: 'UTC', start: '2026-01-07T07:30', rrule: 'FREQ=WEEKLY;BYDAY=TH', count: 1 });
    expect(answer.utc).toEqual(['2026-01-08T07:30:00.000Z']);
    expect(answer.cautions.join()).toContain('start is not a date of the rule');
    const matching = meetingDates({ timeZone: 'UTC', start: '2026-01-08T07:30', rrule: 'FREQ=WEEKLY;BYDAY=TH', count: 1 });
    expect(matching.cautions).toEqual([]);
  });

  test('29 February, and a rule too rare for the count', () => {
    const leap = meetingDates({ timeZone: 'UTC', start: '2024-02-29T08:00', rrule: 'FREQ=YEARLY', count: 20 });
    expect(leap.utc.slice(0, 3).map((date) => date.slice(0, 10))).toEqual(['2024-02-29', '2028-02-29', '2032-02-29']);
    // 2100 is no leap year (Gregorian calendar).
    expect(leap.utc.some((date) => date.startsWith('2100'))).toBe(false);
    const rare = meetingDates({ timeZone: 'UTC', start: '2024-02-29T08:00', rrule: 'FREQ=YEARLY;INTERVAL=1000', count: 9 });
    expect(rare.utc.length).toBeLessThan(9);
    expect(rare.cautions.join()).toContain('too rarely');
  });

  test.each([
    ['FREQ=SECONDLY', 'too-often'],
    ['FREQ=MINUTELY;INTERVAL=90', 'too-often'],
    ['FREQ=HOURLY;COUNT=3', 'too-often'],
    ['FREQ=DAILY;BYSECOND=0,30', 'too-often'],
    ['FREQ=DAILY;BYHOUR=0,1,2,3,4,5,6,7,8,9,10,11,12,13,14,15,16,17,18,19,20,21,22,23', 'too-often'],
    ['FREQ=YEARLY;BYMONTH=2;BYMONTHDAY=30', 'never-recurs'],
    ['FREQ=MONTHLY;BYMONTH=4;BYMONTHDAY=31', 'never-recurs'],
    ['FREQ=DAILY;BYMONTH=2;BYMONTHDAY=30', 'never-recurs'],
    ['FREQ=WEEKLY;BYDAY=MO;BYSETPOS=2', 'never-recurs'],
    ['FREQ=DAILY;INTERVAL=7;BYDAY=TU', 'never-recurs'],
    ['FREQ=WEEKLY;UNTIL=20200101T000000Z', 'never-recurs'],
    ['FREQ=WEEKLY;UNTIL=20270101', 'until-utc'],
    ['FREQ=WEEKLY;UNTIL=20270101T090000', 'until-utc'],
    ['FREQ=WEEKLY;UNTIL=20270230T090000Z', 'rule'],
    ['FREQ=WEEKLY;COUNT=3;UNTIL=20270101T000000Z', 'rule'],
    ['FREQ=WEEKLY;COUNT=0', 'rule'],
    ['FREQ=WEEKLY;INTERVAL=0', 'rule'],
    ['FREQ=WEEKLY;INTERVAL=-1', 'rule'],
    ['FREQ=WEEKLY;BYDAY=1MO', 'rule'],
    ['FREQ=WEEKLY;BYDAY=XX', 'rule'],
    ['FREQ=WEEKLY;BYMONTHDAY=3', 'rule'],
    ['FREQ=MONTHLY;BYMONTHDAY=0', 'rule'],
    ['FREQ=MONTHLY;BYMONTHDAY=32', 'rule'],
    ['FREQ=MONTHLY;BYWEEKNO=3', 'rule'],
    ['FREQ=DAILY;BYHOUR=24', 'rule'],
    ['FREQ=MONTHLY;BYSETPOS=1', 'rule'],
    ['FREQ=WEEKLY;FREQ=DAILY', 'rule'],
    ['FREQ=WEEKLY;BYEASTER=1', 'rule'],
    ['FREQ=FORTNIGHTLY', 'rule'],
    ['BYDAY=MO', 'rule'],
    ['every week', 'rule'],
    ['FREQ=WEEKLY;', 'rule'],
    ['FREQ=YEARLY;BYYEARDAY=1;BYDAY=MO', 'unsupported'],
    ['', 'required'],
  ])('%s is refused as %s, in bounded time', (rrule, code) => {
    // A Monday.
    const body = { timeZone: 'Europe/London', start: '2026-03-02T07:30', rrule, count: 10 };
    const started = performance.now();
    expect(() => meetingDates(body)).toThrow(expect.objectContaining({ field: 'rrule', code }));
    expect(performance.now() - started).toBeLessThan(10_000);
  });

  test.each([
    [{ timeZone: 'Mars/Olympus' }, 'timeZone', 'time-zone'],
    [{ timeZone: '+01:00' }, 'timeZone', 'time-zone'],
    [{ timeZone: '' }, 'timeZone', 'required'],
    [{ timeZone: null }, 'timeZone', 'required'],
    [{ start: '2026-02-30T07:30' }, 'start', 'date'],
    [{ start: '2026-03-02' }, 'start', 'date'],
    [{ start: '2026-03-02T07:30Z' }, 'start', 'date'],
    [{ start: '2026-03-02T24:00' }, 'start', 'date'],
    [{ start: '2026-03-02T07:30:00' }, 'start', 'date'],
    [{ count: 0 }, 'count', 'range'],
    [{ count: 501 }, 'count', 'range'],
    [{ count: 2.5 }, 'count', 'integer'],
    [{ count: null }, 'count', 'required'],
    [{ rrule: null }, 'rrule', 'required'],
  ])('%j is refused at %s as %s', (change, field, code) => {
    const body = { timeZone: 'Europe/London', start: '2026-03-02T07:30', rrule: 'FREQ=WEEKLY', count: 2, ...change };
    expect(() => meetingDates(body as MeetingDatesInput)).toThrow(expect.objectContaining({ field, code }));
  });

  // What any weekly series must hold: rising moments, and the same wall time each week by Intl's own zone data.
  test('a weekly series keeps its wall time in every zone', () => {
    const zones = fc.constantFrom('Europe/London', 'America/St_Johns', 'Australia/Lord_Howe', 'Asia/Kolkata', 'Pacific/Apia');
    fc.assert(
      fc.property(zones, fc.integer({ min: 0, max: 700 }), fc.integer({ min: 6, max: 22 }), (timeZone, day, hour) => {
        const date = new Date(Date.UTC(2026, 0, 1 + day)).toISOString().slice(0, 10);
        const start = `${date}T${String(hour).padStart(2, '0')}:10`;
        const { utc } = meetingDates({ timeZone, start, rrule: 'FREQ=WEEKLY', count: 60 });
        expect(utc).toEqual([...utc].sort());
        const clock = new Intl.DateTimeFormat('en-GB', { timeZone, hour: '2-digit', minute: '2-digit', weekday: 'short' });
        expect(new Set(utc.map((moment) => clock.format(new Date(moment)))).size).toBe(1);
      }),
      { numRuns: 30 },
    );
  });
});
