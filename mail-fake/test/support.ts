import { execFile } from 'node:child_process';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { createTransport, type SendMailOptions } from 'nodemailer';
import request from 'supertest';
import { type MailFake, startMailFake } from '../src/server.js';

const run = promisify(execFile);

/** A mail-fake on free ports with a folder of its own, and what a test does with it. */
export class Bench {
  private constructor(
    private fake: MailFake,
    readonly dataDir: string,
  ) {}

  static async start(): Promise<Bench> {
    const dataDir = await mkdtemp(join(tmpdir(), 'mail-fake-'));
    return new Bench(await startMailFake({ smtpPort: 0, httpPort: 0, dataDir }), dataDir);
  }

  get smtpPort(): number {
    return this.fake.smtpPort;
  }

  get origin(): string {
    return `http://127.0.0.1:${this.fake.httpPort}`;
  }

  get http() {
    return request(this.origin);
  }

  async restart(): Promise<void> {
    await this.fake.close();
    this.fake = await startMailFake({ smtpPort: 0, httpPort: 0, dataDir: this.dataDir });
  }

  async stop(): Promise<void> {
    await this.fake.close();
    await rm(this.dataDir, { recursive: true, force: true });
  }

  /** Sends with nodemailer, an SMTP client from outside the project; several over one connection, in order. */
  async send(mail: SendMailOptions | SendMailOptions[], options: object = {}): Promise<void> {
    const settings = { host: '127.0.0.1', port: this.smtpPort, secure: false, ...options };
    const transport = Array.isArray(mail)
      ? createTransport({ ...settings, pool: true, maxConnections: 1 })
      : createTransport(settings);
    try {
      for (const one of [mail].flat()) {
        await transport.sendMail({ from: 'sender@clinic.example', ...one });
      }
    } finally {
      transport.close();
    }
  }

  async list(query: object = {}) {
    const response = await this.http.get('/api/messages').query(query).expect(200);
    return response.body as { id: string; from: string; to: string[]; subject: string; date: string }[];
  }

  async readNewest() {
    const [newest] = await this.list();
    return (await this.http.get(`/api/messages/${newest?.id}`).expect(200)).body;
  }

  /** The message as received. */
  async readRaw(id: string): Promise<string> {
    const response = await fetch(`${this.origin}/api/messages/${id}/raw`);
    return response.text();
  }

  async behave(settings: object): Promise<void> {
    await this.http.put('/api/behaviour').send(settings).expect(200);
  }
}

/** Runs Debian's swaks, an SMTP client from outside the project; its exit code is part of the answer. */
export async function swaks(...args: string[]): Promise<{ code: number; output: string }> {
  try {
    const { stdout, stderr } = await run('/usr/bin/swaks', args);
    return { code: 0, output: stdout + stderr };
  } catch (error) {
    const failure = error as { code?: number | string; stdout?: string; stderr?: string };
    if (failure.code === 'ENOENT') {
      throw new Error('swaks is not installed: apt-get install swaks');
    }
    return { code: Number(failure.code), output: `${failure.stdout}${failure.stderr}` };
  }
}

/** Asks again until the answer is true; fails after ten seconds. */
export async function until(what: string, isTrue: () => Promise<boolean>): Promise<void> {
  const end = Date.now() + 10_000;
  while (!(await isTrue())) {
    if (Date.now() > end) {
      throw new Error(`Waited in vain until ${what}`);
    }
    await new Promise((resolve) => setTimeout(resolve, 15));
  }
}
