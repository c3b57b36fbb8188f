import { createHash } from 'node:crypto';
import {
  CreateBucketCommand,
  DeleteObjectsCommand,
  HeadBucketCommand,
  ListBucketsCommand,
  ListObjectsV2Command,
  PutObjectCommand,
  paginateListObjectsV2,
  type ListObjectsV2CommandInput,
} from '@aws-sdk/client-s3';
import { afterSigning, beforeSigning, refusal } from './support/requests.js';
import { BUCKET, startTestServer, type TestServer } from './support/server.js';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.stop());

async function fill(bucket: string, keys: readonly string[]): Promise<void> {
  await server.s3.send(new CreateBucketCommand({ Bucket: bucket }));
  for (let at = 0; at < keys.length; at += 20) {
    const batch = keys.slice(at, at + 20);
    await Promise.all(
      batch.map((Key) => server.s3.send(new PutObjectCommand({ Bucket: bucket, Key, Body: Buffer.from(Key) }))),
    );
  }
}

const list = (Bucket: string, more: Partial<ListObjectsV2CommandInput> = {}) =>
  server.s3.send(new ListObjectsV2Command({ Bucket, ...more }));

describe('buckets', () => {
  it('are created once, found and listed', async () => {
    await server.s3.send(new CreateBucketCommand({ Bucket: 'another' }));
    const again = server.s3.send(new CreateBucketCommand({ Bucket: 'another' }));
    expect(await refusal(again)).toEqual({ code: 'BucketAlreadyOwnedByYou', status: 409 });
    const found = await server.s3.send(new HeadBucketCommand({ Bucket: 'another' }));
    expect(found.BucketRegion).toBe('eu-west-1');
    expect(await refusal(server.s3.send(new HeadBucketCommand({ Bucket: 'absent' })))).toMatchObject({ status: 404 });
    const { Buckets } = await server.s3.send(new ListBucketsCommand({}));
    expect(Buckets?.map(({ Name }) => Name)).toEqual(['another', BUCKET]);
    expect(Math.abs(Date.now() - (Buckets?.[0]?.CreationDate?.getTime() ?? 0))).toBeLessThan(60_000);
  });

  // S3's user guide, 'General purpose bucket naming rules'.
  it.each(['ab', 'Upper', 'under_score', '-dash', 'two..dots', '192.168.5.4', 'x'.repeat(64)])(
    'refuse the name %s',
    async (Bucket) => {
      const call = server.s3.send(new CreateBucketCommand({ Bucket }));
      expect(await refusal(call)).toEqual({ code: 'InvalidBucketName', status: 400 });
    },
  );

  it('can be named for their region and for no other', async () => {
    const create = (Bucket: string, LocationConstraint: 'eu-west-1' | 'us-west-2') =>
      server.s3.send(new CreateBucketCommand({ Bucket, CreateBucketConfiguration: { LocationConstraint } }));
    await create('in-this-region', 'eu-west-1');
    expect(await refusal(create('elsewhere', 'us-west-2'))).toMatchObject({ status: 400 });
  });
});

describe('a listing', () => {
  const KEYS = ['a.txt', 'b/1', 'b/2', 'b/deep/3', 'c d+e', 'c/4', 'z&<>"', 'é', '￿', '😀'];
  beforeAll(() => fill('listed', KEYS));

  // S3 API reference, ListObjectsV2: keys come in the order of their UTF-8 bytes, so U+FFFF before U+1F600.
  it('has all keys in order, with size, tag and time', async () => {
    const answer = await list('listed');
    expect(answer.Contents?.map(({ Key }) => Key)).toEqual(KEYS);
    expect(answer).toMatchObject({ KeyCount: KEYS.length, IsTruncated: false, MaxKeys: 1000 });
    const first = answer.Contents?.[0];
    // The MD5 digest of 'a.txt', by `printf a.txt | md5sum`.
    expect(first).toMatchObject({ Size: 5, ETag: '"a5e54d1fd7bb69a228ef0dcd2431367e"' });
    expect(Math.abs(Date.now() - (first?.LastModified?.getTime() ?? 0))).toBeLessThan(60_000);
  });

  it('keeps to a prefix, and groups by a delimiter', async () => {
    expect((await list('listed', { Prefix: 'b/' })).Contents?.map(({ Key }) => Key)).toEqual(['b/1', 'b/2', 'b/deep/3']);
    const top = await list('listed', { Delimiter: '/' });
    expect(top.CommonPrefixes?.map(({ Prefix }) => Prefix)).toEqual(['b/', 'c/']);
    expect(top.Contents?.map(({ Key }) => Key)).toEqual(KEYS.filter((key) => !key.includes('/')));
    const below = await list('listed', { Delimiter: '/', Prefix: 'b/' });
    expect(below.CommonPrefixes?.map(({ Prefix }) => Prefix)).toEqual(['b/deep/']);
    expect(below.Contents?.map(({ Key }) => Key)).toEqual(['b/1', 'b/2']);
    expect(await list('listed', { Prefix: 'nothing' })).toMatchObject({ KeyCount: 0, IsTruncated: false });
  });

  it('starts after a key', async () => {
    expect((await list('listed', { StartAfter: 'c/4' })).Contents?.map(({ Key }) => Key)).toEqual(KEYS.slice(6));
  });

  it('encodes keys when asked', async () => {
    // 'encoding-type=url' as forms encode, blank as '+': common practice of S3's servers, from memory.
    const encoded = (await list('listed', { EncodingType: 'url', Prefix: 'c' })).Contents?.map(({ Key }) => Key);
    expect(encoded).toEqual(['c+d%2Be', 'c/4']);
  });

  it('comes in pages, groups counted as one each', async () => {
    for (const MaxKeys of [1, 2, 3, 7]) {
      const seen: string[] = [];
      let ContinuationToken: string | undefined;
      do {
        const page = await list('listed', { MaxKeys, Delimiter: '/', ContinuationToken });
        expect(page.KeyCount).toBeLessThanOrEqual(MaxKeys);
        seen.push(...(page.Contents ?? []).map(({ Key }) => Key ?? ''));
        seen.push(...(page.CommonPrefixes ?? []).map(({ Prefix }) => Prefix ?? ''));
        ContinuationToken = page.NextContinuationToken;
        expect(page.IsTruncated).toBe(ContinuationToken !== undefined);
      } while (ContinuationToken !== undefined);
      expect(seen.sort()).toEqual([...KEYS.filter((key) => !key.includes('/')), 'b/', 'c/'].sort());
    }
  });

  it('refuses bad page sizes, tokens and encodings', async () => {
    const odd = beforeSigning(server.client(), (request) => (request.query['max-keys'] = 'many'));
    expect(await refusal(odd.send(new ListObjectsV2Command({ Bucket: 'listed' })))).toMatchObject({
      code: 'InvalidArgument',
    });
    expect(await refusal(list('listed', { ContinuationToken: 'made up' }))).toEqual({
      code: 'InvalidArgument',
      status: 400,
    });
    const wrong = list('listed', { EncodingType: 'base64' as 'url' });
    expect(await refusal(wrong)).toMatchObject({ code: 'InvalidArgument' });
    expect(await refusal(list('absent'))).toEqual({ code: 'NoSuchBucket', status: 404 });
    expect(await list('listed', { MaxKeys: 0 })).toMatchObject({ KeyCount: 0, IsTruncated: false });
  });
});

describe('more than a thousand objects', () => {
  const KEYS = Array.from({ length: 1050 }, (_, index) => `case/${String(index).padStart(5, '0')}`);
  beforeAll(() => fill('many', KEYS), 60_000);

  it('come a thousand at a time, each once', async () => {
    expect(await list('many', { MaxKeys: 5000 })).toMatchObject({ KeyCount: 1000, IsTruncated: true });
    const sizes: number[] = [];
    const seen: string[] = [];
    for await (const page of paginateListObjectsV2({ client: server.s3 }, { Bucket: 'many' })) {
      sizes.push(page.KeyCount ?? 0);
      seen.push(...(page.Contents ?? []).map(({ Key }) => Key ?? ''));
    }
    expect(sizes).toEqual([1000, 50]);
    expect(seen).toEqual(KEYS);
  });

  it('stay in order when some go between two pages', async () => {
    const first = await list('many', { MaxKeys: 10 });
    const Objects = KEYS.slice(5, 15).map((Key) => ({ Key }));
    await server.s3.send(new DeleteObjectsCommand({ Bucket: 'many', Delete: { Objects } }));
    const second = await list('many', { MaxKeys: 10, ContinuationToken: first.NextContinuationToken });
    expect(second.Contents?.map(({ Key }) => Key)).toEqual(KEYS.slice(15, 25));
  });
});

function dropChecksums(headers: Record<string, string>): void {
  for (const name of Object.keys(headers)) if (name.startsWith('x-amz-checksum-')) delete headers[name];
}

describe('deleting several', () => {
  const remove = (keys: string[], Quiet = false) =>
    server.s3.send(
      new DeleteObjectsCommand({ Bucket: 'removal', Delete: { Objects: keys.map((Key) => ({ Key })), Quiet } }),
    );
  beforeAll(() => fill('removal', ['a & b', 'c<d>', 'quiet', 'stays', 'tab\tbed']));

  it('removes them all, unknown ones too, and no others', async () => {
    const answer = await remove(['a & b', 'c<d>', 'tab\tbed', 'never there']);
    expect(answer.Deleted?.map(({ Key }) => Key)).toEqual(['a & b', 'c<d>', 'tab\tbed', 'never there']);
    expect((await remove(['quiet'], true)).Deleted).toBeUndefined();
    expect((await list('removal')).Contents?.map(({ Key }) => Key)).toEqual(['stays']);
  });

  it('refuses a list that is empty, too long, broken or unchecked', async () => {
    // S3 API reference, DeleteObjects: up to 1000 keys; a checksum or Content-MD5 is required.
    expect(await refusal(remove([]))).toEqual({ code: 'MalformedXML', status: 400 });
    expect(await refusal(remove(Array.from({ length: 1001 }, (_, index) => `k${index}`)))).toMatchObject({
      code: 'MalformedXML',
    });
    const command = new DeleteObjectsCommand({ Bucket: 'removal', Delete: { Objects: [{ Key: 'stays' }] } });
    const unchecked = beforeSigning(server.client(), ({ headers }) => dropChecksums(headers));
    expect(await refusal(unchecked.send(command))).toEqual({ code: 'InvalidRequest', status: 400 });
    expect((await list('removal')).KeyCount).toBe(1);
  });

  it.each([
    '<Delete><Object><Key>stays</Key></Object>',
    '<Delete><Object><Key>stays</Object></Key></Delete>',
    '<!DOCTYPE d [<!ENTITY e "stays">]><Delete><Object><Key>&e;</Key></Object></Delete>',
    '<Delete><Object><Key>&unknown;</Key></Object></Delete>',
    'no XML',
  ])('refuses %s', async (body) => {
    const client = server.client({ requestChecksumCalculation: 'WHEN_REQUIRED' });
    beforeSigning(client, (request) => {
      dropChecksums(request.headers);
      request.headers['content-md5'] = createHash('md5').update(body).digest('base64');
      request.headers['x-amz-content-sha256'] = createHash('sha256').update(body).digest('hex');
      request.headers['content-length'] = String(Buffer.byteLength(body));
    });
    afterSigning(client, (request) => (request.body = body));
    const command = new DeleteObjectsCommand({ Bucket: 'removal', Delete: { Objects: [{ Key: 'stays' }] } });
    expect(await refusal(client.send(command))).toEqual({ code: 'MalformedXML', status: 400 });
    expect((await list('removal')).KeyCount).toBe(1);
  });
});
