import { type AddressObject, type Attachment, type ParsedMail, simpleParser } from 'mailparser';

export interface AttachmentSummary {
  filename: string | null;
  contentType: string;
  size: number;
  index: number;
}

export interface MessageContent {
  text: string | null;
  html: string | null;
  headers: Record<string, string | string[]>;
  attachments: AttachmentSummary[];
  ics: string | null;
}

// A text is never made from the HTML part or the other way round: a test must see what was sent.
const AS_SENT = { skipHtmlToText: true, skipTextToHtml: true, skipTextLinks: true };

/** Reads sender and subject from the head of a message. Never throws: what can't be read is kept all the same. */
export async function parseHeaderSection(head: Buffer): Promise<{ from: string | null; subject: string | null }> {
  try {
    const mail = await simpleParser(head, AS_SENT);
    return { from: mail.from?.value[0]?.address || null, subject: mail.subject ?? null };
  } catch {
    return { from: null, subject: null };
  }
}

/** The parts of a message. `inlineImages` puts the pictures that the HTML names by `cid:` into it, for showing. */
export async function parseMessage(raw: Buffer, inlineImages = false): Promise<MessageContent> {
  const mail = await simpleParser(raw, { ...AS_SENT, keepCidLinks: !inlineImages });
  const calendar = mail.attachments.find(({ contentType }) => contentType.toLowerCase() === 'text/calendar');
  return {
    // Without a text part the parser says '' beside an HTML part.
    text: mail.text || null,
    html: mail.html || null,
    headers: readHeaders(mail),
    attachments: mail.attachments.map((attachment, index) => ({
      filename: attachment.filename ?? null,
      contentType: attachment.contentType,
      size: attachment.size,
      index,
    })),
    ics: calendar ? decodeText(calendar) : null,
  };
}

/** One attachment with its bytes, or null when the message has no such number. */
export async function parseAttachment(raw: Buffer, index: number): Promise<Attachment | null> {
  const mail = await simpleParser(raw, AS_SENT);
  return mail.attachments[index] ?? null;
}

/** Unfolded header values by lower-case name; subject and addresses decoded, the others as sent. */
function readHeaders(mail: ParsedMail): Record<string, string | string[]> {
  const lines = new Map<string, string[]>();
  for (const { key, line } of mail.headerLines ?? []) {
    const value = line.slice(line.indexOf(':') + 1).replace(/\r?\n(?=[ \t])/g, '').trim();
    lines.set(key, [...(lines.get(key) ?? []), Buffer.from(value, 'latin1').toString('utf8')]);
  }
  // No prototype: a header may be called `__proto__`.
  const headers: Record<string, string | string[]> = Object.create(null);
  for (const [key, values] of lines) {
    const decoded = mail.headers.get(key);
    if (values.length > 1) {
      headers[key] = values;
    } else if (typeof decoded === 'string') {
      headers[key] = decoded;
    } else {
      headers[key] = isAddress(decoded) ? decoded.text : (values[0] ?? '');
    }
  }
  return headers;
}

function isAddress(value: unknown): value is AddressObject {
  return typeof value === 'object' && value !== null && 'text' in value && 'html' in value;
}

function decodeText(attachment: Attachment): string {
  const type = attachment.headers.get('content-type') as { params?: { charset?: string } } | undefined;
  const charset = type?.params?.charset;
  try {
    return new TextDecoder(charset || 'utf-8').decode(attachment.content);
  } catch {
    return attachment.content.toString('utf8');
  }
}
