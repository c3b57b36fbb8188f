import { type MailFake, startMailFake } from '@kerfside/mail-fake';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { CaughtMail } from './mail.js';

export interface MailServer {
  smtpUrl: string;
  behave: (behaviour: { mode: 'accept' | 'refuse' | 'delay'; code?: 451 | 550; at?: 'connect' | 'rcpt' | 'data'; delayMs?: number }) => Promise<void>;
  /** All that it has taken for an address. */
  to: (address: string) => Promise<CaughtMail[]>;
  stop: () => Promise<void>;
  /** Again on the same port, with what it had. */
  start: () => Promise<void>;
  remove: () => Promise<void>;
}

/** A mail server of the test's own, so that it can refuse and be stopped without another test's noticing. */
export async function startMailServer(): Promise<MailServer> {
  const dataDir = await mkdtemp(join(tmpdir(), 'kerfside-mail-'));
  let fake: MailFake | null = await startMailFake({ smtpPort: 0, httpPort: 0, dataDir });
  const { smtpPort, httpPort } = fake;
  const url = `http://127.0.0.1:${httpPort}/api`;
  const stop = async () => {
    await fake?.close();
    fake = null;
  };
  return {
    smtpUrl: `smtp://127.0.0.1:${smtpPort}`,
    behave: async (behaviour) => {
      const response = await fetch(`${url}/behaviour`, { method: 'PUT', headers: { 'content-type': 'application/json' }, body: JSON.stringify(behaviour) });
      if (!response.ok) throw new Error(`behaviour answered ${response.status}`);
    },
    to: async (address) => {
      const list = (await (await fetch(`${url}/messages?limit=500&to=${encodeURIComponent(address)}`)).json()) as { id: string }[];
      return Promise.all(list.map(async ({ id }) => (await (await fetch(`${url}/messages/${id}`)).json()) as CaughtMail));
    },
    stop,
    start: async () => {
      fake ??= await startMailFake({ smtpPort, httpPort, dataDir });
    },
    remove: async () => {
      await stop();
      await rm(dataDir, { recursive: true, force: true });
    },
  };
}
