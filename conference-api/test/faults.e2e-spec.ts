import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import sharp from 'sharp';
import { startMariaDB, type MariaDBServer } from '../../scripts/lib/mariadb.mjs';
import { freePort } from '../../scripts/lib/ports.mjs';
import { CaseImage } from '../src/images/entities/case-image.entity.js';
import { JobsService } from '../src/jobs/jobs.service.js';
import { OutboxMail } from '../src/mail/entities/outbox-mail.entity.js';
import { OutboxSender } from '../src/mail/outbox-sender.service.js';
import { makeCase } from './factories/case-rows.js';
import { createMeeting } from './factories/slots.js';
import { makeWorld, PASSWORD, type World } from './factories/world.js';
import { listen } from './support/event-stream.js';
import { type MailServer, startMailServer } from './support/mail-server.js';
import { type ObjectStore, startObjectStore } from './support/object-store.js';
import { startTestApp, type TestApp } from './support/test-app.js';

interface Answer {
  status: number;
  type?: string;
  body: { type?: string; part?: string; detail?: string };
  headers: Record<string, string>;
}

/** A 503 that says which part is away, that nothing was changed and when to come again. */
function expectUnavailable(answer: Answer, part: string) {
  expect(answer.status).toBe(503);
  expect(answer.headers['content-type']).toContain('application/problem+json');
  expect(answer.headers['retry-after']).toMatch(/^\d+$/);
  expect(answer.body).toMatchObject({ type: 'urn:kerfside:problem:unavailable', part });
  expect(answer.body.detail).toContain(part);
}

describe('faults', () => {
  let folder: string;
  let database: MariaDBServer;
  let mail: MailServer;
  let store: ObjectStore;
  let test: TestApp;
  let world: World;

  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), 'kerfside-faults-'));
    [database, mail, store] = await Promise.all([
      freePort().then((port) => startMariaDB({ dataDir: join(folder, 'db'), port, password: 'of-this-test-only', databases: ['kerfside_faults'], durable: false })),
      startMailServer(),
      startObjectStore(),
    ]);
    test = await startTestApp({ KERFSIDE_SMTP_URL: mail.smtpUrl, ...store.environment, KERFSIDE_JOBS: 'true' }, database.url);
    await test.dataSource.runMigrations({ transaction: 'none' });
    world = await makeWorld(test);
  }, 120_000);

  afterAll(async () => {
    await test?.close();
    await database?.stop();
    await Promise.all([mail?.remove(), store?.remove()]);
    await rm(folder, { recursive: true, force: true });
  }, 60_000);

  describe('with the database stopped', () => {
    it('every route says so within seconds, and all goes on when it is back, with nothing lost', async () => {
      const meeting = await createMeeting(test, world, 5);
      const page = await listen(test.url, world.people.panellist.auth);
      await database.stop();
      const begun = Date.now();
      const { chair, surgeon } = world.people;
      expectUnavailable(await test.http().get('/api/meetings').set(chair.auth), 'database');
      expectUnavailable(await test.http().get(`/api/meetings/${meeting.id}`).set(chair.auth), 'database');
      expectUnavailable(await test.http().post(`/api/meetings/${meeting.id}/agenda/send`).set(chair.auth).send({ baseVersion: 1 }), 'database');
      expectUnavailable(await test.http().post('/api/auth/sign-in').send({ email: surgeon.email, password: PASSWORD }), 'database');
      expectUnavailable(await test.http().get('/api/events').set(chair.auth), 'database');
      expect(Date.now() - begun).toBeLessThan(10_000);
      const health = await test.http().get('/api/health/ready');
      expect([health.status, health.body.parts.database.state, health.body.parts.mail.state, health.body.oldestUnsentMailSeconds]).toEqual([503, 'down', 'up', null]);
      expect((await test.http().get('/api/health/live')).status).toBe(200);

      await database.start();
      const seen = await test.http().get(`/api/meetings/${meeting.id}`).set(chair.auth);
      expect([seen.status, seen.body.version, seen.body.agendaSentAt]).toEqual([200, 1, null]);
      expect((await test.http().post(`/api/meetings/${meeting.id}/agenda/send`).set(chair.auth).send({ baseVersion: 1 })).status).toBe(200);
      // the page that was open hears what happens after
      await page.until((event) => event.data?.meetingId === meeting.id);
      page.stop();
      // and the server's own work has gone on: the mails go out by themselves
      await until(async () => (await mail.to(chair.email)).some((caught) => caught.text.includes(meeting.id)));
    }, 60_000);

    it('its own work bears it and does not end the process', async () => {
      await database.stop();
      const jobs = test.app.get(JobsService);
      await Promise.all([jobs.sendMail(), jobs.sendAgendas(), jobs.makeMeetings(), jobs.forgetEvents(), jobs.sweepImages()]);
      expect((await test.http().get('/api/health/live')).status).toBe(200);
      await database.start();
      await jobs.makeMeetings();
      expect((await test.http().get('/api/meetings').set(world.people.chair.auth)).body.items.length).toBeGreaterThanOrEqual(8);
    }, 60_000);

    it('one that is there and does not answer is told as down in time', async () => {
      process.kill(database.pid!, 'SIGSTOP');
      const begun = Date.now();
      try {
        const { status, body } = await test.http().get('/api/health/ready');
        expect([status, body.parts.database.state]).toEqual([503, 'down']);
        expect(Date.now() - begun).toBeLessThan(5000);
      } finally {
        process.kill(database.pid!, 'SIGCONT');
      }
      await until(async () => (await test.http().get('/api/health/ready')).status === 200);
    }, 60_000);
  });

  describe('with the object store away', () => {
    const upload = async (caseId: string) => {
      const png = await sharp({ create: { width: 64, height: 48, channels: 3, background: '#777777' } }).png().toBuffer();
      return test.http().post(`/api/cases/${caseId}/images`).set(world.people.surgeon.auth).attach('file', png, 'film.png');
    };

    it.each([
      ['stopped', () => store.stop(), () => store.start()],
      ['failing', () => store.behave('fail'), () => store.behave('ok')],
    ])('%s: a picture is refused whole and taken when it is back', async (_, breakIt, mendIt) => {
      const found = await makeCase(test, world, { stage: 'draft' });
      await breakIt();
      expectUnavailable(await upload(found.id), 'object store');
      expect(await test.dataSource.manager.countBy(CaseImage, { caseId: found.id, state: 'ready' })).toBe(0);
      // all that needs no picture goes on
      expect((await test.http().get('/api/meetings').set(world.people.chair.auth)).status).toBe(200);
      await mendIt();
      const taken = await upload(found.id);
      expect(taken.status).toBe(201);
      expect((await test.http().get(taken.body.addresses.view)).status).toBe(200);
    }, 60_000);
  });

  describe('with the mail server stopped', () => {
    it('everything is done as usual, and the mails are sent when it is back', async () => {
      const meeting = await createMeeting(test, world, 6);
      await mail.stop();
      const sent = await test.http().post(`/api/meetings/${meeting.id}/agenda/send`).set(world.people.chair.auth).send({ baseVersion: 1 });
      expect([sent.status, sent.body.mails]).toEqual([200, 7]);
      const mails = () => test.dataSource.manager.createQueryBuilder(OutboxMail, 'mail').where('mail.purpose LIKE :of', { of: `agenda:${meeting.id}:%` }).getMany();
      await until(async () => (await mails()).every((row) => row.attempts > 0 && row.state === 'queued'));
      const health = await test.http().get('/api/health/ready');
      expect([health.status, health.body.parts.mail.state]).toEqual([503, 'down']);
      expect(health.body.oldestUnsentMailSeconds).toBeGreaterThanOrEqual(0);
      await mail.start();
      await until(async () => {
        await test.app.get(OutboxSender).sendDue(new Date(Date.now() + 120_000));
        return (await mails()).every((row) => row.state === 'sent');
      });
      for (const { email } of [world.people.surgeon, world.people.observer])
        expect((await mail.to(email)).filter((caught) => caught.text.includes(meeting.id))).toHaveLength(1);
    }, 60_000);
  });
});

/** Waits for what the server does by itself. */
async function until(isSo: () => Promise<boolean>, limitMs = 20_000): Promise<void> {
  for (const begun = Date.now(); Date.now() - begun < limitMs; await pause(100)) if (await isSo()) return;
  throw new Error(`it did not become so within ${limitMs} ms`);
}
