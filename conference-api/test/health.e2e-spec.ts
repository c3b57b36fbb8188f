import { createServer, type Server } from 'node:net';
import type { AddressInfo } from 'node:net';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { OutboxMail } from '../src/mail/entities/outbox-mail.entity.js';
import { type MailServer, startMailServer } from './support/mail-server.js';
import { type ObjectStore, startObjectStore } from './support/object-store.js';
import { startTestApp, type TestApp } from './support/test-app.js';

// the database's part stands in faults.e2e-spec.ts, which has one of its own to stop
describe('health', () => {
  let mail: MailServer;
  let store: ObjectStore;
  let test: TestApp;

  const ready = () => test.http().get('/api/health/ready');

  beforeAll(async () => {
    [mail, store] = await Promise.all([startMailServer(), startObjectStore()]);
    test = await startTestApp({ KERFSIDE_SMTP_URL: mail.smtpUrl, ...store.environment });
  });
  afterEach(async () => {
    await mail.start();
    await mail.behave({ mode: 'accept' });
    await store.start();
    await store.behave('ok');
    await test.dataSource.manager.clear(OutboxMail);
  });
  afterAll(async () => {
    await test?.close();
    await Promise.all([mail?.remove(), store?.remove()]);
  });

  it('is up with every part, for anyone who asks', async () => {
    const { status, body, headers } = await ready();
    expect(status).toBe(200);
    expect(body).toMatchObject({
      state: 'up',
      parts: { database: { state: 'up' }, objectStore: { state: 'up' }, mail: { state: 'up' } },
      oldestUnsentMailSeconds: null,
    });
    expect(headers['cache-control']).toBe('no-store');
    expect((await test.http().get('/api/health/live')).body).toEqual({ state: 'up' });
  });

  it.each([
    ['stopped', () => mail.stop()],
    ['refusing everyone', () => mail.behave({ mode: 'refuse', at: 'connect' })],
  ])('is down with the mail server %s, and says so', async (_, break_) => {
    await break_();
    const { status, body, headers } = await ready();
    expect(status).toBe(503);
    expect(headers['retry-after']).toMatch(/^\d+$/);
    expect(body).toMatchObject({ state: 'down', parts: { database: { state: 'up' }, objectStore: { state: 'up' }, mail: { state: 'down' } } });
  });

  it.each([
    ['stopped', () => store.stop()],
    ['failing', () => store.behave('fail')],
  ])('is down with the object store %s, and says so', async (_, break_) => {
    await break_();
    const { status, body } = await ready();
    expect(status).toBe(503);
    expect(body.parts).toMatchObject({ database: { state: 'up' }, objectStore: { state: 'down' }, mail: { state: 'up' } });
  });

  it('is up again when the part is back', async () => {
    await Promise.all([mail.stop(), store.stop()]);
    expect((await ready()).body.parts).toMatchObject({ objectStore: { state: 'down' }, mail: { state: 'down' } });
    await Promise.all([mail.start(), store.start()]);
    expect((await ready()).status).toBe(200);
  });

  it('does not wait for a mail server that takes the connection and says nothing', async () => {
    const silent: Server = createServer(() => undefined);
    await new Promise<void>((resolve) => silent.listen(0, '127.0.0.1', resolve));
    const app = await startTestApp({ KERFSIDE_SMTP_URL: `smtp://127.0.0.1:${(silent.address() as AddressInfo).port}`, ...store.environment });
    try {
      const begun = Date.now();
      const { status, body } = await app.http().get('/api/health/ready');
      expect([status, body.parts.mail.state]).toEqual([503, 'down']);
      expect(Date.now() - begun).toBeLessThan(4000);
    } finally {
      await app.close();
      silent.close();
    }
  });

  it('tells how long the oldest mail has waited', async () => {
    await test.app.get(UnitOfWork).run(null, (tx) => tx.mail([{ purpose: 'p', personId: null, recipient: 'a@kerfside.example', template: 'mention', data: {} }]));
    await test.dataSource.manager.update(OutboxMail, { purpose: 'p' }, { createdAt: new Date(Date.now() - 3_600_000) });
    const { oldestUnsentMailSeconds } = (await ready()).body;
    expect(oldestUnsentMailSeconds).toBeGreaterThanOrEqual(3600);
    expect(oldestUnsentMailSeconds).toBeLessThan(3700);
  });
});
