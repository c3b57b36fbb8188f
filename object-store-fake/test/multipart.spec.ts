import { createHash } from 'node:crypto';
import { join } from 'node:path';
import {
  AbortMultipartUploadCommand,
  CompleteMultipartUploadCommand,
  CreateMultipartUploadCommand,
  GetObjectCommand,
  HeadObjectCommand,
  ListMultipartUploadsCommand,
  ListObjectsV2Command,
  ListPartsCommand,
  PutObjectCommand,
  UploadPartCommand,
  type CompletedPart,
  type CreateMultipartUploadCommandInput,
} from '@aws-sdk/client-s3';
import { refusal } from './support/requests.js';
import { BUCKET, filesBelow, startTestServer, type TestServer } from './support/server.js';

const MIB = 1024 * 1024;
let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.stop());

async function begin(Key: string, more: Partial<CreateMultipartUploadCommandInput> = {}): Promise<string> {
  const { UploadId } = await server.s3.send(new CreateMultipartUploadCommand({ Bucket: BUCKET, Key, ...more }));
  return UploadId ?? '';
}

async function send(Key: string, UploadId: string, PartNumber: number, Body: Buffer): Promise<CompletedPart> {
  const { ETag, ChecksumCRC32 } = await server.s3.send(
    new UploadPartCommand({ Bucket: BUCKET, Key, UploadId, PartNumber, Body }),
  );
  return { PartNumber, ETag, ...(ChecksumCRC32 === undefined ? {} : { ChecksumCRC32 }) };
}

const complete = (Key: string, UploadId: string, Parts: CompletedPart[], more = {}) =>
  server.s3.send(
    new CompleteMultipartUploadCommand({ Bucket: BUCKET, Key, UploadId, MultipartUpload: { Parts }, ...more }),
  );
const uploadFiles = () => filesBelow(join(server.dataDir, 'buckets', BUCKET, 'uploads'));
const md5 = (data: Buffer) => createHash('md5').update(data).digest();

// S3's user guide, 'Multipart upload limits': parts of at least 5 MiB, the last one excepted.
const first = Buffer.alloc(5 * MIB, 'first part ');
const second = Buffer.alloc(5 * MIB, 'second ');
const last = Buffer.from('the last part is short');

it('puts parts together in the order of their numbers', async () => {
  const id = await begin('whole', { ContentType: 'application/zip', Metadata: { kind: 'archive' } });
  const third = await send('whole', id, 30, last);
  const one = await send('whole', id, 1, first);
  const two = await send('whole', id, 2, second);
  expect((await server.s3.send(new ListObjectsV2Command({ Bucket: BUCKET, Prefix: 'whole' }))).KeyCount).toBe(0);
  const done = await complete('whole', id, [one, two, third]);
  // The tag of parts' tags: common practice of S3's servers, no source.
  const expected = md5(Buffer.concat([first, second, last].map(md5))).toString('hex');
  expect(done.ETag).toBe(`"${expected}-3"`);
  const answer = await server.s3.send(new GetObjectCommand({ Bucket: BUCKET, Key: 'whole' }));
  const bytes = Buffer.from((await answer.Body?.transformToByteArray()) ?? []);
  expect(bytes.equals(Buffer.concat([first, second, last]))).toBe(true);
  expect(answer).toMatchObject({ ContentType: 'application/zip', Metadata: { kind: 'archive' } });
  expect(await uploadFiles()).toEqual([]);
});

it('lists the parts so far, in pages', async () => {
  const id = await begin('listed');
  for (const number of [3, 1, 2]) await send('listed', id, number, Buffer.from(`part ${number}`));
  const page = await server.s3.send(new ListPartsCommand({ Bucket: BUCKET, Key: 'listed', UploadId: id, MaxParts: 2 }));
  expect(page.IsTruncated).toBe(true);
  expect(page.Parts?.map(({ PartNumber, Size, ETag }) => [PartNumber, Size, ETag])).toEqual(
    [1, 2].map((number) => [number, 6, `"${md5(Buffer.from(`part ${number}`)).toString('hex')}"`]),
  );
  const rest = await server.s3.send(
    new ListPartsCommand({ Bucket: BUCKET, Key: 'listed', UploadId: id, PartNumberMarker: page.NextPartNumberMarker }),
  );
  expect(rest.Parts?.map(({ PartNumber }) => PartNumber)).toEqual([3]);
  expect(rest.IsTruncated).toBe(false);
});

it('lists uploads under way, and gives one up with all its parts', async () => {
  const id = await begin('given-up');
  await send('given-up', id, 1, first);
  const under = () => server.s3.send(new ListMultipartUploadsCommand({ Bucket: BUCKET, Prefix: 'given-up' }));
  expect((await under()).Uploads).toMatchObject([{ Key: 'given-up', UploadId: id }]);
  const abort = new AbortMultipartUploadCommand({ Bucket: BUCKET, Key: 'given-up', UploadId: id });
  expect((await server.s3.send(abort)).$metadata.httpStatusCode).toBe(204);
  expect((await under()).Uploads).toBeUndefined();
  expect((await uploadFiles()).filter((file) => file.includes(id))).toEqual([]);
  expect(await refusal(server.s3.send(abort))).toEqual({ code: 'NoSuchUpload', status: 404 });
  expect(await refusal(send('given-up', id, 2, last))).toEqual({ code: 'NoSuchUpload', status: 404 });
});

it('lets a part be sent again: the later one counts', async () => {
  const id = await begin('again');
  const old = await send('again', id, 1, Buffer.from('old'));
  const fresh = await send('again', id, 1, Buffer.from('fresh'));
  expect(await refusal(complete('again', id, [old]))).toEqual({ code: 'InvalidPart', status: 400 });
  await complete('again', id, [fresh]);
  const answer = await server.s3.send(new GetObjectCommand({ Bucket: BUCKET, Key: 'again' }));
  expect(await answer.Body?.transformToString()).toBe('fresh');
});

it('refuses to complete what does not fit, and the upload lives on', async () => {
  const id = await begin('picky');
  const one = await send('picky', id, 1, Buffer.from('too small'));
  const two = await send('picky', id, 2, last);
  const attempt = (parts: CompletedPart[]) => refusal(complete('picky', id, parts));
  expect(await attempt([two, one])).toEqual({ code: 'InvalidPartOrder', status: 400 });
  expect(await attempt([one, two])).toEqual({ code: 'EntityTooSmall', status: 400 });
  expect(await attempt([{ ...one, ETag: '"0123456789abcdef0123456789abcdef"' }])).toMatchObject({ code: 'InvalidPart' });
  expect(await attempt([{ ...two, PartNumber: 9 }])).toMatchObject({ code: 'InvalidPart' });
  expect(await attempt([])).toMatchObject({ code: 'MalformedXML' });
  expect(await refusal(complete('other-key', id, [one]))).toEqual({ code: 'NoSuchUpload', status: 404 });
  expect(await refusal(complete('picky', '../../tmp', [one]))).toEqual({ code: 'NoSuchUpload', status: 404 });
  expect(await refusal(send('picky', id, 10_001, last))).toEqual({ code: 'InvalidArgument', status: 400 });
  await complete('picky', id, [two]);
  expect(await refusal(complete('picky', id, [two]))).toMatchObject({ code: 'NoSuchUpload' });
});

it('completes only where there is nothing, when told so', async () => {
  const id = await begin('taken');
  const part = await send('taken', id, 1, last);
  await server.s3.send(new PutObjectCommand({ Bucket: BUCKET, Key: 'taken', Body: 'meanwhile' }));
  expect(await refusal(complete('taken', id, [part], { IfNoneMatch: '*' }))).toEqual({
    code: 'PreconditionFailed',
    status: 412,
  });
  await complete('taken', id, [part]);
});

it('checks the checksum of the whole', async () => {
  const whole = { ChecksumAlgorithm: 'CRC32', ChecksumType: 'FULL_OBJECT' } as const;
  const id = await begin('summed', whole);
  const part = await send('summed', id, 1, Buffer.from('123456789'));
  const wrong = complete('summed', id, [part], { ChecksumCRC32: 'AAAAAA==', ChecksumType: 'FULL_OBJECT' });
  expect(await refusal(wrong)).toEqual({ code: 'BadDigest', status: 400 });
  // The check value cbf43926 of CRC-32/ISO-HDLC over '123456789' (CRC catalogue), in Base64.
  await complete('summed', id, [part], { ChecksumCRC32: 'y/Q5Jg==', ChecksumType: 'FULL_OBJECT' });
  const head = await server.s3.send(new HeadObjectCommand({ Bucket: BUCKET, Key: 'summed', ChecksumMode: 'ENABLED' }));
  expect(head).toMatchObject({ ChecksumCRC32: 'y/Q5Jg==', ChecksumType: 'FULL_OBJECT' });
});

it('goes on after a restart', async () => {
  const id = await begin('resumed', { ContentType: 'text/plain' });
  const one = await send('resumed', id, 1, first);
  await server.restart();
  const two = await send('resumed', id, 2, last);
  await complete('resumed', id, [one, two]);
  const answer = await server.s3.send(new GetObjectCommand({ Bucket: BUCKET, Key: 'resumed' }));
  const bytes = Buffer.from((await answer.Body?.transformToByteArray()) ?? []);
  expect(bytes.equals(Buffer.concat([first, last]))).toBe(true);
  expect(answer.ContentType).toBe('text/plain');
});
