import { once } from 'node:events';
import { writeFile } from 'node:fs/promises';
import { request, type IncomingMessage } from 'node:http';
import { join } from 'node:path';
import { GetObjectCommand, HeadObjectCommand, ListObjectsV2Command, PutObjectCommand } from '@aws-sdk/client-s3';
import { startObjectStoreFake } from '../src/object-store-fake.js';
import { refusal } from './support/requests.js';
import { BUCKET, filesBelow, startTestServer, type TestServer } from './support/server.js';

let server: TestServer;
beforeEach(async () => {
  server = await startTestServer();
});
afterEach(() => server.stop());

const put = (Key: string, Body: string, more = {}) =>
  server.s3.send(new PutObjectCommand({ Bucket: BUCKET, Key, Body: Buffer.from(Body), ...more }));
const textOf = async (Key: string) =>
  (await server.s3.send(new GetObjectCommand({ Bucket: BUCKET, Key }))).Body?.transformToString();
const head = (Key: string) => server.s3.send(new HeadObjectCommand({ Bucket: BUCKET, Key }));

describe('after a restart', () => {
  it('everything is as it was', async () => {
    await put('kept/ä', 'words', { ContentType: 'text/plain', Metadata: { a: '1' } });
    const { $metadata: _before, ...before } = await head('kept/ä');
    await server.restart();
    expect(await textOf('kept/ä')).toBe('words');
    const { $metadata: _after, ...after } = await head('kept/ä');
    expect(after).toEqual(before);
    await put('kept/ä', 'new words');
    expect(await textOf('kept/ä')).toBe('new words');
  });

  it('what was half-written is cleared away', async () => {
    await put('kept', 'words');
    await writeFile(join(server.dataDir, 'tmp', 'left-by-a-crash'), 'half');
    await server.restart();
    expect(await filesBelow(join(server.dataDir, 'tmp'))).toEqual([]);
    expect((await server.s3.send(new ListObjectsV2Command({ Bucket: BUCKET }))).KeyCount).toBe(1);
  });
});

describe('a reader', () => {
  it('gets one whole version while the object is being replaced', async () => {
    const versions = ['a', 'b'].map((letter) => letter.repeat(300_000));
    await put('busy', versions[0] ?? '');
    let writing = true;
    const writer = (async () => {
      for (let round = 0; round < 20; round += 1) await put('busy', versions[round % 2] ?? '');
      writing = false;
    })();
    const seen: (string | undefined)[] = [];
    while (writing) seen.push(await textOf('busy'));
    await writer;
    expect(seen.length).toBeGreaterThan(0);
    expect(seen.filter((text) => !versions.includes(text ?? ''))).toEqual([]);
  });
});

describe('the switch', () => {
  it('makes every request fail until it is turned back, and nothing is lost', async () => {
    await put('before', 'kept');
    expect(await (await server.behave({ mode: 'fail' })).json()).toEqual({ mode: 'fail', delayMs: 0 });
    expect(await refusal(put('during', 'x'))).toEqual({ code: 'SlowDown', status: 503 });
    expect(await refusal(textOf('before'))).toEqual({ code: 'SlowDown', status: 503 });
    expect(await (await fetch(`${server.url}/__behaviour`)).json()).toEqual({ mode: 'fail', delayMs: 0 });
    await server.behave({ mode: 'ok' });
    expect(await textOf('before')).toBe('kept');
    expect(await refusal(textOf('during'))).toMatchObject({ code: 'NoSuchKey' });
    await put('during', 'now');
    expect(await textOf('during')).toBe('now');
  });

  it('is outlasted by a client that tries again', async () => {
    await server.behave({ mode: 'fail' });
    const patient = server.client({ maxAttempts: 10 });
    let attempts = 0;
    patient.middlewareStack.add(
      (next) => async (args) => {
        attempts += 1;
        if (attempts === 2) await server.behave({ mode: 'ok' });
        return next(args);
      },
      { step: 'finalizeRequest', priority: 'low', name: 'count' },
    );
    await patient.send(new PutObjectCommand({ Bucket: BUCKET, Key: 'patient', Body: Buffer.from('here') }));
    expect(attempts).toBe(2);
    expect(await textOf('patient')).toBe('here');
  });

  it('delays', async () => {
    await put('slow', 'words');
    await server.behave({ mode: 'delay', delayMs: 300 });
    const start = performance.now();
    expect(await textOf('slow')).toBe('words');
    // Timers may fire a millisecond early.
    expect(performance.now() - start).toBeGreaterThanOrEqual(299);
  });

  it('lets go of waiting requests when the server ends', async () => {
    await server.behave({ mode: 'delay', delayMs: 60_000 });
    const outgoing = request(`${server.url}/${BUCKET}/waits`, {
      method: 'PUT',
      headers: { expect: '100-continue', 'content-length': '1', connection: 'close' },
    });
    const answered = once(outgoing, 'response') as Promise<[IncomingMessage]>;
    // The server says 'continue' as soon as it has the request, so now it waits.
    await once(outgoing, 'continue');
    outgoing.end('x');
    await server.restart();
    const [answer] = await answered;
    expect(answer.statusCode).toBe(403);
    answer.resume();
  });

  it.each([{}, { mode: 'broken' }, { mode: 'delay', delayMs: -1 }, { mode: 'delay', delayMs: 'long' }, [], null])(
    'refuses %j and stays as it is',
    async (body) => {
      const answer = await server.behave(body);
      expect(answer.status).toBe(400);
      expect(await (await fetch(`${server.url}/__behaviour`)).json()).toEqual({ mode: 'ok', delayMs: 0 });
    },
  );
});

it('leaves the folder of another process alone when the port is taken', async () => {
  await writeFile(join(server.dataDir, 'tmp', 'upload-under-way'), 'half');
  const second = startObjectStoreFake({
    port: Number(new URL(server.url).port),
    dataDir: server.dataDir,
    accessKeyId: 'k',
    secretAccessKey: 's',
    region: 'eu-west-1',
    buckets: ['second'],
  });
  await expect(second).rejects.toMatchObject({ code: 'EADDRINUSE' });
  expect(await filesBelow(join(server.dataDir, 'tmp'))).toHaveLength(1);
});
