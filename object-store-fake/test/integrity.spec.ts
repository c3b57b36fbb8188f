import { createHash, createHmac } from 'node:crypto';
import { ChecksumAlgorithm, GetObjectCommand, PutObjectCommand, type S3Client } from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import { afterSigning, beforeSigning, plain, refusal, xmlText, type OutgoingRequest } from './support/requests.js';
import { BUCKET, REGION, SECRET, filesBelow, startTestServer, type TestServer } from './support/server.js';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.stop());

const write = (client: S3Client, Key: string, more = {}) =>
  client.send(new PutObjectCommand({ Bucket: BUCKET, Key, Body: 'the right words', ...more }));
const textOf = async (Key: string) =>
  (await server.s3.send(new GetObjectCommand({ Bucket: BUCKET, Key }))).Body?.transformToString();

/** Refused with this code, and nothing kept: neither object nor half a file. */
async function expectNothingKept(call: () => Promise<unknown>, Key: string, code: string): Promise<void> {
  const before = await filesBelow(server.dataDir);
  expect((await refusal(call())).code).toBe(code);
  expect((await refusal(textOf(Key))).code).toBe('NoSuchKey');
  expect((await filesBelow(server.dataDir)).sort()).toEqual(before.sort());
}

describe('a body that is not what the headers say', () => {
  const changed = () => afterSigning(server.client(), (request) => (request.body = 'the wrong words'));

  // S3 API reference, 'Error responses': XAmzContentSHA256Mismatch is a 400.
  it('fails its signed hash', async () => {
    await expectNothingKept(() => write(changed(), 'hash'), 'hash', 'XAmzContentSHA256Mismatch');
  });

  it('fails its Content-MD5', async () => {
    const ContentMD5 = createHash('md5').update('other words').digest('base64');
    await expectNothingKept(() => write(server.s3, 'md5', { ContentMD5 }), 'md5', 'BadDigest');
    await expectNothingKept(() => write(server.s3, 'md5', { ContentMD5: 'no digest' }), 'md5', 'InvalidDigest');
    const right = createHash('md5').update('the right words').digest('base64');
    await write(server.s3, 'md5', { ContentMD5: right });
    expect(await textOf('md5')).toBe('the right words');
  });

  it.each([
    ['CRC32', 'AAAAAA=='],
    ['CRC32C', 'AAAAAA=='],
    ['CRC64NVME', 'AAAAAAAAAAA='],
    ['SHA1', createHash('sha1').update('other').digest('base64')],
    ['SHA256', createHash('sha256').update('other').digest('base64')],
  ])('fails its %s', async (algorithm, value) => {
    const call = () => write(server.s3, 'checksum', { [`Checksum${algorithm}`]: value });
    await expectNothingKept(call, 'checksum', 'BadDigest');
    const broken = () => write(server.s3, 'checksum', { [`Checksum${algorithm}`]: 'short' });
    await expectNothingKept(broken, 'checksum', 'InvalidRequest');
  });
});

// The SDK computes the value when writing, and checks the one it gets back when reading.
it.each([ChecksumAlgorithm.CRC32, ChecksumAlgorithm.CRC32C, ChecksumAlgorithm.SHA1, ChecksumAlgorithm.SHA256])(
  "keeps and gives back the SDK's %s",
  async (algorithm) => {
    const name = `Checksum${algorithm}` as const;
    const written = await write(server.s3, `sdk-${algorithm}`, { ChecksumAlgorithm: algorithm });
    const read = await server.s3.send(
      new GetObjectCommand({ Bucket: BUCKET, Key: `sdk-${algorithm}`, ChecksumMode: 'ENABLED' }),
    );
    expect(written[name]).toMatch(/^[A-Za-z0-9+/]+=*$/);
    expect(read[name]).toBe(written[name]);
    expect(await read.Body?.transformToString()).toBe('the right words');
  },
);

describe('chunks with a trailing checksum', () => {
  /** A client whose body is the given framing in place of the SDK's own. */
  function framed(payloadHash: string, length: number, frame: (request: OutgoingRequest) => string, trailer?: string) {
    const client = beforeSigning(server.client({ requestChecksumCalculation: 'WHEN_REQUIRED' }), (request) => {
      request.headers['x-amz-content-sha256'] = payloadHash;
      request.headers['x-amz-decoded-content-length'] = String(length);
      request.headers['content-encoding'] = 'aws-chunked';
      if (trailer !== undefined) request.headers['x-amz-trailer'] = trailer;
      delete request.headers['content-length'];
    });
    return afterSigning(client, (request) => {
      const body = frame(request);
      request.body = body;
      request.headers['content-length'] = String(Buffer.byteLength(body));
    });
  }

  const unsigned = (body: string, length = 9, trailer = 'x-amz-checksum-crc32c') =>
    framed('STREAMING-UNSIGNED-PAYLOAD-TRAILER', length, () => body, trailer);
  // The check value e3069283 of CRC-32/ISCSI over '123456789' (CRC catalogue), in Base64.
  const RIGHT = '4waSgw==';

  it('are taken when the checksum fits', async () => {
    const body = `4\r\n1234\r\n5\r\n56789\r\n0\r\nx-amz-checksum-crc32c:${RIGHT}\r\n\r\n`;
    await write(unsigned(body), 'trailing');
    expect(await textOf('trailing')).toBe('123456789');
  });

  it.each([
    ['another checksum', '9\r\n123456789\r\n0\r\nx-amz-checksum-crc32c:AAAAAA==\r\n\r\n', 'BadDigest'],
    ['other data', `9\r\n123456780\r\n0\r\nx-amz-checksum-crc32c:${RIGHT}\r\n\r\n`, 'BadDigest'],
    ['no checksum', '9\r\n123456789\r\n0\r\n\r\n', 'MalformedTrailerError'],
    ['another header', '9\r\n123456789\r\n0\r\nx-amz-checksum-sha1:AAAA\r\n\r\n', 'MalformedTrailerError'],
    ['no last chunk', '9\r\n123456789\r\n', 'IncompleteBody'],
    ['fewer bytes than said', `8\r\n12345678\r\n0\r\nx-amz-checksum-crc32c:${RIGHT}\r\n\r\n`, 'IncompleteBody'],
    ['a size that is none', `zz\r\n123456789\r\n0\r\nx-amz-checksum-crc32c:${RIGHT}\r\n\r\n`, 'IncompleteBody'],
    ['a chunk longer than its size', `4\r\n123456789\r\n0\r\nx-amz-checksum-crc32c:${RIGHT}\r\n\r\n`, 'IncompleteBody'],
  ])('are refused with %s', async (_what, body, code) => {
    await expectNothingKept(() => write(unsigned(body), 'refused'), 'refused', code);
  });

  /** Signs chunks as 'sigv4-streaming' of the S3 API reference says, from the SDK's own signature on. */
  function signedChunks(request: OutgoingRequest, chunks: string[]): string {
    const timestamp = request.headers['x-amz-date'] ?? '';
    const date = timestamp.slice(0, 8);
    const mac = (key: string | Buffer, text: string) => createHmac('sha256', key).update(text).digest();
    const sha = (text: string) => createHash('sha256').update(text).digest('hex');
    const key = mac(mac(mac(mac(`AWS4${SECRET}`, date), REGION), 's3'), 'aws4_request');
    let previous = /Signature=([0-9a-f]+)/.exec(request.headers['authorization'] ?? '')?.[1] ?? '';
    return [...chunks, ''].reduce((body, data) => {
      const scope = `${date}/${REGION}/s3/aws4_request`;
      const text = ['AWS4-HMAC-SHA256-PAYLOAD', timestamp, scope, previous, sha(''), sha(data)].join('\n');
      previous = mac(key, text).toString('hex');
      return `${body}${data.length.toString(16)};chunk-signature=${previous}\r\n${data}\r\n`;
    }, '');
  }
  const signed = (frame: (request: OutgoingRequest) => string) =>
    framed('STREAMING-AWS4-HMAC-SHA256-PAYLOAD', 9, frame);

  it('are taken when each chunk is signed', async () => {
    await write(signed((request) => signedChunks(request, ['1234', '56789'])), 'signed');
    expect(await textOf('signed')).toBe('123456789');
  });

  it('are refused when one was changed or is not signed', async () => {
    const changed = signed((request) => signedChunks(request, ['1234', '56789']).replace('56789', '56780'));
    await expectNothingKept(() => write(changed, 'changed'), 'changed', 'SignatureDoesNotMatch');
    const bare = signed(() => '9\r\n123456789\r\n0\r\n\r\n');
    await expectNothingKept(() => write(bare, 'changed'), 'changed', 'SignatureDoesNotMatch');
  });
});

it('wants to know the length beforehand', async () => {
  const client = server.client({ requestChecksumCalculation: 'WHEN_REQUIRED' });
  const url = await getSignedUrl(client, new PutObjectCommand({ Bucket: BUCKET, Key: 'unknown-length' }));
  const answer = await plain(server.url, url.slice(server.url.length), {
    method: 'PUT',
    body: 'x',
    headers: { 'transfer-encoding': 'chunked' },
  });
  expect(answer.status).toBe(411);
  expect(xmlText(answer.text, 'Code')).toBe('MissingContentLength');
});
