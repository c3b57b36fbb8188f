import ical, { ICalAttendeeRole, ICalAttendeeStatus, ICalAttendeeType, ICalCalendarMethod, ICalEventStatus } from 'ical-generator';

/** One meeting in somebody's calendar. */
export interface CalendarFacts {
  method: 'REQUEST' | 'CANCEL';
  /** The same for all that is ever sent of a meeting. */
  uid: string;
  sequence: number;
  start: Date;
  end: Date;
  summary: string;
  description: string;
  url: string;
}

export interface CalendarPeople {
  organizer: { name: string; email: string };
  attendee: { name: string; email: string };
  /** When this message about the meeting was written. */
  stamp: Date;
}

// RFC 5545 3.2: a parameter value can hold no double quote and no control character
const asParameter = (text: string) => text.replace(/"/g, "'").replace(/\p{Cc}+/gu, ' ').trim();

/**
 * The calendar part of a mail to one member (RFC 5545, 5546). Times are given in UTC, so that no calendar
 * has to know the conference's zone.
 */
export function calendarPart(facts: CalendarFacts, { organizer, attendee, stamp }: CalendarPeople): string {
  const isCancelled = facts.method === 'CANCEL';
  const calendar = ical({
    prodId: { company: 'Kerfside', product: 'Conference', language: 'EN' },
    method: isCancelled ? ICalCalendarMethod.CANCEL : ICalCalendarMethod.REQUEST,
  });
  calendar.createEvent({
    id: facts.uid,
    sequence: facts.sequence,
    stamp,
    start: facts.start,
    end: facts.end,
    summary: facts.summary,
    description: facts.description,
    url: facts.url,
    status: isCancelled ? ICalEventStatus.CANCELLED : ICalEventStatus.CONFIRMED,
    organizer: { name: asParameter(organizer.name), email: organizer.email },
    attendees: [
      {
        name: asParameter(attendee.name),
        email: attendee.email,
        type: ICalAttendeeType.INDIVIDUAL,
        role: ICalAttendeeRole.REQ,
        status: ICalAttendeeStatus.NEEDSACTION,
        rsvp: !isCancelled,
      },
    ],
  });
  return calendar.toString();
}
