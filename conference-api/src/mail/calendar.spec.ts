import ICAL from 'ical.js';
import { calendarPart, type CalendarFacts } from './calendar.js';

// Read by ical.js, a parser independent of the writer. Rules: RFC 5545 3.1 (folding), 3.3.11 (text), 3.8.4
// (attendee, organizer, uid), 3.8.7.4 (sequence); RFC 5546 3.2.2 (REQUEST) and 3.2.5 (CANCEL).
const facts: CalendarFacts = {
  method: 'REQUEST',
  uid: 'meeting-5f0c@kerfside.example',
  sequence: 2,
  start: new Date('2026-12-09T07:30:00Z'),
  end: new Date('2026-12-09T08:45:00Z'),
  summary: 'Hip revision; north, "A"',
  description: `Cases: ${'é'.repeat(90)}\nhttp://127.0.0.1:4300/meetings/5f0c`,
  url: 'http://127.0.0.1:4300/meetings/5f0c',
};
const people = {
  organizer: { name: 'Hip revision, "A"', email: 'no-reply@kerfside.example' },
  attendee: { name: 'Dr. Élodie Ashgrove, ward "B"', email: 'elodie@kerfside.example' },
  stamp: new Date('2026-12-07T06:00:00Z'),
};

const parse = (text: string) => {
  const calendar = new ICAL.Component(ICAL.parse(text));
  const event = calendar.getFirstSubcomponent('vevent')!;
  return { calendar, event, value: (name: string) => event.getFirstPropertyValue(name) };
};

describe('the calendar part', () => {
  const text = calendarPart(facts, people);
  const { calendar, event, value } = parse(text);

  it('asks the member to answer, by method, organizer and attendee', () => {
    expect(calendar.getFirstPropertyValue('method')).toBe('REQUEST');
    expect(value('uid')).toBe('meeting-5f0c@kerfside.example');
    expect(value('sequence')).toBe(2);
    expect(String(value('organizer')).toLowerCase()).toBe('mailto:no-reply@kerfside.example');
    const attendee = event.getFirstProperty('attendee')!;
    expect(String(attendee.getFirstValue()).toLowerCase()).toBe('mailto:elodie@kerfside.example');
    expect(attendee.getParameter('rsvp')).toBe('TRUE');
    expect(attendee.getParameter('partstat')).toBe('NEEDS-ACTION');
    expect(attendee.getParameter('cn')).toBe("Dr. Élodie Ashgrove, ward 'B'");
  });

  it('gives the times in UTC', () => {
    const start = value('dtstart') as ICAL.Time;
    const end = value('dtend') as ICAL.Time;
    expect(start.zone.tzid).toBe('UTC');
    expect(start.toJSDate().toISOString()).toBe('2026-12-09T07:30:00.000Z');
    expect(end.toJSDate().toISOString()).toBe('2026-12-09T08:45:00.000Z');
    expect((value('dtstamp') as ICAL.Time).toJSDate().toISOString()).toBe('2026-12-07T06:00:00.000Z');
  });

  it('gives text back as it was', () => {
    expect(value('summary')).toBe(facts.summary);
    expect(value('description')).toBe(facts.description);
  });

  it('folds at 75 octets, between characters, with CRLF', () => {
    const lines = text.split('\r\n');
    expect(lines.join('')).not.toContain('\n');
    expect(Math.max(...lines.map((line) => Buffer.byteLength(line)))).toBeLessThanOrEqual(75);
    expect(lines.some((line) => line.startsWith(' '))).toBe(true);
    for (const line of lines) expect(Buffer.from(line).toString('utf8')).not.toContain('\ufffd');
  });

  it('takes a meeting back with CANCEL and a higher sequence', () => {
    const cancelled = parse(calendarPart({ ...facts, method: 'CANCEL', sequence: 3 }, people));
    expect(cancelled.calendar.getFirstPropertyValue('method')).toBe('CANCEL');
    expect(cancelled.value('uid')).toBe(value('uid'));
    expect(cancelled.value('sequence')).toBe(3);
    expect(cancelled.value('status')).toBe('CANCELLED');
  });

  it('lets no name break out of its parameter', () => {
    const hostile = calendarPart(facts, { ...people, attendee: { name: 'A"\r\nATTENDEE:mailto:b@x.example', email: 'a@kerfside.example' } });
    expect(parse(hostile).event.getAllProperties('attendee')).toHaveLength(1);
  });
});
