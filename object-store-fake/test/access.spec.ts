import { GetObjectCommand, HeadObjectCommand, PutObjectCommand, type S3Client } from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import { afterSigning, beforeSigning, plain, refusal, xmlText, type OutgoingRequest } from './support/requests.js';
import { BUCKET, REGION, SECRET, startTestServer, type TestServer } from './support/server.js';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
  await server.s3.send(new PutObjectCommand({ Bucket: BUCKET, Key: 'private', Body: 'secret words' }));
});
afterAll(() => server.stop());

const read = new GetObjectCommand({ Bucket: BUCKET, Key: 'private' });
const text = async (client: S3Client) => (await client.send(read)).Body?.transformToString();

describe('without a signature', () => {
  it.each([
    ['GET', '/'],
    ['GET', `/${BUCKET}/private`],
    ['GET', `/${BUCKET}?list-type=2`],
    ['GET', '/no-such-bucket/key'],
    ['PUT', `/${BUCKET}/private`],
    ['DELETE', `/${BUCKET}/private`],
    ['POST', `/${BUCKET}?delete`],
    ['OPTIONS', `/${BUCKET}/private`],
  ])('%s %s is denied', async (method, path) => {
    const answer = await plain(server.url, path, { method });
    expect(answer.status).toBe(403);
    expect(xmlText(answer.text, 'Code')).toBe('AccessDenied');
    expect(await text(server.s3)).toBe('secret words');
  });

  it('refuses another way of signing', async () => {
    const answer = await plain(server.url, `/${BUCKET}/private`, { headers: { authorization: 'AWS key:signature' } });
    expect(answer.status).toBe(400);
    expect(answer.text).not.toContain('secret words');
  });
});

describe('a signature in the headers', () => {
  const client = (accessKeyId: string, secretAccessKey: string) =>
    server.client({ credentials: { accessKeyId, secretAccessKey } });

  it('must come from the right key', async () => {
    expect(await refusal(text(client('other-key', SECRET)))).toEqual({ code: 'InvalidAccessKeyId', status: 403 });
    expect(await refusal(text(client('test-key', 'other')))).toEqual({ code: 'SignatureDoesNotMatch', status: 403 });
  });

  it('must be for this region', async () => {
    const elsewhere = server.client({ region: `not-${REGION}` });
    expect(await refusal(text(elsewhere))).toEqual({ code: 'AuthorizationHeaderMalformed', status: 400 });
  });

  const anotherSecond = ({ headers }: OutgoingRequest) =>
    (headers['x-amz-date'] ?? '').replace(/.Z$/, (end) => (end === '0Z' ? '1Z' : '0Z'));

  it.each<[string, (request: OutgoingRequest) => void, string]>([
    ['path', (request) => (request.path = `/${BUCKET}/other`), 'SignatureDoesNotMatch'],
    ['query', (request) => (request.query['response-content-type'] = 'text/html'), 'SignatureDoesNotMatch'],
    ['method', (request) => (request.method = 'DELETE'), 'SignatureDoesNotMatch'],
    ['date', (request) => (request.headers['x-amz-date'] = anotherSecond(request)), 'SignatureDoesNotMatch'],
    ['added header', (request) => (request.headers['x-amz-copy-source'] = 'a/b'), 'AccessDenied'],
  ])('covers the %s', async (_what, change, code) => {
    const tampering = afterSigning(server.client(), change);
    expect(await refusal(tampering.send(read))).toEqual({ code, status: 403 });
    expect(await text(server.s3)).toBe('secret words');
  });

  it('covers metadata and the hash of the body', async () => {
    const write = new PutObjectCommand({ Bucket: BUCKET, Key: 'w', Body: 'body', Metadata: { a: '1' } });
    const metadata = afterSigning(server.client(), (request) => (request.headers['x-amz-meta-a'] = '2'));
    expect(await refusal(metadata.send(write))).toEqual({ code: 'SignatureDoesNotMatch', status: 403 });
    const hash = afterSigning(server.client(), (request) => (request.headers['x-amz-content-sha256'] = 'a'.repeat(64)));
    expect(await refusal(hash.send(write))).toEqual({ code: 'SignatureDoesNotMatch', status: 403 });
    expect(await refusal(server.s3.send(new HeadObjectCommand({ Bucket: BUCKET, Key: 'w' })))).toMatchObject({
      status: 404,
    });
  });

  it('must be fresh', async () => {
    const hour = 3_600_000;
    for (const systemClockOffset of [-hour, hour]) {
      const late = server.client({ systemClockOffset });
      expect(await refusal(text(late))).toEqual({ code: 'RequestTimeTooSkewed', status: 403 });
    }
    expect(await text(server.client({ systemClockOffset: -10 * 60_000 }))).toBe('secret words');
  });
});

describe('a signed address', () => {
  const pathOf = (url: string) => url.slice(server.url.length);
  const sign = async (options: Parameters<typeof getSignedUrl>[2] = {}, command = read) =>
    pathOf(await getSignedUrl(server.s3, command, { expiresIn: 60, ...options }));

  it('opens the object without any other credentials', async () => {
    const answer = await plain(server.url, await sign());
    expect(answer).toMatchObject({ status: 200, text: 'secret words' });
    const range = await plain(server.url, await sign(), { headers: { range: 'bytes=0-5' } });
    expect(range).toMatchObject({ status: 206, text: 'secret' });
  });

  it('may say how the answer is labelled', async () => {
    const command = new GetObjectCommand({
      Bucket: BUCKET,
      Key: 'private',
      ResponseContentType: 'text/plain',
      ResponseCacheControl: 'private, max-age=300',
      ResponseContentDisposition: 'attachment; filename="a.txt"',
    });
    const { headers } = await plain(server.url, await sign({}, command));
    expect(headers).toMatchObject({
      'content-type': 'text/plain',
      'cache-control': 'private, max-age=300',
      'content-disposition': 'attachment; filename="a.txt"',
    });
  });

  it('is good until it expires', async () => {
    const at = (secondsAgo: number) => ({ signingDate: new Date(Date.now() - secondsAgo * 1000), expiresIn: 600 });
    expect((await plain(server.url, await sign(at(500)))).status).toBe(200);
    const expired = await plain(server.url, await sign(at(601)));
    expect(expired.status).toBe(403);
    expect(xmlText(expired.text, 'Code')).toBe('AccessDenied');
    expect(xmlText(expired.text, 'Message')).toBe('Request has expired');
    expect((await plain(server.url, await sign(at(-3600)))).status).toBe(403);
  });

  it.each<[string, (path: string) => string]>([
    ['another key', (path) => path.replace('/private?', '/other?')],
    ['a longer life', (path) => path.replace('X-Amz-Expires=60', 'X-Amz-Expires=6000')],
    ['a later date', (path) => path.replace(/X-Amz-Date=\d{8}/, 'X-Amz-Date=20990101')],
    ['one more parameter', (path) => `${path}&response-content-type=text%2Fhtml`],
    ['another signature', (path) => path.replace(/(X-Amz-Signature=)./, '$1g')],
    ['fewer signed headers', (path) => path.replace('X-Amz-SignedHeaders=host', 'X-Amz-SignedHeaders=range')],
    ['no signature', (path) => path.replace(/&X-Amz-Signature=[0-9a-f]+/, '')],
  ])('is refused with %s', async (_what, change) => {
    const changed = change(await sign());
    const answer = await plain(server.url, changed);
    expect([400, 403]).toContain(answer.status);
    expect(answer.text).not.toContain('secret words');
  });

  it('is for one method only', async () => {
    for (const method of ['PUT', 'DELETE', 'HEAD']) {
      expect((await plain(server.url, await sign(), { method })).status).toBe(403);
    }
    expect(await text(server.s3)).toBe('secret words');
  });

  it('takes an upload, with the headers that were signed and no others', async () => {
    const client = server.client({ requestChecksumCalculation: 'WHEN_REQUIRED' });
    const command = new PutObjectCommand({ Bucket: BUCKET, Key: 'up', ContentType: 'text/plain', Metadata: { a: '1' } });
    const url = pathOf(await getSignedUrl(client, command, { signableHeaders: new Set(['content-type']) }));
    const put = (headers: Record<string, string>) =>
      plain(server.url, url, { method: 'PUT', body: 'from outside', headers: { 'content-length': '12', ...headers } });
    expect((await put({ 'content-type': 'text/html' })).status).toBe(403);
    expect((await put({ 'content-type': 'text/plain', 'x-amz-meta-b': '2' })).status).toBe(403);
    expect((await put({ 'content-type': 'text/plain' })).status).toBe(200);
    const answer = await server.s3.send(new GetObjectCommand({ Bucket: BUCKET, Key: 'up' }));
    expect(await answer.Body?.transformToString()).toBe('from outside');
    expect(answer).toMatchObject({ ContentType: 'text/plain', Metadata: { a: '1' } });
  });
});

it('refuses a header that the signature names but the request lost', async () => {
  const client = afterSigning(
    beforeSigning(server.client(), (request) => (request.headers['x-amz-meta-kept'] = 'yes')),
    (request) => delete request.headers['x-amz-meta-kept'],
  );
  expect(await refusal(client.send(read))).toEqual({ code: 'SignatureDoesNotMatch', status: 403 });
});

it('says why without giving the secret away', async () => {
  const answer = await plain(server.url, (await getSignedUrl(server.s3, read)).slice(server.url.length) + '&x=1');
  expect(xmlText(answer.text, 'Code')).toBe('SignatureDoesNotMatch');
  expect(answer.text).not.toContain(SECRET);
});
