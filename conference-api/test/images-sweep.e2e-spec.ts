import { randomUUID } from 'node:crypto';
import { setTimeout as pause } from 'node:timers/promises';
import { AuditEntry } from '../src/audit/entities/audit-entry.entity.js';
import { Case } from '../src/cases/entities/case.entity.js';
import { CaseImage } from '../src/images/entities/case-image.entity.js';
import { ImageSweepService } from '../src/images/image-sweep.service.js';
import { StorageService } from '../src/storage/storage.service.js';
import { makeCase } from './factories/case-rows.js';
import { setStage } from './factories/cases.js';
import { makeWorld, type World } from './factories/world.js';
import { type ObjectStore, startObjectStore } from './support/object-store.js';
import { noise, plainPng } from './support/picture-files.js';
import { keysInStore, upload } from './support/stored-pictures.js';
import { startTestApp, type TestApp } from './support/test-app.js';

const MINUTE = 60_000;
const DAY = 86_400_000;
const inMinutes = (minutes: number) => new Date(Date.now() + minutes * MINUTE);

describe('pictures left half-way, and pictures whose time is over', () => {
  let store: ObjectStore;
  let test: TestApp;
  let world: World;
  let caseId: string;

  beforeAll(async () => {
    // S3's own limit made small, so that the third object of a picture is refused after two were taken
    store = await startObjectStore({ maxObjectBytes: 400_000 });
    test = await startTestApp({ ...store.environment, KERFSIDE_RETENTION_DAYS: '30' });
    world = await makeWorld(test);
  });

  afterAll(async () => {
    await test?.close();
    await store?.remove();
  });

  beforeEach(async () => {
    ({ id: caseId } = await makeCase(test, world));
  });

  afterEach(() => store.behave('ok'));

  const send = (file: Buffer) => upload(test, world.people.surgeon, caseId, file);
  const sweep = (now = new Date()) => test.app.get(ImageSweepService).sweep(now);
  const rows = () => test.dataSource.manager.findBy(CaseImage, { caseId });
  const taken = async () => {
    const { status, body } = await send(await plainPng());
    expect(status).toBe(201);
    return body as { id: string; addresses: { view: string } };
  };
  /** As a process leaves it that ends between two of its steps. */
  const plant = async (state: CaseImage['state'] | 'no row', minutesAgo: number) => {
    const id = randomUUID();
    for (const size of ['thumb', 'view']) await test.app.get(StorageService).put(`images/${id}/${size}`, Buffer.from('left'), 'image/webp');
    if (state !== 'no row')
      await test.dataSource.manager.insert(CaseImage, { id, caseId, state, sourceKind: 'png', sourceHash: id.replaceAll('-', '').padEnd(64, '0'), uploadedById: world.people.surgeon.id, createdAt: inMinutes(-minutesAgo) });
    return id;
  };
  /** Sends a picture to a slow store, and does something once its row is there and its files are not all. */
  const whileStoring = async (work: () => Promise<unknown>) => {
    await store.behave('delay', 700);
    const sending = send(await plainPng()).then((answer) => answer);
    for (const begun = Date.now(); !(await rows()).some(({ state }) => state === 'storing'); await pause(20)) if (Date.now() - begun > 20_000) throw new Error('no row came');
    await work();
    const answer = await sending;
    await store.behave('ok');
    return answer;
  };

  describe('a picture that can not be stored whole', () => {
    it('of which the store refuses the third object leaves no row and no object', async () => {
      const before = await keysInStore(test);
      const { status, body, headers } = await send(await noise(700, 500).png().toBuffer());
      expect([status, body.part, headers['retry-after']]).toEqual([503, 'object store', '5']);
      expect(body.detail).not.toMatch(/EntityTooLarge|S3|bucket/i);
      expect(await rows()).toEqual([]);
      expect(await keysInStore(test)).toEqual(before);
    });

    it('whose case leaves its stage meanwhile is refused, and leaves nothing', async () => {
      const before = await keysInStore(test);
      const { status, body } = await whileStoring(() => setStage(test, caseId, 'checking'));
      expect([status, body.type]).toEqual([409, 'urn:kerfside:problem:wrong-stage']);
      expect(await rows()).toEqual([]);
      expect(await keysInStore(test)).toEqual(before);
    });

    it('that the sweep took for abandoned is refused, and the next sweep leaves nothing of it', async () => {
      await sweep(inMinutes(11));
      const before = await keysInStore(test);
      const { status } = await whileStoring(() => test.dataSource.manager.delete(CaseImage, { caseId, state: 'storing' }));
      expect(status).toBe(503);
      expect(await rows()).toEqual([]);
      await sweep(inMinutes(11));
      expect(await keysInStore(test)).toEqual(before);
    });

    it('is not shown and not counted while it is being stored', async () => {
      const { status } = await whileStoring(async () => {
        expect((await test.http().get(`/api/cases/${caseId}/images`).set(world.people.surgeon.auth)).body.items).toEqual([]);
      });
      expect(status).toBe(201);
    });
  });

  describe('the sweep', () => {
    it('takes rows that were left storing with their files, files without a row, and files of removed rows', async () => {
      const kept = await taken();
      const left = await Promise.all([plant('storing', 11), plant('no row', 0), plant('removed', 60)]);
      const young = await plant('storing', 0);
      // what is younger than ten minutes may be on its way
      expect(await sweep()).toEqual({ abandoned: 1, retired: 0, orphans: 0 });
      expect(await keysInStore(test, left[0])).toEqual([]);
      expect(await keysInStore(test, young)).toHaveLength(2);
      // once it is older its files go; a row in storing keeps its own
      await test.dataSource.manager.update(CaseImage, { id: young }, { createdAt: inMinutes(5) });
      expect(await sweep(inMinutes(11))).toEqual({ abandoned: 0, retired: 0, orphans: 4 });
      for (const id of left) expect(await keysInStore(test, id)).toEqual([]);
      expect(await keysInStore(test, young)).toHaveLength(2);
      expect(await keysInStore(test, kept.id)).toHaveLength(3);
      expect((await test.http().get(kept.addresses.view)).status).toBe(200);
      expect(await sweep(inMinutes(20))).toEqual({ abandoned: 1, retired: 0, orphans: 0 });
      expect((await rows()).map(({ state }) => state).sort()).toEqual(['ready', 'removed']);
    });

    it('a file that was left half-way can be sent again before the sweep comes', async () => {
      const file = await plainPng();
      const { body } = await send(file);
      await test.dataSource.manager.update(CaseImage, { id: body.id }, { state: 'storing' });
      const soon = await send(file);
      expect([soon.status, soon.body.detail]).toEqual([409, expect.stringContaining('being stored')]);
      await test.dataSource.manager.update(CaseImage, { id: body.id }, { createdAt: inMinutes(-11) });
      expect((await send(file)).status).toBe(201);
      expect((await sweep()).abandoned).toBe(1);
      expect((await rows()).map(({ state }) => state)).toEqual(['ready']);
    });

    it('of two processes at once does each thing once', async () => {
      const kept = await taken();
      const left = await Promise.all([plant('storing', 30), plant('storing', 30), plant('storing', 30)]);
      const results = await Promise.all([sweep(), sweep()]);
      expect(results[0]!.abandoned + results[1]!.abandoned).toBe(3);
      for (const id of left) expect(await keysInStore(test, id)).toEqual([]);
      expect((await rows()).map(({ id }) => id)).toEqual([kept.id]);
    });

    it('broken off by the store loses nothing, and is done when it is back', async () => {
      const kept = await taken();
      const left = await plant('storing', 30);
      await store.behave('fail');
      await expect(sweep(inMinutes(11))).rejects.toMatchObject({ code: 'unavailable' });
      await store.behave('ok');
      await sweep(inMinutes(11));
      expect(await keysInStore(test, left)).toEqual([]);
      expect((await rows()).map(({ id, state }) => [id, state])).toEqual([[kept.id, 'ready']]);
      expect(await keysInStore(test, kept.id)).toHaveLength(3);
    });

    it('a removal while the store is away is done to the end by the sweep', async () => {
      const { id, addresses } = await taken();
      await store.behave('fail');
      expect((await test.http().delete(`/api/images/${id}`).set(world.people.surgeon.auth)).status).toBe(204);
      await store.behave('ok');
      expect((await test.http().get(addresses.view)).status).toBe(404);
      expect(await keysInStore(test, id)).toHaveLength(3);
      await sweep(inMinutes(11));
      expect(await keysInStore(test, id)).toEqual([]);
    });
  });

  describe('retention', () => {
    const withdrawn = (daysAgo: number) => test.dataSource.manager.update(Case, { id: caseId }, { stage: 'withdrawn', withdrawnAt: new Date(Date.now() - daysAgo * DAY) });

    it('pictures of a case withdrawn 31 days ago are deleted, and it is on record', async () => {
      const { id, addresses } = await taken();
      await withdrawn(31);
      expect((await sweep()).retired).toBe(1);
      expect(await keysInStore(test, id)).toEqual([]);
      expect((await rows()).map(({ state }) => state)).toEqual(['removed']);
      expect((await test.http().get(addresses.view)).status).toBe(404);
      const audit = await test.dataSource.manager.findBy(AuditEntry, { recordId: id, action: 'image.retire' });
      expect(audit.map((entry) => [entry.caseId, entry.personId])).toEqual([[caseId, null]]);
      expect((await sweep()).retired).toBe(0);
    });

    it('those of a case withdrawn 29 days ago stay', async () => {
      const { id } = await taken();
      await withdrawn(29);
      expect((await sweep()).retired).toBe(0);
      expect(await keysInStore(test, id)).toHaveLength(3);
    });

    it('those of a case that was not withdrawn stay, however old', async () => {
      const { id } = await taken();
      await test.dataSource.manager.update(CaseImage, { id }, { createdAt: new Date(Date.now() - 400 * DAY) });
      expect((await sweep()).retired).toBe(0);
      expect(await keysInStore(test, id)).toHaveLength(3);
    });
  });
});
