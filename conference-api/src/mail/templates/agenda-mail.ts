import type { CalendarFacts } from '../calendar.js';
import { heading, link, note, paragraph, table } from './blocks.js';
import { dayIn, momentIn } from './dates.js';
import type { Template } from './template.js';

export interface AgendaData {
  conference: string;
  meetingId: string;
  /** iCalendar SEQUENCE: 0 at the first sending. */
  sequence: number;
  startsAt: string;
  minutes: number;
  timeZone: string;
  items: { code: string; minutes: number; presenter: string }[];
  url: string;
  cancelled?: boolean;
}

const COLUMNS = [{ title: 'No.', numeric: true }, { title: 'Case', isCode: true }, { title: 'Presenter' }, { title: 'Min', numeric: true }];

export const agenda: Template<AgendaData> = {
  needs: ['conference', 'meetingId', 'sequence', 'startsAt', 'minutes', 'timeZone', 'items', 'url'],
  render: (data) => ({ ...(data.cancelled ? cancelled(data) : planned(data)), calendar: calendarOf(data) }),
};

function planned({ conference, sequence, startsAt, minutes, timeZone, items, url }: AgendaData) {
  const start = new Date(startsAt);
  const asked = items.reduce((sum, item) => sum + item.minutes, 0);
  return {
    subject: `${conference}: ${sequence > 0 ? 'changed agenda' : 'agenda'} for ${dayIn(start, timeZone)}`,
    blocks: [
      heading(`${conference}: agenda`),
      paragraph(`${momentIn(start, timeZone)}, ${minutes} minutes.`),
      ...(sequence > 0 ? [paragraph('This replaces the agenda sent before.')] : []),
      items.length
        ? table(
            COLUMNS,
            items.map((item, index) => [String(index + 1), item.code, item.presenter, String(item.minutes)]),
          )
        : paragraph('No cases are listed so far.'),
      ...(asked > minutes ? [note(`The cases ask for ${asked} minutes: what does not fit waits for the next meeting.`)] : []),
      link('Open the agenda', url),
    ],
  };
}

function cancelled({ conference, startsAt, timeZone, url }: AgendaData) {
  const start = new Date(startsAt);
  return {
    subject: `${conference}: meeting of ${dayIn(start, timeZone)} cancelled`,
    blocks: [
      heading(`${conference}: meeting cancelled`),
      paragraph(`The meeting of ${momentIn(start, timeZone)} does not take place. Its cases are open again, for a later meeting.`),
      link('Read why', url),
    ],
  };
}

function calendarOf({ conference, meetingId, sequence, startsAt, minutes, items, url, cancelled: isCancelled }: AgendaData): CalendarFacts {
  const start = new Date(startsAt);
  return {
    method: isCancelled ? 'CANCEL' : 'REQUEST',
    uid: `meeting-${meetingId}@kerfside.example`,
    sequence,
    start,
    end: new Date(start.getTime() + minutes * 60_000),
    summary: conference,
    description: isCancelled
      ? 'Cancelled.'
      : [items.length ? `Cases: ${items.map((item) => `${item.code} (${item.minutes} min)`).join(', ')}` : 'No cases are listed so far.', url].join('\n'),
    url,
  };
}
