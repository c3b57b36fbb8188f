import { execFile, spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { mkdtemp, rm } from 'node:fs/promises';
import { createServer, type AddressInfo, type Server } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createInterface } from 'node:readline';
import { promisify } from 'node:util';
import { GetObjectCommand, PutObjectCommand, S3Client } from '@aws-sdk/client-s3';

// The program as it runs in the end: built, and in a process of its own.
const built = join(process.cwd(), '.cache', `main-spec-${process.pid}`);
let dataDir: string;
const started: ChildProcess[] = [];

beforeAll(async () => {
  dataDir = await mkdtemp(join(tmpdir(), 'object-store-fake-main-'));
  const compiler = require.resolve('typescript/bin/tsc');
  await promisify(execFile)(process.execPath, [compiler, '-p', 'tsconfig.json', '--outDir', built]);
}, 120_000);

afterAll(async () => {
  for (const child of started) if (child.exitCode === null) child.kill('SIGKILL');
  await rm(built, { recursive: true, force: true });
  await rm(dataDir, { recursive: true, force: true });
});

interface Run {
  child: ChildProcess;
  firstLine: Promise<string>;
  ended: Promise<{ code: number | null; errors: string }>;
}

function run(env: Record<string, string>): Run {
  const child = spawn(process.execPath, [join(built, 'main.js')], {
    env: { PATH: process.env['PATH'], KERFSIDE_OBJECT_STORE_DATA: dataDir, ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  started.push(child);
  let errors = '';
  child.stderr?.on('data', (data: Buffer) => (errors += data.toString()));
  const lines = createInterface({ input: child.stdout ?? process.stdin });
  return {
    child,
    firstLine: once(lines, 'line').then(([line]) => String(line)),
    ended: once(child, 'close').then(([code]) => ({ code: code as number | null, errors })),
  };
}

async function takePort(): Promise<{ port: number; server: Server }> {
  const server = createServer();
  server.listen(0, '127.0.0.1');
  await once(server, 'listening');
  return { port: (server.address() as AddressInfo).port, server };
}

function clientFor(line: string): S3Client {
  const address = /^object-store-fake is ready: (127\.0\.0\.1:\d+)$/.exec(line)?.[1];
  if (address === undefined) throw new Error(`not the line that was announced: ${line}`);
  return new S3Client({
    endpoint: `http://${address}`,
    region: 'eu-west-1',
    credentials: { accessKeyId: 'kerfside', secretAccessKey: 'kerfside-local-secret' },
    forcePathStyle: true,
  });
}

it.each(['SIGTERM', 'SIGINT'] as const)('starts with its defaults, keeps what it was given, ends cleanly on %s', async (signal) => {
  const Key = `until-${signal}`;
  const first = run({ KERFSIDE_OBJECT_STORE_PORT: '0' });
  const writer = clientFor(await first.firstLine);
  await writer.send(new PutObjectCommand({ Bucket: 'kerfside', Key, Body: Buffer.from('kept') }));
  writer.destroy();
  first.child.kill(signal);
  expect(await first.ended).toEqual({ code: 0, errors: '' });

  const second = run({ KERFSIDE_OBJECT_STORE_PORT: '0' });
  const reader = clientFor(await second.firstLine);
  const answer = await reader.send(new GetObjectCommand({ Bucket: 'kerfside', Key }));
  expect(await answer.Body?.transformToString()).toBe('kept');
  reader.destroy();
  second.child.kill(signal);
  expect((await second.ended).code).toBe(0);
});

it('says which setting to change when its port is taken', async () => {
  const { port, server } = await takePort();
  const { code, errors } = await run({ KERFSIDE_OBJECT_STORE_PORT: String(port) }).ended;
  server.close();
  expect(code).toBe(1);
  expect(errors).toContain('KERFSIDE_OBJECT_STORE_PORT');
  expect(errors.trim().split('\n')).toHaveLength(1);
});

it.each([
  ['KERFSIDE_OBJECT_STORE_PORT', 'not-a-port'],
  ['KERFSIDE_OBJECT_STORE_PORT', '70000'],
  ['KERFSIDE_S3_BUCKET', 'Not_A_Bucket'],
])('names a bad %s without its value', async (name, value) => {
  const { code, errors } = await run({ KERFSIDE_OBJECT_STORE_PORT: '0', [name]: value }).ended;
  expect(code).toBe(1);
  expect(errors).toContain(name);
  expect(errors).not.toContain(value);
});
