import { LIMIT_MS } from './visitors.js';

export interface Mail {
  id: string;
  subject: string;
  text: string;
  ics: string | null;
}

function mailUrl(): string {
  const address = process.env['KERFSIDE_TEST_MAIL_URL'];
  if (!address) throw new Error('KERFSIDE_TEST_MAIL_URL must name the address of the mail server’s page.');
  return address.replace(/\/$/, '');
}

async function get<T>(path: string): Promise<T> {
  const response = await fetch(`${mailUrl()}${path}`);
  if (!response.ok) throw new Error(`${path} answered ${response.status}`);
  return (await response.json()) as T;
}

/** The newest mail to an address that fits, once it has arrived. */
export async function mailTo(address: string, fits: (mail: Mail) => boolean): Promise<Mail> {
  const end = Date.now() + LIMIT_MS;
  const seen = new Map<string, Mail>();
  for (;;) {
    const list = await get<{ id: string; subject: string }[]>(`/api/messages?to=${encodeURIComponent(address)}&limit=20`);
    for (const { id } of list) if (!seen.has(id)) seen.set(id, await get<Mail>(`/api/messages/${id}`));
    const found = list.map(({ id }) => seen.get(id)!).find(fits);
    if (found) return found;
    if (Date.now() > end) throw new Error(`No such mail to ${address}; there are: ${list.map(({ subject }) => subject).join('; ')}`);
    await new Promise((later) => setTimeout(later, 250));
  }
}
