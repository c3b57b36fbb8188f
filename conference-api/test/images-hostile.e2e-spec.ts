import { request as httpRequest } from 'node:http';
import { deflateSync } from 'node:zlib';
import sharp, { type Sharp } from 'sharp';
import { CaseImage } from '../src/images/entities/case-image.entity.js';
import { makeCase } from './factories/case-rows.js';
import { makeWorld, type World } from './factories/world.js';
import { dicomFile, dicomPicture, dicomSamples, element, pictureDataSet, u16, u32 } from './support/dicom-files.js';
import { type ObjectStore, startObjectStore } from './support/object-store.js';
import { noise, plainPng, pngOfSize } from './support/picture-files.js';
import { keysInStore, upload } from './support/stored-pictures.js';
import { startTestApp, type TestApp } from './support/test-app.js';

const MIB = 1024 * 1024;

describe('hostile uploads', () => {
  let store: ObjectStore;
  let test: TestApp;
  let world: World;
  let caseId: string;

  beforeAll(async () => {
    store = await startObjectStore();
    test = await startTestApp({ ...store.environment, KERFSIDE_UPLOAD_MAX_MB: '3' });
    world = await makeWorld(test);
  });

  afterAll(async () => {
    await test?.close();
    await store?.remove();
  });

  beforeEach(async () => {
    ({ id: caseId } = await makeCase(test, world));
  });

  /** What was taken is whole, and of what was refused nothing is left. */
  afterEach(async () => {
    const rows = await test.dataSource.manager.find(CaseImage, { where: { caseId } });
    expect(rows.filter(({ state }) => state !== 'ready')).toEqual([]);
    const ids = new Set((await test.dataSource.manager.findBy(CaseImage, { state: 'ready' })).map(({ id }) => id));
    const keys = await keysInStore(test);
    expect(keys.filter((key) => !ids.has(key.split('/')[1]!))).toEqual([]);
    expect(keys).toHaveLength(3 * ids.size);
  });

  const send = (file: Buffer, name = 'film.png') => upload(test, world.people.surgeon, caseId, file, name);
  const refused = async (file: Buffer, status: number, words: RegExp, name?: string) => {
    const answer = await send(file, name);
    expect(answer.headers['content-type']).toContain('application/problem+json');
    expect([answer.status, answer.body.detail]).toEqual([status, expect.stringMatching(words)]);
    expect(answer.body.type).toBe(status === 415 ? 'urn:kerfside:problem:unsupported-type' : 'urn:kerfside:problem:invalid');
  };

  describe('the kind is what the bytes are', () => {
    it.each(['film.txt', 'film.dcm', 'film', 'film.php.svg', '../../etc/passwd', '<b>film</b>.png', `${'x'.repeat(200)}.png`])('a PNG called %s is taken as a PNG', async (name) => {
      const { status, body } = await send(await plainPng(), name);
      expect(status).toBe(201);
      expect((await test.dataSource.manager.findOneByOrFail(CaseImage, { id: body.id })).sourceKind).toBe('png');
    });

    it.each<[string, Buffer, RegExp]>([
      ['a text', Buffer.from('A letter about a patient.'), /of no kind known here/],
      ['an empty file', Buffer.alloc(0), /empty/],
      ['one byte', Buffer.from([0xff]), /of no kind known here/],
      ['a PDF', Buffer.from('%PDF-1.7\n1 0 obj\n<<>>\nendobj\n%%EOF\n'), /application\/pdf/],
      ['a GIF', Buffer.from('R0lGODlhAQABAIAAAAAAAP///yH5BAEAAAAALAAAAAABAAEAAAIBRAA7', 'base64'), /image\/gif/],
      ['an SVG', Buffer.from('<?xml version="1.0"?><svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"><script>alert(1)</script></svg>'), /application\/xml/],
      ['a page', Buffer.from('<!doctype html><script>alert(1)</script>'), /of no kind known here/],
      ['an archive', Buffer.from('UEsFBgAAAAAAAAAAAAAAAAAAAAAAAA==', 'base64'), /application\/zip/],
      ['a program', Buffer.concat([Buffer.from('\x7fELF\x02\x01\x01', 'latin1'), Buffer.alloc(100)]), /executable|elf/],
      ['a film', Buffer.concat([Buffer.from([0, 0, 0, 0x18]), Buffer.from('ftypmp42\0\0\0\0mp42isom')]), /video\/mp4/],
    ])('%s called film.png is refused by its kind', async (_, file, words) => {
      await refused(file, 415, words);
      await refused(file, 415, words, 'film.jpg');
    });
  });

  describe('files that are two things', () => {
    it('a picture with an archive and a page behind its end leaves its pixels only', async () => {
      const { status, body } = await send(Buffer.concat([await plainPng(), Buffer.from('PK\x03\x04<script>alert(1)</script>')]));
      expect(status).toBe(201);
      const { body: served } = await test.http().get(body.addresses.full).buffer(true);
      expect((served as Buffer).includes('script')).toBe(false);
    });

    it('a GIF head before a JPEG, a JPEG that says at byte 128 that it is DICOM', async () => {
      const jpeg = await noise(200, 100).jpeg().toBuffer();
      await refused(Buffer.concat([Buffer.from('GIF89a'), jpeg]), 415, /image\/gif/);
      jpeg.write('DICM', 128, 'latin1');
      await refused(jpeg, 422, /broken|cut off|no picture/);
    });

    it('DICOM whose preamble is a TIFF head is read as DICOM', async () => {
      const file = dicomPicture({ rows: 8, columns: 8, pixels: Array.from({ length: 64 }, (_, index) => index * 60) });
      file.write('II*\0\x08\0\0\0', 0, 'latin1');
      const { status, body } = await send(file);
      expect([status, (await test.dataSource.manager.findOneByOrFail(CaseImage, { id: body.id })).sourceKind]).toEqual([201, 'dicom']);
    });

    it('several pictures in one TIFF', async () => {
      const two = await sharp([await plainPng(40, 30), await plainPng(40, 30)], { join: { animated: true } }).tiff().toBuffer();
      expect((await sharp(two).metadata()).pages).toBe(2);
      await refused(two, 422, /holds 2 pictures/);
    });
  });

  describe('bombs', () => {
    const grown = async (work: () => Promise<unknown>) => {
      const before = process.memoryUsage().rss;
      let most = before;
      const watch = setInterval(() => (most = Math.max(most, process.memoryUsage().rss)), 10);
      await work().finally(() => clearInterval(watch));
      return most - before;
    };

    it('a PNG of 20000 by 20000 is refused without being unpacked', async () => {
      const data = deflateSync(Buffer.alloc(20_000 * 20_001), { level: 1 });
      const bomb = pngOfSize(20_000, 20_000, data);
      expect(bomb.length).toBeLessThan(2 * MIB);
      expect(await grown(() => refused(bomb, 422, /60 million pixels/))).toBeLessThan(150 * MIB);
    });

    it.each([
      ['PNG', () => Promise.resolve(pngOfSize(0x7fffffff, 0x7fffffff, deflateSync(Buffer.alloc(100))))],
      ['JPEG', () => said(noise(64, 64).jpeg(), Buffer.from([0xff, 0xc0]), 5, [0xff, 0xff, 0xff, 0xff])],
      ['WebP', () => said(noise(64, 64).webp({ lossless: true }), Buffer.from('VP8L'), 9, [0xff, 0xff, 0xff, 0x0f])],
    ])('a %s that only says it is huge', async (_, make) => {
      const file = await make();
      expect(await grown(() => refused(file, 422, /60 million pixels|broken or cut off/))).toBeLessThan(150 * MIB);
    });

    it('DICOM that says it is huge, or holds a million frames, or unpacks to far more than it is', async () => {
      const empty = pictureDataSet({ rows: 8, columns: 8, pixels: [] }).subarray(0, -12);
      const packed = deflateSync(Buffer.concat([empty, element(0x42, 0x11, 'OB', Buffer.alloc(300_000_000))]), { level: 1 }).subarray(2, -4);
      await refused(dicomPicture({ rows: 65535, columns: 65535, pixels: [] }), 422, /60 million pixels/);
      await refused(dicomPicture({ rows: 8, columns: 8, pixels: Array(64).fill(7), frames: 1_000_000 }), 422, /1000000 pictures/);
      expect(await grown(() => refused(dicomFile(packed, '1.2.840.10008.1.2.1.99'), 422, /60 million pixels/))).toBeLessThan(400 * MIB);
    });
  });

  describe('broken files', () => {
    const kinds: [string, () => Promise<Buffer>][] = [
      ['JPEG', () => noise(90, 60).jpeg().toBuffer()],
      ['PNG', () => plainPng(90, 60)],
      ['WebP', () => noise(90, 60).webp().toBuffer()],
      ['TIFF', () => noise(90, 60).tiff({ compression: 'lzw' }).toBuffer()],
      ...['MR_small.dcm', 'MR_small_RLE.dcm', 'JPEG2000.dcm', 'SC_rgb_jpeg_dcmtk.dcm', 'image_dfl.dcm'].map((name): [string, () => Promise<Buffer>] => [name, async () => dicomSamples().get(name)!]),
    ];

    it.each(kinds)('a %s cut off at any place is refused by name', async (_, make) => {
      const file = await make();
      const lengths = [1, 3, 8, 20, 131, 140, 300, 0.1, 0.3, 0.5, 0.7, 0.9].map((part) => (part < 1 ? Math.floor(file.length * part) : part));
      for (const length of new Set(lengths.filter((length) => length < file.length * 0.95))) {
        const { status, body } = await send(file.subarray(0, length));
        expect([length, [415, 422].includes(status)]).toEqual([length, true]);
        expect(body.detail).toMatch(/Export|read|picture/);
      }
    });

    it.each(kinds)('a %s with bytes changed is shown or refused, and the server goes on', async (_, make) => {
      const file = await make();
      const random = seeded(file.length);
      const answers = await Promise.all(
        Array.from({ length: 10 }, async () => {
          const changed = Buffer.from(file);
          for (let count = 0; count < 8; count++) changed[Math.floor(random() * changed.length)] = Math.floor(random() * 256);
          return (await send(changed)).status;
        }),
      );
      expect(answers.filter((status) => ![201, 415, 422].includes(status))).toEqual([]);
      expect((await send(await plainPng())).status).toBe(201);
    }, 120_000);

    it('DICOM whose lengths overrun, or whose sequences nest without end', async () => {
      await refused(dicomFile(Buffer.concat([u16(0x10), u16(0x10), Buffer.from('UT'), u16(0), u32(0xfffffff0)])), 422, /cut off/);
      const level = Buffer.concat([u16(0x08), u16(0x1140), Buffer.from('SQ'), u16(0), u32(0xffffffff), u16(0xfffe), u16(0xe000), u32(0xffffffff)]);
      await refused(dicomFile(Buffer.concat(Array.from({ length: 50_000 }, () => level))), 422, /broken/);
    });
  });

  describe('the request', () => {
    const boundary = 'edge-of-a-part';
    const head = (name: string) => `--${boundary}\r\nContent-Disposition: form-data; name="${name}"; filename="film.png"\r\nContent-Type: image/png\r\n\r\n`;
    const post = (body: string | Buffer, type = `multipart/form-data; boundary=${boundary}`) =>
      test.http().post(`/api/cases/${caseId}/images`).set(world.people.surgeon.auth).set('Content-Type', type).send(body);

    it('a file over the limit is refused with the limit in words', async () => {
      const { status, body } = await send(Buffer.alloc(4 * MIB, 7));
      expect([status, body.type, body.detail]).toEqual([413, 'urn:kerfside:problem:too-large', expect.stringContaining('3 MB')]);
      expect(body.errors[0]).toMatchObject({ field: 'file', code: 'too-large' });
    });

    it('no file, another field, two files', async () => {
      const call = () => test.http().post(`/api/cases/${caseId}/images`).set(world.people.surgeon.auth);
      const png = await plainPng();
      for (const [request, code] of [
        [call().field('caption', 'Standing'), 'missing'],
        [call().send({}), 'missing'],
        [call().attach('picture', png, 'film.png'), 'one-file'],
        [call().attach('file', png, 'a.png').attach('file', await plainPng(), 'b.png'), 'one-file'],
      ] as const) {
        const { status, body } = await request;
        expect([status, body.errors]).toEqual([422, [expect.objectContaining({ field: 'file', code })]]);
      }
    });

    it.each<[string, string, string | undefined, number]>([
      ['without a boundary', 'x', 'multipart/form-data', 400],
      ['cut off within the file', `${head('file')}abc`, undefined, 400],
      ['cut off within a head', `--${boundary}\r\nContent-Dispo`, undefined, 400],
      ['with another boundary than it says', `${head('file')}abc\r\n--${boundary}--\r\n`, 'multipart/form-data; boundary=other', 400],
      ['of another multipart kind', `${head('file')}abc\r\n--${boundary}--\r\n`, `multipart/mixed; boundary=${boundary}`, 415],
      ['with a field without end', `--${boundary}\r\nContent-Disposition: form-data; name="caption"\r\n\r\n${'x'.repeat(100_000)}\r\n--${boundary}--\r\n`, undefined, 400],
      ['with a thousand parts', `${`--${boundary}\r\nContent-Disposition: form-data; name="a"\r\n\r\nx\r\n`.repeat(1000)}--${boundary}--\r\n`, undefined, 400],
      ['with a field nested without end', `--${boundary}\r\nContent-Disposition: form-data; name="a${'[b]'.repeat(500)}"\r\n\r\nx\r\n--${boundary}--\r\n`, undefined, 400],
      ['with a field called __proto__', `--${boundary}\r\nContent-Disposition: form-data; name="__proto__[admin]"\r\n\r\n1\r\n--${boundary}--\r\n`, undefined, 422],
    ])('a body %s is refused', async (_, body, type, status) => {
      const answer = await post(body, type);
      expect([answer.status, answer.body.type]).toEqual([status, expect.stringMatching(/^urn:kerfside:problem:(bad-request|invalid|unsupported-type)$/)]);
      expect(answer.headers['content-type']).toContain('application/problem+json');
    });

    it('senders who go away half-way leave nothing, and do not take the places of others', async () => {
      for (let round = 0; round < 3; round++) await Promise.all(Array.from({ length: 8 }, () => breakOff(test.url, caseId, world.people.surgeon.auth, head('file'), boundary)));
      expect((await send(await plainPng())).status).toBe(201);
      expect(await test.dataSource.manager.countBy(CaseImage, { caseId })).toBe(1);
    });

    it('the body of one who may not store it is not waited for', async () => {
      // a body of 2 MB is promised, and never sent
      const answered = await new Promise<number>((resolve, reject) => {
        const call = httpRequest(`${test.url}/api/cases/${caseId}/images`, { method: 'POST', headers: { ...world.people.outsider.auth, 'Content-Type': `multipart/form-data; boundary=${boundary}`, 'Content-Length': 2 * MIB } });
        call.on('response', (response) => {
          resolve(response.statusCode!);
          call.destroy();
        });
        call.on('error', reject);
        call.write(head('file'));
      });
      expect(answered).toBe(404);
    });
  });
});

/** Numbers from 0 to 1 that are the same each time (Numerical Recipes' linear congruential generator). */
function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => (state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0) / 2 ** 32;
}

/** The picture with other bytes `after` so many from a mark. */
async function said(picture: Sharp, mark: Buffer, after: number, bytes: number[]): Promise<Buffer> {
  const file = await picture.toBuffer();
  const at = file.indexOf(mark);
  if (at < 0) throw new Error('the mark is not in the file');
  file.set(bytes, at + after);
  return file;
}

/** Sends the head and a part of a file, and closes the connection once the server has begun to read. */
function breakOff(url: string, caseId: string, auth: Record<string, string>, head: string, boundary: string): Promise<void> {
  return new Promise((resolve) => {
    const call = httpRequest(`${url}/api/cases/${caseId}/images`, { method: 'POST', headers: { ...auth, 'Content-Type': `multipart/form-data; boundary=${boundary}`, 'Content-Length': 2 * MIB } });
    call.on('error', () => resolve());
    call.on('close', () => resolve());
    call.write(head);
    call.write(Buffer.alloc(200_000, 1), () => call.destroy());
  });
}
