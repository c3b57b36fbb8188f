import { AuditEntry } from '../src/audit/entities/audit-entry.entity.js';
import { OneTimeToken } from '../src/auth/entities/one-time-token.entity.js';
import { SignInFailure } from '../src/auth/entities/sign-in-failure.entity.js';
import { PasswordsService } from '../src/auth/passwords.service.js';
import { makeWorld, PASSWORD, signIn, type World } from './factories/world.js';
import { lastLinkOf, outboxOf } from './support/outbox.js';
import { startTestApp, type TestApp } from './support/test-app.js';

const NEXT = 'eleven plums on a tin tray';

describe('passwords', () => {
  let test: TestApp;
  let world: World;

  beforeAll(async () => {
    test = await startTestApp();
    world = await makeWorld(test);
  });
  afterAll(() => test.close());
  beforeEach(() => test.dataSource.manager.clear(SignInFailure));

  const ask = (email: string) => test.http().post('/api/auth/password-reset').send({ email });
  const confirm = (token: string, password = NEXT) => test.http().post('/api/auth/password-reset/confirm').send({ token, password });
  const tryIn = (email: string, password: string) => test.http().post('/api/auth/sign-in').send({ email, password });

  describe('reset by e-mail', () => {
    it('answers the same for an unknown address, and mails only to known ones', async () => {
      const timed = async (email: string) => {
        const start = performance.now();
        const { status, text } = await ask(email);
        return { status, text, took: performance.now() - start };
      };
      const known = await timed(world.people.surgeon.email);
      const unknown = await timed('nobody.here@kerfside.example');
      expect([known.status, known.text]).toEqual([202, unknown.text]);
      expect(unknown.status).toBe(202);
      // neither comes back before the fixed time that hides the difference
      expect(Math.min(known.took, unknown.took)).toBeGreaterThanOrEqual(145);
      expect(await outboxOf(test, 'nobody.here@kerfside.example')).toEqual([]);
      const [mail] = await outboxOf(test, world.people.surgeon.email);
      expect(Object.keys(mail!.data).sort()).toEqual(['expires', 'name', 'url']);
      expect(String(mail!.data['url'])).toMatch(/^http:\/\/kerfside\.test\/reset-password\/[\w-]{43}$/);
    });

    it('sets a new password once, ends every session and lets in again whoever was locked out', async () => {
      const { email } = world.people.surgeon2;
      await ask(email).expect(202);
      const token = await lastLinkOf(test, email, 'password-reset');
      for (let n = 0; n < 10; n++) await tryIn(email, `guess number ${n}`);
      expect((await tryIn(email, PASSWORD)).status).toBe(429);

      await confirm(token).expect(204);
      await test.http().get('/api/auth/me').set(world.people.surgeon2.auth).expect(401);
      expect((await tryIn(email, PASSWORD)).status).toBe(401);
      expect((await tryIn(email, NEXT)).status).toBe(200);

      const again = await confirm(token, 'another sentence of enough words');
      expect([again.status, again.body.type]).toEqual([410, 'urn:kerfside:problem:gone']);
      expect(again.body.detail).toMatch(/Ask for a new e-mail/);
      expect(await test.dataSource.manager.countBy(AuditEntry, { action: 'auth.password-reset', recordId: world.people.surgeon2.id })).toBe(1);
    });

    it('sets it once only, also where the link is followed twice at once', async () => {
      const { email } = world.people.microbiology;
      await ask(email).expect(202);
      const token = await lastLinkOf(test, email, 'password-reset');
      const answers = await Promise.all(['first of the two sentences', 'second of the two sentences'].map((password) => confirm(token, password)));
      expect(answers.map(({ status }) => status).sort()).toEqual([204, 410]);
    });

    it('works for an hour', async () => {
      const { email, id } = world.people.coordinator;
      await ask(email).expect(202);
      const token = await lastLinkOf(test, email, 'password-reset');
      const { createdAt, expiresAt } = await test.dataSource.manager.findOneByOrFail(OneTimeToken, { personId: id });
      expect(expiresAt.getTime() - createdAt.getTime()).toBe(60 * 60 * 1000);
      await test.dataSource.manager.update(OneTimeToken, { personId: id }, { expiresAt: new Date(Date.now() - 1) });
      await confirm(token).expect(410);
      await test.http().get('/api/auth/me').set(world.people.coordinator.auth).expect(200);
    });

    it('works with the last link only', async () => {
      const { email } = world.people.coordinator;
      await ask(email).expect(202);
      const first = await lastLinkOf(test, email, 'password-reset');
      await ask(email).expect(202);
      await confirm(first).expect(410);
    });

    it('keeps the link where the password was refused', async () => {
      const { email } = world.people.coordinator;
      await ask(email).expect(202);
      const token = await lastLinkOf(test, email, 'password-reset');
      const refused = await confirm(token, 'too short');
      expect([refused.status, refused.body.errors]).toEqual([422, [expect.objectContaining({ field: 'password', code: 'too-short' })]]);
      await confirm(token).expect(204);
    });

    it('takes no invitation for a reset, nor a made-up link', async () => {
      await confirm('A'.repeat(43)).expect(404);
    });

    it('is slowed: the sixth request within an hour is refused, for known and unknown addresses alike', async () => {
      for (const email of [world.people.observer.email, 'nobody.there@kerfside.example']) {
        await Promise.all([1, 2, 3, 4, 5].map(() => ask(email).expect(202)));
        const refused = await ask(email);
        expect([refused.status, refused.body.type]).toEqual([429, 'urn:kerfside:problem:too-many-attempts']);
        expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0);
      }
      // asking for mails does not lock anyone out
      expect((await tryIn(world.people.observer.email, PASSWORD)).status).toBe(200);
    });
  });

  describe('changing one\'s own', () => {
    const change = (auth: object, current: string, next: string) => test.http().post('/api/auth/password').set(auth as Record<string, string>).send({ current, next });

    it('needs the present one, keeps this session and ends the others', async () => {
      const { email, auth } = world.people.panellist;
      const elsewhere = await signIn(test, email);
      const wrong = await change(auth, 'not my password at all', NEXT);
      expect([wrong.status, wrong.body.errors[0].field]).toEqual([422, 'current']);
      const weak = await change(auth, PASSWORD, 'correct horse battery staple');
      expect([weak.status, weak.body.errors[0]]).toEqual([422, expect.objectContaining({ field: 'next', code: 'common' })]);
      await change(auth, PASSWORD, NEXT).expect(204);
      await test.http().get('/api/auth/me').set(auth).expect(200);
      await test.http().get('/api/auth/me').set(elsewhere).expect(401);
      expect((await tryIn(email, PASSWORD)).status).toBe(401);
      expect((await tryIn(email, NEXT)).status).toBe(200);
    });

    it('is slowed like a sign-in, so that an open browser is no place to guess in', async () => {
      for (let n = 0; n < 10; n++) await change(world.people.chair.auth, `guess number ${n}`, NEXT).expect(422);
      await change(world.people.chair.auth, PASSWORD, NEXT).expect(429);
    });
  });

  it('asked again before a signature: right, wrong, nobody, and slowed', async () => {
    const passwords = test.app.get(PasswordsService);
    expect(await passwords.verifyOwn(world.people.chair.id, PASSWORD)).toBe(true);
    expect(await passwords.verifyOwn('00000000-0000-4000-8000-000000000000', PASSWORD)).toBe(false);
    for (let n = 0; n < 10; n++) expect(await passwords.verifyOwn(world.people.chair.id, `guess number ${n}`)).toBe(false);
    await expect(passwords.verifyOwn(world.people.chair.id, PASSWORD)).rejects.toMatchObject({ code: 'too-many-attempts' });
  });
});
