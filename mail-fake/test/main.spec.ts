import { type ChildProcess, execFileSync, spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtemp, rm } from 'node:fs/promises';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createTransport } from 'nodemailer';

const BUILD = join('.cache', 'test-build');
const running = new Set<ChildProcess>();
let dataDir: string;

// The program is started as users start it, so it is compiled first.
beforeAll(() => {
  execFileSync('npx', ['tsc', '-p', 'tsconfig.json', '--outDir', BUILD], { stdio: 'inherit' });
}, 120_000);

beforeEach(async () => {
  dataDir = await mkdtemp(join(tmpdir(), 'mail-fake-'));
});

afterEach(async () => {
  for (const child of running) {
    child.kill('SIGKILL');
  }
  await rm(dataDir, { recursive: true, force: true });
});

function launch(settings: Record<string, string> = {}) {
  const child = spawn(process.execPath, [join(BUILD, 'main.js')], {
    env: {
      ...process.env,
      KERFSIDE_SMTP_PORT: '0',
      KERFSIDE_MAIL_PORT: '0',
      KERFSIDE_MAIL_DATA: join(dataDir, 'mail'),
      ...settings,
    },
  });
  running.add(child);
  let output = '';
  const ended = once(child, 'exit').then(([code]) => {
    running.delete(child);
    return { code: code as number | null, output };
  });
  const ready = new Promise<{ smtpPort: number; origin: string }>((resolve, reject) => {
    const read = (chunk: Buffer) => {
      output += chunk;
      const line = /^mail-fake is ready: smtp 127\.0\.0\.1:(\d+), http (127\.0\.0\.1:\d+)\n$/.exec(output);
      if (line) {
        resolve({ smtpPort: Number(line[1]), origin: `http://${line[2]}` });
      }
    };
    child.stdout.on('data', read);
    child.stderr.on('data', read);
    void ended.then(() => reject(new Error(`ended before it was ready: ${output}`)));
  });
  ready.catch(() => undefined);
  return { child, ready, ended };
}

async function sendTo(port: number, subject: string): Promise<void> {
  const transport = createTransport({ host: '127.0.0.1', port });
  await transport.sendMail({ from: 'a@b.example', to: 'c@d.example', subject, text: 'x' });
}

async function subjectsAt(origin: string): Promise<string[]> {
  const messages = (await (await fetch(`${origin}/api/messages`)).json()) as { subject: string }[];
  return messages.map(({ subject }) => subject);
}

it.each(['SIGTERM', 'SIGINT'] as const)('ends with 0 on %s, a client still connected', async (signal) => {
  const { child, ready, ended } = launch();
  const { smtpPort } = await ready;
  const transport = createTransport({ host: '127.0.0.1', port: smtpPort, pool: true });
  await transport.verify();
  child.kill(signal);
  expect((await ended).code).toBe(0);
  transport.close();
});

it('keeps what it has acknowledged when it is killed', async () => {
  const first = launch();
  const { smtpPort } = await first.ready;
  await sendTo(smtpPort, 'acknowledged');
  first.child.kill('SIGKILL');
  await first.ended;
  const second = launch();
  expect(await subjectsAt((await second.ready).origin)).toEqual(['acknowledged']);
});

it.each(['KERFSIDE_SMTP_PORT', 'KERFSIDE_MAIL_PORT'])('names %s when its port is taken, and ends with 1', async (setting) => {
  const taker = createServer().listen(0, '127.0.0.1');
  await once(taker, 'listening');
  try {
    const { code, output } = await launch({ [setting]: String((taker.address() as AddressInfo).port) }).ended;
    expect(output).toContain(setting);
    expect(code).toBe(1);
  } finally {
    taker.close();
  }
});

it('names a setting that is not a port', async () => {
  const { code, output } = await launch({ KERFSIDE_MAIL_PORT: 'many' }).ended;
  expect(output).toContain('KERFSIDE_MAIL_PORT must be a port number');
  expect(code).toBe(1);
});
