import { createHash } from 'node:crypto';
import { request as send } from 'node:http';
import { existsSync } from 'node:fs';
import { Readable } from 'node:stream';
import { join } from 'node:path';
import {
  CopyObjectCommand,
  DeleteObjectCommand,
  GetObjectCommand,
  HeadObjectCommand,
  PutObjectCommand,
  type PutObjectCommandInput,
} from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import { plain, refusal, xmlText } from './support/requests.js';
import { BUCKET, filesBelow, startTestServer, type TestServer } from './support/server.js';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer({ maxObjectBytes: 3_000_000 });
});
afterAll(() => server.stop());

const put = (Key: string, Body: string | Buffer, more: Partial<PutObjectCommandInput> = {}) =>
  server.s3.send(new PutObjectCommand({ Bucket: BUCKET, Key, Body: Buffer.from(Body), ...more }));
const get = (Key: string, more = {}) => server.s3.send(new GetObjectCommand({ Bucket: BUCKET, Key, ...more }));
const textOf = async (Key: string, more = {}) => (await get(Key, more)).Body?.transformToString();

describe('put, get and head', () => {
  it('gives back the bytes with the headers they were sent with', async () => {
    const body = Buffer.from(Array.from({ length: 100_000 }, (_, index) => (index * 7) % 256));
    await put('images/one.png', body, {
      ContentType: 'image/png',
      CacheControl: 'private, max-age=60',
      ContentDisposition: 'inline',
      Metadata: { width: '640', 'made-by': 'test' },
    });
    const answer = await get('images/one.png');
    expect(Buffer.from((await answer.Body?.transformToByteArray()) ?? [])).toEqual(body);
    expect(answer).toMatchObject({
      ContentType: 'image/png',
      CacheControl: 'private, max-age=60',
      ContentDisposition: 'inline',
      Metadata: { width: '640', 'made-by': 'test' },
      ContentLength: 100_000,
      AcceptRanges: 'bytes',
      // S3's API reference, 'Object': the ETag of an object sent in one piece, unencrypted, is its MD5 digest.
      ETag: `"${createHash('md5').update(body).digest('hex')}"`,
    });
    const { $metadata, ...head } = await server.s3.send(
      new HeadObjectCommand({ Bucket: BUCKET, Key: 'images/one.png' }),
    );
    expect($metadata.httpStatusCode).toBe(200);
    expect(head).toMatchObject({ ContentLength: 100_000, ContentType: 'image/png', Metadata: { width: '640' } });
  });

  it('keeps an empty object', async () => {
    await put('empty', '');
    expect(await textOf('empty')).toBe('');
  });

  it('replaces an object, whose old headers go too', async () => {
    await put('twice', 'first', { Metadata: { old: 'yes' } });
    await put('twice', 'second');
    const answer = await get('twice');
    expect(await answer.Body?.transformToString()).toBe('second');
    expect(answer.Metadata).toEqual({});
  });

  it('takes a stream, which the SDK sends in chunks with a trailing checksum', async () => {
    const pieces = Array.from({ length: 40 }, (_, index) => Buffer.alloc(10_000, index));
    const whole = Buffer.concat(pieces);
    await server.s3.send(
      new PutObjectCommand({ Bucket: BUCKET, Key: 'stream', Body: Readable.from(pieces), ContentLength: whole.length }),
    );
    const answer = await get('stream');
    expect(Buffer.from((await answer.Body?.transformToByteArray()) ?? [])).toEqual(whole);
    expect(answer.ContentEncoding).toBeUndefined();
    expect(answer.ChecksumCRC32).toBeDefined();
  });

  it('answers an unknown key, bucket or too long a key in S3\'s codes', async () => {
    expect(await refusal(get('absent'))).toEqual({ code: 'NoSuchKey', status: 404 });
    expect(await refusal(server.s3.send(new HeadObjectCommand({ Bucket: BUCKET, Key: 'absent' })))).toMatchObject({
      status: 404,
    });
    const elsewhere = server.s3.send(new PutObjectCommand({ Bucket: 'no-such-bucket', Key: 'a', Body: 'a' }));
    expect(await refusal(elsewhere)).toEqual({ code: 'NoSuchBucket', status: 404 });
    // S3's user guide, 'Naming Amazon S3 objects': at most 1024 bytes of UTF-8.
    await put('é'.repeat(512), 'fits');
    expect(await refusal(put('é'.repeat(512) + 'a', 'too long'))).toEqual({ code: 'KeyTooLongError', status: 400 });
  });

  it('refuses more than the largest size', async () => {
    await put('large', Buffer.alloc(3_000_000));
    expect(await refusal(put('larger', Buffer.alloc(3_000_001)))).toEqual({ code: 'EntityTooLarge', status: 400 });
    const stream = new PutObjectCommand({
      Bucket: BUCKET,
      Key: 'larger',
      Body: Readable.from([Buffer.alloc(2_000_000), Buffer.alloc(2_000_000)]),
      ContentLength: 4_000_000,
    });
    expect(await refusal(server.s3.send(stream))).toEqual({ code: 'EntityTooLarge', status: 400 });
    expect(await refusal(get('larger'))).toMatchObject({ code: 'NoSuchKey' });
  });

  it('refuses more metadata than S3 takes', async () => {
    // S3's user guide, 'Working with object metadata': user-defined metadata is limited to 2 KB.
    expect(await refusal(put('meta', '', { Metadata: { note: 'x'.repeat(2100) } }))).toEqual({
      code: 'MetadataTooLarge',
      status: 400,
    });
  });
});

describe('keys', () => {
  const awkward = [
    '../../outside',
    '/leading',
    'a//b',
    'a/./b',
    'folder/',
    '..',
    'blank and+plus',
    'ünïcödé/日本/😀',
    "quote'\"<&>",
    '100%25',
    'a?b#c=d&e',
    'CON',
    'x'.repeat(300),
  ];

  it.each(awkward)('keeps %j apart from every other key', async (key) => {
    await put(key, `content of ${key}`);
    expect(await textOf(key)).toBe(`content of ${key}`);
  });

  it('writes nothing outside its folder', async () => {
    await put('../../../escaped', 'still inside');
    expect(existsSync(join(server.dataDir, 'escaped'))).toBe(false);
    expect(existsSync(join(server.dataDir, '..', 'escaped'))).toBe(false);
    expect(await textOf('../../../escaped')).toBe('still inside');
    for (const file of await filesBelow(join(server.dataDir, 'buckets', BUCKET, 'objects'))) {
      expect(file).toMatch(/objects\/[0-9a-f]{2}\/[0-9a-f]{64}$/);
    }
  });
});

describe('ranges and conditions', () => {
  beforeAll(() => put('digits', '0123456789'));

  // RFC 9110, section 14.1.2 defines these forms.
  it.each([
    ['bytes=0-3', '0123', 'bytes 0-3/10'],
    ['bytes=4-', '456789', 'bytes 4-9/10'],
    ['bytes=-3', '789', 'bytes 7-9/10'],
    ['bytes=8-100', '89', 'bytes 8-9/10'],
    ['bytes=-100', '0123456789', 'bytes 0-9/10'],
  ])('sends %s', async (Range, text, ContentRange) => {
    const answer = await get('digits', { Range });
    expect(answer.$metadata.httpStatusCode).toBe(206);
    expect(answer).toMatchObject({ ContentRange, ContentLength: text.length });
    expect(await answer.Body?.transformToString()).toBe(text);
  });

  it('refuses a range past the end and ignores one that makes no sense', async () => {
    expect(await refusal(get('digits', { Range: 'bytes=10-' }))).toEqual({ code: 'InvalidRange', status: 416 });
    for (const Range of ['bytes=5-2', 'lines=1-2', 'bytes=-']) {
      const answer = await get('digits', { Range });
      expect(answer.$metadata.httpStatusCode).toBe(200);
      expect(await answer.Body?.transformToString()).toBe('0123456789');
    }
  });

  it('says 304 for what the caller has already, 412 for what it must not be', async () => {
    const { ETag, LastModified } = await get('digits');
    const later = new Date((LastModified?.getTime() ?? 0) + 1000);
    const earlier = new Date((LastModified?.getTime() ?? 0) - 1000);
    expect(await refusal(get('digits', { IfNoneMatch: ETag }))).toMatchObject({ status: 304 });
    expect(await refusal(get('digits', { IfModifiedSince: LastModified }))).toMatchObject({ status: 304 });
    expect(await refusal(get('digits', { IfMatch: '"other"' }))).toEqual({ code: 'PreconditionFailed', status: 412 });
    expect(await refusal(get('digits', { IfUnmodifiedSince: earlier }))).toMatchObject({ status: 412 });
    expect(await textOf('digits', { IfNoneMatch: '"other"', IfModifiedSince: later })).toBe('0123456789');
    expect(await textOf('digits', { IfMatch: ETag, IfUnmodifiedSince: earlier })).toBe('0123456789');
    expect(await textOf('digits', { IfModifiedSince: earlier })).toBe('0123456789');
  });

  it('writes with If-None-Match: * only where there is nothing', async () => {
    await put('once', 'first', { IfNoneMatch: '*' });
    expect(await refusal(put('once', 'second', { IfNoneMatch: '*' }))).toEqual({
      code: 'PreconditionFailed',
      status: 412,
    });
    expect(await textOf('once')).toBe('first');
  });

  it('lets one of many simultaneous conditional writes win', async () => {
    const bodies = Array.from({ length: 12 }, (_, index) => `writer ${index}`);
    const results = await Promise.allSettled(bodies.map((body) => put('raced', body, { IfNoneMatch: '*' })));
    const winners = bodies.filter((_, index) => results[index]?.status === 'fulfilled');
    expect(winners).toHaveLength(1);
    expect(await textOf('raced')).toBe(winners[0]);
  });

  it('writes with If-Match only over what it names', async () => {
    const { ETag } = await put('matched', 'one');
    await put('matched', 'two', { IfMatch: ETag });
    expect(await refusal(put('matched', 'three', { IfMatch: ETag }))).toMatchObject({ status: 412 });
    expect(await textOf('matched')).toBe('two');
  });
});

describe('delete and copy', () => {
  it('deletes, and says the same when there was nothing', async () => {
    await put('gone', 'x');
    const command = new DeleteObjectCommand({ Bucket: BUCKET, Key: 'gone' });
    expect((await server.s3.send(command)).$metadata.httpStatusCode).toBe(204);
    expect(await refusal(get('gone'))).toMatchObject({ code: 'NoSuchKey' });
    expect((await server.s3.send(command)).$metadata.httpStatusCode).toBe(204);
  });

  const copy = (Key: string, CopySource: string, more = {}) =>
    server.s3.send(new CopyObjectCommand({ Bucket: BUCKET, Key, CopySource, ...more }));

  it('copies with the headers, or with new ones', async () => {
    await put('source ä', 'copied text', { ContentType: 'text/plain', Metadata: { a: '1' } });
    const source = `${BUCKET}/${encodeURIComponent('source ä')}`;
    const answer = await copy('copy', source);
    expect(answer.CopyObjectResult?.ETag).toBe((await get('source ä')).ETag);
    expect(await get('copy')).toMatchObject({ ContentType: 'text/plain', Metadata: { a: '1' } });
    await copy('copy2', source, { MetadataDirective: 'REPLACE', ContentType: 'text/html', Metadata: { b: '2' } });
    const replaced = await get('copy2');
    expect(replaced).toMatchObject({ ContentType: 'text/html', Metadata: { b: '2' } });
    expect(await replaced.Body?.transformToString()).toBe('copied text');
  });

  it('refuses a copy of nothing, onto itself, or of what does not match', async () => {
    expect(await refusal(copy('c', `${BUCKET}/absent`))).toEqual({ code: 'NoSuchKey', status: 404 });
    await put('self', 'x');
    expect(await refusal(copy('self', `${BUCKET}/self`))).toEqual({ code: 'InvalidRequest', status: 400 });
    const other = copy('c', `${BUCKET}/self`, { CopySourceIfMatch: '"other"' });
    expect(await refusal(other)).toEqual({ code: 'PreconditionFailed', status: 412 });
  });
});

describe('an upload that breaks off', () => {
  it('leaves nothing, and the old object stays', async () => {
    await put('broken', 'before');
    const before = await filesBelow(server.dataDir);
    const command = new PutObjectCommand({ Bucket: BUCKET, Key: 'broken' });
    const url = await getSignedUrl(server.client({ requestChecksumCalculation: 'WHEN_REQUIRED' }), command);
    const outgoing = send(url, { method: 'PUT', headers: { 'content-length': '2000000' } });
    outgoing.on('error', () => undefined);
    outgoing.write(Buffer.alloc(1_000_000));
    await until(async () => (await filesBelow(join(server.dataDir, 'tmp'))).length === 1);
    outgoing.destroy();
    await until(async () => (await filesBelow(join(server.dataDir, 'tmp'))).length === 0);
    expect((await filesBelow(server.dataDir)).sort()).toEqual(before.sort());
    expect(await textOf('broken')).toBe('before');
  });
});

describe('what is not done here', () => {
  it('is refused, never taken for something else', async () => {
    await put('plain', 'content');
    const command = new GetObjectCommand({ Bucket: BUCKET, Key: 'plain' });
    for (const unknown of ['acl', 'tagging', 'versionId=1', 'torrent']) {
      const [name, value = ''] = unknown.split('=');
      const client = server.client();
      client.middlewareStack.add(
        (next) => (args) => {
          const { query } = args.request as { query: Record<string, string> };
          query[name ?? ''] = value;
          return next(args);
        },
        { step: 'build', name: 'unknownQuery' },
      );
      expect(await refusal(client.send(command))).toEqual({ code: 'NotImplemented', status: 501 });
    }
  });

  it('answers in XML with a request id', async () => {
    const url = new URL(await getSignedUrl(server.s3, new GetObjectCommand({ Bucket: BUCKET, Key: 'absent' })));
    const answer = await plain(server.url, url.pathname + url.search);
    expect(answer.status).toBe(404);
    expect(answer.headers['content-type']).toBe('application/xml');
    expect(xmlText(answer.text, 'Code')).toBe('NoSuchKey');
    expect(xmlText(answer.text, 'RequestId')).toBe(answer.headers['x-amz-request-id']);
    expect(xmlText(answer.text, 'Resource')).toBe(`/${BUCKET}/absent`);
  });
});

/** Asks again until it is so; jest's own limit ends a test that never gets there. */
async function until(isSo: () => Promise<boolean>): Promise<void> {
  while (!(await isSo())) await new Promise((resolve) => setImmediate(resolve));
}
