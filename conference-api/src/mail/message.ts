import addressparser from 'nodemailer/lib/addressparser';
import MailComposer from 'nodemailer/lib/mail-composer';
import { calendarPart } from './calendar.js';
import type { OutboxMail } from './entities/outbox-mail.entity.js';
import { asHtml } from './templates/as-html.js';
import { asText } from './templates/as-text.js';
import { renderTemplate } from './templates/registry.js';

export interface Mailbox {
  name: string;
  email: string;
}

export interface WholeMessage {
  envelope: { from: string; to: string[] };
  bytes: Buffer;
}

const FOOTER = 'Kerfside wrote this mail by itself. It holds no clinical detail: sign in to read what it tells of. Answers to this address are not read.';

/** Reads `Name <address>`. */
export function mailboxOf(text: string): Mailbox {
  const [first] = addressparser(text, { flatten: true });
  return { name: first?.name || 'Kerfside', email: first?.address ?? text };
}

/** The mail as it goes over the wire. The same row gives the same Message-ID, however often it is tried. */
export async function buildMessage(mail: OutboxMail, sender: Mailbox): Promise<WholeMessage> {
  const { subject, blocks, calendar } = renderTemplate(mail.template, mail.data);
  const name = typeof mail.data['name'] === 'string' ? mail.data['name'] : '';
  const composer = new MailComposer({
    from: { name: sender.name, address: sender.email },
    to: { name, address: mail.recipient },
    subject,
    date: mail.createdAt,
    messageId: mail.messageId,
    headers: { 'Auto-Submitted': 'auto-generated' },
    text: asText(blocks, FOOTER),
    html: asHtml(subject, blocks, FOOTER),
    ...(calendar && {
      icalEvent: {
        method: calendar.method,
        filename: calendar.method === 'CANCEL' ? 'cancelled.ics' : 'meeting.ics',
        content: calendarPart(calendar, {
          organizer: { name: calendar.summary, email: sender.email },
          attendee: { name: name || mail.recipient, email: mail.recipient },
          stamp: mail.createdAt,
        }),
      },
    }),
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  return { envelope: { from: sender.email, to: [mail.recipient] }, bytes: await composer.compile().build() };
}
