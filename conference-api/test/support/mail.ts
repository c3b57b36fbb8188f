/** A mail as mail-fake shows it. */
export interface CaughtMail {
  id: string;
  from: string;
  to: string[];
  subject: string;
  date: string;
  text: string;
  html: string;
  headers: Record<string, string | string[]>;
  attachments: { filename: string; contentType: string; size: number }[];
  ics: string | null;
}

const base = () => process.env['KERFSIDE_TEST_MAIL_URL'] ?? '';

/** All mails that mail-fake has for an address, newest first, whole. */
export async function mailsTo(address: string): Promise<CaughtMail[]> {
  const list = (await (await fetch(`${base()}/api/messages?to=${encodeURIComponent(address)}`)).json()) as { id: string }[];
  return Promise.all(list.map(async ({ id }) => (await (await fetch(`${base()}/api/messages/${id}`)).json()) as CaughtMail));
}

/** The mail as it came over the wire. */
export const rawOf = async (mail: CaughtMail): Promise<string> => (await (await fetch(`${base()}/api/messages/${mail.id}/raw`)).text()).replaceAll('\r\n', '\n');
