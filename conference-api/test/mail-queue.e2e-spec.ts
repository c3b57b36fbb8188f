import { AuditEntry } from '../src/audit/entities/audit-entry.entity.js';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { OutboxMail } from '../src/mail/entities/outbox-mail.entity.js';
import { OutboxSender } from '../src/mail/outbox-sender.service.js';
import { makeWorld, type World } from './factories/world.js';
import { type MailServer, startMailServer } from './support/mail-server.js';
import { startTestApp, type TestApp } from './support/test-app.js';

describe('the mail queue', () => {
  let mail: MailServer;
  let test: TestApp;
  let world: World;

  const put = (recipient: string, template = 'mention') =>
    test.app.get(UnitOfWork).run(null, (tx) =>
      tx.mail([{ purpose: `test:${recipient}`, personId: null, recipient, template, data: { name: 'A', code: 'HIP-0042', author: 'B', url: 'http://kerfside.test/reset-password/s3cret' } }]),
    );
  const rowOf = (recipient: string) => test.dataSource.manager.findOneByOrFail(OutboxMail, { recipient });
  const list = (query = '') => test.http().get(`/api/mail${query}`).set(world.people.admin.auth);

  beforeAll(async () => {
    mail = await startMailServer();
    test = await startTestApp({ KERFSIDE_SMTP_URL: mail.smtpUrl });
    world = await makeWorld(test);
  });
  beforeEach(() => test.dataSource.manager.clear(OutboxMail));
  afterAll(async () => {
    await test?.close();
    await mail?.remove();
  });

  it('is the administrator’s alone', async () => {
    await put('a@kerfside.example');
    const { id } = await rowOf('a@kerfside.example');
    for (const person of [world.people.chair, world.people.coordinator, world.people.surgeon]) {
      expect((await test.http().get('/api/mail').set(person.auth)).status).toBe(403);
      expect((await test.http().post(`/api/mail/${id}/retry`).set(person.auth)).status).toBe(403);
      expect((await test.http().post(`/api/mail/${id}/drop`).set(person.auth).send({ reason: 'x' })).status).toBe(403);
    }
    expect((await test.http().get('/api/mail')).status).toBe(401);
  });

  it('shows what waits and since when, newest first, page by page', async () => {
    for (const name of ['a', 'b', 'c']) await put(`${name}@kerfside.example`);
    await test.dataSource.manager.update(OutboxMail, { recipient: 'a@kerfside.example' }, { createdAt: new Date(Date.now() - 90_000) });
    const first = (await list('?limit=2')).body;
    expect(first.items.map((item: { recipient: string }) => item.recipient)).toEqual(['c@kerfside.example', 'b@kerfside.example']);
    expect(first.waiting).toBe(3);
    expect(first.oldestUnsentSeconds).toBeGreaterThanOrEqual(89);
    expect(first.oldestUnsentSeconds).toBeLessThan(200);
    const second = (await list(`?limit=2&cursor=${first.nextCursor}`)).body;
    expect(second.items.map((item: { recipient: string }) => item.recipient)).toEqual(['a@kerfside.example']);
    expect(second.nextCursor).toBeNull();
    expect((await list('?state=sent')).body.items).toEqual([]);
    expect((await list('?state=lost')).status).toBe(422);
    // neither the list nor its entries tell what the mail says
    expect(JSON.stringify(first)).not.toContain('s3cret');
  });

  it('sends a mail that was refused for good when asked to', async () => {
    await put('a@kerfside.example');
    await mail.behave({ mode: 'refuse', code: 550 });
    await test.app.get(OutboxSender).sendDue();
    await mail.behave({ mode: 'accept' });
    const { id } = await rowOf('a@kerfside.example');
    const retried = await test.http().post(`/api/mail/${id}/retry`).set(world.people.admin.auth);
    expect(retried.status).toBe(200);
    expect(retried.body.state).toBe('queued');
    await test.app.get(OutboxSender).sendDue();
    expect(await mail.to('a@kerfside.example')).toHaveLength(1);
    const entry = await test.dataSource.manager.findOneByOrFail(AuditEntry, { action: 'mail.retry', recordId: id });
    expect(entry).toMatchObject({ personId: world.people.admin.id, details: { from: 'failed', template: 'mention' } });
    // sent is sent
    const again = await test.http().post(`/api/mail/${id}/retry`).set(world.people.admin.auth);
    expect(again.status).toBe(409);
    expect(again.body.type).toBe('urn:kerfside:problem:wrong-stage');
  });

  it('drops a mail with a reason; it is never sent and keeps no secret', async () => {
    await put('a@kerfside.example', 'password-reset');
    const { id } = await rowOf('a@kerfside.example');
    expect((await test.http().post(`/api/mail/${id}/drop`).set(world.people.admin.auth).send({ reason: ' ' })).status).toBe(422);
    const dropped = await test.http().post(`/api/mail/${id}/drop`).set(world.people.admin.auth).send({ reason: 'Wrong address' });
    expect(dropped.status).toBe(200);
    expect(dropped.body).toMatchObject({ state: 'dropped', lastError: 'Dropped: Wrong address' });
    expect((await test.app.get(OutboxSender).sendDue(new Date(Date.now() + 3_600_000))).sent).toBe(0);
    expect(JSON.stringify((await rowOf('a@kerfside.example')).data)).not.toContain('s3cret');
  });

  it('knows no mail that is not there', async () => {
    expect((await test.http().post('/api/mail/999999/retry').set(world.people.admin.auth)).status).toBe(404);
    expect((await test.http().post('/api/mail/x/retry').set(world.people.admin.auth)).status).toBe(404);
    expect((await list('?cursor=nonsense')).status).toBe(422);
  });
});
