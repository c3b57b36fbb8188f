import { AuditEntry } from '../src/audit/entities/audit-entry.entity.js';
import { RefreshToken } from '../src/auth/entities/refresh-token.entity.js';
import { Session } from '../src/auth/entities/session.entity.js';
import { ExpiredSecretsService } from '../src/auth/expired-secrets.service.js';
import { makeWorld, PASSWORD, signIn, type World } from './factories/world.js';
import { refreshCookieOf } from './support/cookies.js';
import { claimsOf } from './support/forged-token.js';
import { startTestApp, type TestApp } from './support/test-app.js';

describe('sessions', () => {
  let test: TestApp;
  let world: World;

  beforeAll(async () => {
    test = await startTestApp({ KERFSIDE_SECURE_COOKIES: 'true' });
    world = await makeWorld(test);
  });
  afterAll(() => test.close());

  const enter = async (email: string) => {
    const response = await test.http().post('/api/auth/sign-in').set('User-Agent', 'Panel tests 1').send({ email, password: PASSWORD }).expect(200);
    const token = String(response.body.accessToken);
    return { cookie: refreshCookieOf(response), auth: { Authorization: `Bearer ${token}` }, sessionId: String(claimsOf(token)['sid']) };
  };
  const refresh = (cookie: string) => test.http().post('/api/auth/refresh').set('Cookie', cookie);
  const me = (auth: { Authorization: string }) => test.http().get('/api/auth/me').set(auth);
  const typeOf = (response: { body: { type?: string } }) => response.body.type?.split(':').at(-1);

  it('sends the cookie over encrypted connections only where that is set', async () => {
    expect((await enter(world.people.surgeon.email)).cookie.attributes).toContain('secure');
  });

  it('keeps of a refresh token only its SHA-256', async () => {
    const { cookie, sessionId } = await enter(world.people.surgeon.email);
    const rows = await test.dataSource.manager.find(RefreshToken, { where: { sessionId } });
    expect(rows).toHaveLength(1);
    const digest = await crypto.subtle.digest('SHA-256', new TextEncoder().encode(cookie.value));
    expect(rows[0]!.hash).toBe(Buffer.from(digest).toString('hex'));
    // 256 random bits
    expect(Buffer.from(cookie.value, 'base64url')).toHaveLength(32);
  });

  it('renews both tokens for the cookie, within the same session', async () => {
    const first = await enter(world.people.surgeon.email);
    const response = await refresh(first.cookie.header).expect(200);
    expect(refreshCookieOf(response).value).not.toBe(first.cookie.value);
    expect(claimsOf(response.body.accessToken)['sid']).toBe(first.sessionId);
    await me({ Authorization: `Bearer ${response.body.accessToken}` }).expect(200);
  });

  // RFC 9700 (OAuth 2.0 security), 4.14.2: reuse of a rotated refresh token revokes what it belongs to
  it('ends the whole session when a used refresh token comes again, also for whoever has the newer one', async () => {
    const first = await enter(world.people.surgeon.email);
    const second = await refresh(first.cookie.header).expect(200);
    const reused = await refresh(first.cookie.header);
    expect([reused.status, typeOf(reused)]).toEqual([401, 'session-ended']);
    expect(refreshCookieOf(reused).value).toBe('');
    expect((await refresh(refreshCookieOf(second).header)).status).toBe(401);
    expect((await me({ Authorization: `Bearer ${second.body.accessToken}` })).status).toBe(401);
    const entries = await test.dataSource.manager.find(AuditEntry, { where: { action: 'auth.refresh-reuse', recordId: first.sessionId } });
    expect(entries).toHaveLength(1);
  });

  it('gives no two successors to one token, however many ask at once', async () => {
    const { cookie, sessionId } = await enter(world.people.surgeon.email);
    const answers = await Promise.all([1, 2, 3, 4, 5].map(() => refresh(cookie.header)));
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1);
    expect(answers.filter(({ status }) => status === 401)).toHaveLength(4);
    expect(await test.dataSource.manager.findOneBy(Session, { id: sessionId })).toMatchObject({ endedWhy: 'refresh-reuse' });
  });

  it.each([
    ['no cookie', ''],
    ['a made-up one', 'kerfside_refresh=AAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAA'],
    ['one that the parser makes an object of', `kerfside_refresh=${encodeURIComponent('j:{"a":1}')}`],
  ])('refuses %s', async (_, cookie) => {
    const response = await refresh(cookie);
    expect([response.status, typeOf(response)]).toEqual([401, 'session-ended']);
  });

  it('ends at its last day, whatever is renewed', async () => {
    const { cookie, sessionId } = await enter(world.people.surgeon.email);
    await test.dataSource.manager.update(Session, { id: sessionId }, { expiresAt: new Date(Date.now() - 1) });
    expect((await refresh(cookie.header)).status).toBe(401);
  });

  it('is over at once when one signs out', async () => {
    const { cookie, auth } = await enter(world.people.surgeon.email);
    const response = await test.http().post('/api/auth/sign-out').set('Cookie', cookie.header).expect(204);
    expect(refreshCookieOf(response).value).toBe('');
    expect((await me(auth)).status).toBe(401);
    expect((await refresh(cookie.header)).status).toBe(401);
    await test.http().post('/api/auth/sign-out').expect(204);
  });

  it('gives way to the next person who signs in at the same browser', async () => {
    const first = await enter(world.people.surgeon.email);
    await test.http().post('/api/auth/sign-in').set('Cookie', first.cookie.header).send({ email: world.people.chair.email, password: PASSWORD }).expect(200);
    expect((await me(first.auth)).status).toBe(401);
  });

  it('is listed with the others of the person, and ended one by one or all but the present one', async () => {
    const { email } = world.people.observer;
    const [here, there, third] = [await enter(email), await enter(email), await enter(email)];
    const list = async () => (await test.http().get('/api/auth/sessions').set(here.auth).expect(200)).body.items as { id: string; isCurrent: boolean; device: string }[];
    const before = await list();
    expect(before.map(({ id }) => id)).toEqual(expect.arrayContaining([here.sessionId, there.sessionId, third.sessionId]));
    expect(before.filter(({ isCurrent }) => isCurrent)).toMatchObject([{ id: here.sessionId, device: 'Panel tests 1' }]);

    await test.http().delete(`/api/auth/sessions/${there.sessionId}`).set(here.auth).expect(204);
    expect((await me(there.auth)).status).toBe(401);
    await test.http().delete(`/api/auth/sessions/${there.sessionId}`).set(here.auth).expect(404);

    await test.http().delete('/api/auth/sessions').set(here.auth).expect(204);
    expect((await list()).map(({ id }) => id)).toEqual([here.sessionId]);
    expect((await me(third.auth)).status).toBe(401);
  });

  it('of somebody else can not be ended, nor its existence told', async () => {
    const other = await enter(world.people.chair.email);
    const mine = await signIn(test, world.people.surgeon.email);
    await test.http().delete(`/api/auth/sessions/${other.sessionId}`).set(mine).expect(404);
    await me(other.auth).expect(200);
  });

  it('is swept away a month after its end, not before', async () => {
    const { auth, sessionId } = await enter(world.people.panellist.email);
    await test.http().delete(`/api/auth/sessions/${sessionId}`).set(auth).expect(204);
    const day = 24 * 60 * 60 * 1000;
    const sweeper = test.app.get(ExpiredSecretsService);
    await sweeper.sweep(new Date(Date.now() + 29 * day));
    expect(await test.dataSource.manager.existsBy(Session, { id: sessionId })).toBe(true);
    await sweeper.sweep(new Date(Date.now() + 31 * day));
    expect(await test.dataSource.manager.existsBy(Session, { id: sessionId })).toBe(false);
    expect(await test.dataSource.manager.countBy(RefreshToken, { sessionId })).toBe(0);
  });
});
