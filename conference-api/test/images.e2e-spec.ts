import { createHmac } from 'node:crypto';
import sharp from 'sharp';
import type { Stage } from '../src/calc/vocabulary/case.js';
import { AuditEntry } from '../src/audit/entities/audit-entry.entity.js';
import { LiveEvent } from '../src/events/entities/live-event.entity.js';
import { CaseImage } from '../src/images/entities/case-image.entity.js';
import { makeCase } from './factories/case-rows.js';
import { addImageRow, setStage } from './factories/cases.js';
import { makeWorld, type World, type WorldPerson } from './factories/world.js';
import { type ObjectStore, startObjectStore } from './support/object-store.js';
import { paragraph } from './support/permission-subjects.js';
import { jpegWith, noise, plainPng, pngWithText, quarters } from './support/picture-files.js';
import { keysInStore, objectOf, pixelsOf, upload } from './support/stored-pictures.js';
import { startTestApp, type TestApp } from './support/test-app.js';

const HOUR = 3_600_000;

describe('images', () => {
  let store: ObjectStore;
  let test: TestApp;
  let world: World;

  beforeAll(async () => {
    store = await startObjectStore();
    test = await startTestApp(store.environment);
    world = await makeWorld(test);
  });

  afterAll(async () => {
    await test?.close();
    await store?.remove();
  });

  const as = (name: WorldPerson) => world.people[name];
  const send = (caseId: string, file: Buffer, name?: string) => upload(test, as('surgeon'), caseId, file, name);
  const stored = async (caseId: string) => {
    const { status, body } = await send(caseId, await plainPng());
    expect(status).toBe(201);
    return body as { id: string; addresses: Record<'thumb' | 'view' | 'full', string> };
  };

  describe('what is stored', () => {
    let caseId: string;
    beforeAll(async () => {
      ({ id: caseId } = await makeCase(test, world));
    });

    const PLANTED = ['PLANTED-EXIF', 'PLANTED-XMP', 'PLANTED-IPTC', 'PLANTED-COMMENT', 'PLANTED-TRAILING', 'PLANTED-TEXT'];
    const xmp = '<x:xmpmeta xmlns:x="adobe:ns:meta/"><rdf:RDF xmlns:rdf="http://www.w3.org/1999/02/22-rdf-syntax-ns#"><rdf:Description>PLANTED-XMP</rdf:Description></rdf:RDF></x:xmpmeta>';
    const exif = {
      IFD0: { Artist: 'PLANTED-EXIF', ImageDescription: 'PLANTED-EXIF' },
      IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 3230/100', GPSLongitudeRef: 'W', GPSLongitude: '0/1 7/1 4366/100' },
    };
    const withMetadata = () => noise(120, 80).withExif(exif).withXmp(xmp).withIccProfile('p3');

    it.each([
      ['a JPEG with EXIF, GPS, XMP, IPTC, a comment and bytes after its end', 'jpeg', async () => jpegWith(await withMetadata().jpeg().toBuffer(), { iptc: 'PLANTED-IPTC', comment: 'PLANTED-COMMENT', trailing: 'PLANTED-TRAILING' })],
      ['a PNG with EXIF, text chunks and bytes after its end', 'png', async () => pngWithText(await withMetadata().png().toBuffer(), 'PLANTED-TEXT')],
      ['a WebP with EXIF and XMP', 'webp', () => withMetadata().webp({ lossless: true }).toBuffer()],
      ['a TIFF with EXIF and XMP', 'tiff', () => withMetadata().tiff().toBuffer()],
    ])('%s leaves pixels only', async (_, kind, make) => {
      const file = await make();
      const planted = PLANTED.filter((text) => file.includes(text));
      expect(planted.length).toBeGreaterThan(0);
      const { status, body } = await send(caseId, file, 'PLANTED-NAME.bin');
      expect(status).toBe(201);
      expect((await test.dataSource.manager.findOneByOrFail(CaseImage, { id: body.id })).sourceKind).toBe(kind);
      expect(await keysInStore(test, body.id)).toHaveLength(3);
      for (const key of await keysInStore(test, body.id)) {
        const object = await objectOf(test, key);
        for (const text of [...PLANTED, 'PLANTED-NAME', 'Exif', 'GPS', 'adobe', 'ICC']) expect(object.includes(text)).toBe(false);
        const { exif: e, xmp: x, iptc, icc, comments } = await sharp(object).metadata();
        expect([e, x, iptc, icc, comments]).toEqual([undefined, undefined, undefined, undefined, undefined]);
      }
      const { data } = await pixelsOf(test, body.id);
      expect(data.length).toBe(120 * 80 * 3);
    });

    it('a JPEG is turned as its orientation says before that is dropped', async () => {
      // EXIF 2.3, tag 0x0112: 6 is 'row 0 is the right-hand side': to be turned by 90 degrees clockwise
      const { body } = await send(caseId, await quarters(200, 100).jpeg({ quality: 100, chromaSubsampling: '4:4:4' }).withMetadata({ orientation: 6 }).toBuffer());
      expect([body.width, body.height]).toEqual([100, 200]);
      const { at } = await pixelsOf(test, body.id);
      const near = (seen: number[], wanted: number[]) => expect(Math.max(...wanted.map((value, channel) => Math.abs(value - seen[channel]!)))).toBeLessThan(6);
      near(at(20, 20), [0, 0, 255]);
      near(at(80, 20), [255, 0, 0]);
      near(at(20, 180), [255, 255, 255]);
      near(at(80, 180), [0, 255, 0]);
    });

    it('the full picture is lossless, the view and the thumb fit their frames', async () => {
      const pixels = await noise(2000, 1000).raw().toBuffer();
      const file = await sharp(pixels, { raw: { width: 2000, height: 1000, channels: 3 } }).png().toBuffer();
      const { body } = await send(caseId, file);
      const full = await pixelsOf(test, body.id);
      expect(full.data.equals(pixels)).toBe(true);
      const sizes = await Promise.all((['thumb', 'view', 'full'] as const).map((size) => pixelsOf(test, body.id, size)));
      expect(sizes.map(({ width, height }) => [width, height])).toEqual([[400, 200], [1600, 800], [2000, 1000]]);
    });

    it('a picture longer than WebP allows is taken', async () => {
      // WebP container: at most 16383 pixels a side
      const { status, body } = await send(caseId, await noise(17_000, 20).png().toBuffer());
      expect([status, body.width, body.height]).toEqual([201, 17_000, 20]);
    });

    it('16 bits and transparency become 8 bits on white', async () => {
      const clear = await sharp({ create: { width: 40, height: 30, channels: 4, background: { r: 0, g: 0, b: 0, alpha: 0 } } }).png().toBuffer();
      expect((await pixelsOf(test, (await send(caseId, clear)).body.id)).at(5, 5)).toEqual([255, 255, 255]);
      const deep = await sharp({ create: { width: 40, height: 30, channels: 3, background: '#808080' } }).toColourspace('grey16').png().toBuffer();
      expect((await sharp(deep).metadata()).depth).toBe('ushort');
      expect((await pixelsOf(test, (await send(caseId, deep)).body.id)).at(5, 5).slice(0, 1)).toEqual([128]);
    });

    it('the change, its audit entry and its live event are there together', async () => {
      const { id } = await stored(caseId);
      const audit = await test.dataSource.manager.findBy(AuditEntry, { recordId: id });
      expect(audit.map((entry) => [entry.action, entry.caseId, entry.personId])).toEqual([['image.upload', caseId, as('surgeon').id]]);
      expect(await test.dataSource.manager.countBy(LiveEvent, { caseId, kind: 'images-changed' })).toBeGreaterThan(0);
    });
  });

  describe('what is served', () => {
    let caseId: string;
    let image: Awaited<ReturnType<typeof stored>>;
    beforeAll(async () => {
      ({ id: caseId } = await makeCase(test, world));
      image = await stored(caseId);
    });

    it.each(['thumb', 'view', 'full'] as const)('%s, by its signed address, without a token, to be kept by the browser', async (size) => {
      const response = await test.http().get(image.addresses[size]).buffer(true);
      expect(response.status).toBe(200);
      expect((response.body as Buffer).equals(await objectOf(test, `images/${image.id}/${size}`))).toBe(true);
      expect(response.headers['content-type']).toBe(size === 'full' ? 'image/png' : 'image/webp');
      expect(response.headers['content-disposition']).toBe('inline');
      expect(response.headers['x-content-type-options']).toBe('nosniff');
      const [, seconds] = /^private, max-age=(\d+), immutable$/.exec(response.headers['cache-control']!) ?? [];
      const expires = Number(new URLSearchParams(image.addresses[size].split('?')[1]).get('expires')) * 1000;
      expect(Math.abs(Number(seconds) * 1000 - (expires - Date.now()))).toBeLessThan(5000);
      const again = await test.http().get(image.addresses[size]).set('If-None-Match', response.headers['etag']!);
      expect([again.status, again.text]).toEqual([304, '']);
    });

    it('the address is the same all hour and good for one to two', async () => {
      const first = await test.http().get(`/api/cases/${caseId}/images`).set(as('panellist').auth);
      const second = await test.http().get(`/api/cases/${caseId}`).set(as('chair').auth);
      const address = new URL(first.body.items[0].addresses.view, test.url);
      const expires = Number(address.searchParams.get('expires')) * 1000;
      expect(expires % HOUR).toBe(0);
      expect(expires - Date.now()).toBeGreaterThan(HOUR - 5000);
      expect(expires - Date.now()).toBeLessThanOrEqual(2 * HOUR);
      expect(second.body.images.map((shown: { addresses: object }) => shown.addresses)).toEqual([first.body.items[0].addresses]);
    });

    const resigned = (id: string, size: string, expires: number, secret: string) =>
      `/api/images/${id}/file/${size}?expires=${expires}&signature=${createHmac('sha256', secret).update(`${id}/${size}/${expires}`).digest('hex')}`;
    const soon = () => Math.floor(Date.now() / 1000) + 600;

    it('an address that has expired, or was changed, is refused', async () => {
      const { addressSecret } = test.settings;
      // the way of signing, so that what follows is refused for its time and its secret alone
      expect((await test.http().get(resigned(image.id, 'view', soon(), addressSecret))).status).toBe(200);
      const { addresses } = await stored(caseId);
      const later = image.addresses.view.replace(/expires=(\d+)/, (_, seconds) => `expires=${Number(seconds) + 3600}`);
      for (const address of [
        resigned(image.id, 'view', soon() - 700, addressSecret),
        resigned(image.id, 'view', soon(), `${addressSecret}x`),
        later,
        image.addresses.view.replace('/view', '/full'),
        `${image.addresses.view.split('?')[0]}?${addresses.view.split('?')[1]}`,
      ]) {
        const { status, body, headers } = await test.http().get(address);
        expect([status, body.type]).toEqual([403, 'urn:kerfside:problem:forbidden']);
        expect(headers['cache-control']).toBe('no-store');
      }
    });

    it.each([
      ['no signature', (address: string) => address.split('&')[0]!, 422],
      ['a signature that is none', (address: string) => address.replace(/signature=\w+/, 'signature=zz'), 422],
      ['an unknown size', (address: string) => address.replace('/view', '/huge'), 404],
      ['an id that is none', (address: string) => address.replace(/images\/[^/]+/, 'images/7'), 404],
    ])('%s is refused', async (_, change, status) => {
      expect((await test.http().get(change(image.addresses.view))).status).toBe(status);
    });

    it('a picture that never was is not found under a good signature', async () => {
      expect((await test.http().get(resigned('7d1b8f0e-5c0f-4a55-9c31-0d6f0f2b8a11', 'view', soon(), test.settings.addressSecret))).status).toBe(404);
    });
  });

  describe('who may', () => {
    let open: string;
    let draft: string;
    let inOpen: string;
    let inDraft: string;
    beforeAll(async () => {
      open = (await makeCase(test, world)).id;
      draft = (await makeCase(test, world, { stage: 'draft' })).id;
      inOpen = (await stored(open)).id;
      inDraft = (await stored(draft)).id;
    });

    // domain: a draft is its presenter's alone; a conference's case does not exist for those outside it
    it.each<[WorldPerson, [number, number], [number, number]]>([
      ['surgeon', [200, 200], [201, 201]],
      ['surgeon2', [200, 404], [403, 404]],
      ['panellist', [200, 404], [403, 403]],
      ['chair', [200, 404], [403, 403]],
      ['coordinator', [200, 404], [403, 403]],
      ['observer', [200, 404], [403, 403]],
      ['outsider', [404, 404], [404, 404]],
      ['admin', [404, 404], [404, 404]],
    ])('%s: list %j and upload %j of an open case and a draft', async (name, lists, uploads) => {
      for (const [index, caseId] of [open, draft].entries()) {
        expect((await test.http().get(`/api/cases/${caseId}/images`).set(as(name).auth)).status).toBe(lists[index]);
        expect((await upload(test, as(name), caseId, await plainPng())).status).toBe(uploads[index]);
      }
    });

    it.each<[WorldPerson, number, number]>([
      ['surgeon2', 403, 404],
      ['panellist', 403, 403],
      ['outsider', 404, 404],
      ['admin', 404, 404],
    ])('%s can neither change nor remove: %i in an open case, %i in a draft', async (name, ofOpen, ofDraft) => {
      for (const [id, status] of [[inOpen, ofOpen], [inDraft, ofDraft]] as const) {
        expect((await test.http().patch(`/api/images/${id}`).set(as(name).auth).send({ caption: 'Mine now' })).status).toBe(status);
        expect((await test.http().delete(`/api/images/${id}`).set(as(name).auth)).status).toBe(status);
      }
      expect(await test.dataSource.manager.countBy(CaseImage, { id: inOpen, state: 'ready', caption: '' })).toBe(1);
    });

    it('without a token nothing', async () => {
      expect((await test.http().get(`/api/cases/${open}/images`)).status).toBe(401);
      expect((await test.http().post(`/api/cases/${open}/images`).attach('file', await plainPng(), 'film.png')).status).toBe(401);
    });

    it("another conference's picture is refused in the words of one that never was", async () => {
      const never = '7d1b8f0e-5c0f-4a55-9c31-0d6f0f2b8a11';
      const answers = await Promise.all([inOpen, never].map((id) => test.http().delete(`/api/images/${id}`).set(as('outsider').auth)));
      expect(answers[0]!.body).toEqual(answers[1]!.body);
    });
  });

  describe('changing', () => {
    it('projection, interval, caption and place', async () => {
      const { id: caseId } = await makeCase(test, world);
      const [first, second] = [await stored(caseId), await stored(caseId)];
      const changed = await test.http().patch(`/api/images/${first.id}`).set(as('surgeon').auth).send({ projection: 'lateral', interval: '3 months after', caption: 'Shell has moved', position: 7 });
      expect(changed.status).toBe(200);
      const { body } = await test.http().get(`/api/cases/${caseId}/images`).set(as('panellist').auth);
      expect(body.items.map((item: { id: string }) => item.id)).toEqual([second.id, first.id]);
      expect(body.items[1]).toEqual({ ...changed.body, addresses: body.items[1].addresses });
      expect(body.items[1]).toMatchObject({ projection: 'lateral', interval: '3 months after', caption: 'Shell has moved', position: 7 });
    });

    it('the fields beside the file are kept, and refused where they say who it is', async () => {
      const { id: caseId } = await makeCase(test, world);
      const withFields = async (fields: Record<string, string>) =>
        Object.entries(fields).reduce((call, [name, value]) => call.field(name, value), upload(test, as('surgeon'), caseId, await plainPng()));
      expect((await withFields({ projection: 'ap-pelvis', interval: 'before revision', caption: 'Standing' })).body).toMatchObject({ projection: 'ap-pelvis', interval: 'before revision', caption: 'Standing' });
      for (const [fields, field] of [
        [{ caption: 'NHS number 943 476 5919' }, 'caption'],
        [{ projection: 'sideways' }, 'projection'],
        [{ interval: 'x'.repeat(121) }, 'interval'],
        [{ colour: 'blue' }, 'colour'],
      ] as const) {
        const { status, body } = await withFields(fields);
        expect([status, body.errors?.[0]?.field]).toEqual([422, field]);
      }
      const [{ id }] = (await test.http().get(`/api/cases/${caseId}/images`).set(as('surgeon').auth)).body.items;
      const changed = await test.http().patch(`/api/images/${id}`).set(as('surgeon').auth).send({ caption: 'NHS number 943 476 5919' });
      expect([changed.status, changed.body.errors[0].field]).toEqual([422, 'caption']);
      expect(await test.dataSource.manager.countBy(CaseImage, { caseId })).toBe(1);
    });

    it('a removed picture is gone at once, from the store too, and a thread about it stays', async () => {
      const { id: caseId } = await makeCase(test, world);
      const { id, addresses } = await stored(caseId);
      const thread = await test.http().post(`/api/cases/${caseId}/threads`).set(as('panellist').auth).send({ anchorKind: 'image', anchorRef: id, kind: 'remark', content: paragraph('The screw is bent.') });
      expect(thread.status).toBe(201);
      const removals = await Promise.all([1, 2].map(() => test.http().delete(`/api/images/${id}`).set(as('surgeon').auth)));
      expect(removals.map(({ status }) => status).sort()).toEqual([204, 404]);
      expect(await test.dataSource.manager.countBy(AuditEntry, { recordId: id, action: 'image.remove' })).toBe(1);
      expect((await test.http().get(addresses.view)).status).toBe(404);
      expect(await keysInStore(test, id)).toEqual([]);
      expect((await test.http().get(`/api/cases/${caseId}/images`).set(as('surgeon').auth)).body.items).toEqual([]);
      const threads = await test.http().get(`/api/cases/${caseId}/threads`).set(as('chair').auth);
      expect(threads.body.items.map((item: { anchorRef: string }) => item.anchorRef)).toContain(id);
    });

    it.each<[Stage, number]>([['draft', 201], ['checking', 409], ['open', 201], ['listed', 201], ['decided', 409], ['withdrawn', 409]])('at the stage %s an upload is answered %i', async (stage, status) => {
      const { id: caseId } = await makeCase(test, world, { stage: 'open' });
      const { id } = await stored(caseId);
      await setStage(test, caseId, stage);
      const answer = await send(caseId, await plainPng());
      expect(answer.status).toBe(status);
      if (status === 409) expect(answer.body.type).toBe('urn:kerfside:problem:wrong-stage');
      expect((await test.http().patch(`/api/images/${id}`).set(as('surgeon').auth).send({ caption: 'Later' })).status).toBe(status === 201 ? 200 : 409);
      expect((await test.http().delete(`/api/images/${id}`).set(as('surgeon').auth)).status).toBe(status === 201 ? 204 : 409);
    });
  });

  describe('limits', () => {
    it('the same file twice in a case is refused, also at the same moment; in another case it is taken', async () => {
      const { id: caseId } = await makeCase(test, world);
      const file = await plainPng(300, 200);
      const answers = await Promise.all([1, 2, 3].map(() => send(caseId, file)));
      expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409]);
      expect(answers.find(({ status }) => status === 409)!.body.detail).toMatch(/very file/);
      expect(await test.dataSource.manager.countBy(CaseImage, { caseId })).toBe(1);
      const { id: otherId } = await makeCase(test, world);
      expect((await send(otherId, file)).status).toBe(201);
      // removed, it can be sent again
      const { id } = answers.find(({ status }) => status === 201)!.body;
      await test.http().delete(`/api/images/${id}`).set(as('surgeon').auth);
      expect((await send(caseId, file)).status).toBe(201);
    });

    it('a case holds 60 pictures, also where several are sent at once', async () => {
      const { id: caseId } = await makeCase(test, world);
      for (let number = 0; number < 58; number++) await addImageRow(test, caseId, as('surgeon').id);
      const files = await Promise.all([1, 2, 3, 4].map(() => plainPng()));
      const answers = await Promise.all(files.map((file) => send(caseId, file)));
      expect(answers.map(({ status }) => status).sort()).toEqual([201, 201, 422, 422]);
      expect(answers.find(({ status }) => status === 422)!.body.errors[0].code).toBe('too-many');
    });

    it('many at once wait for their turn', async () => {
      const { id: caseId } = await makeCase(test, world);
      const files = await Promise.all(Array.from({ length: 20 }, () => plainPng(200, 150)));
      const answers = await Promise.all(files.map((file) => send(caseId, file)));
      expect(new Set(answers.map(({ status }) => status))).toEqual(new Set([201]));
      expect(new Set(answers.map(({ body }) => body.position)).size).toBe(20);
    });
  });
});
