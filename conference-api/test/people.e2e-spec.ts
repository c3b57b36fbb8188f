import { AuditEntry } from '../src/audit/entities/audit-entry.entity.js';
import { OneTimeToken } from '../src/auth/entities/one-time-token.entity.js';
import { Person } from '../src/people/entities/person.entity.js';
import { makeWorld, PASSWORD, signIn, type World } from './factories/world.js';
import { refreshCookieOf } from './support/cookies.js';
import { lastLinkOf, outboxOf } from './support/outbox.js';
import { startTestApp, type TestApp } from './support/test-app.js';

describe('people', () => {
  let test: TestApp;
  let world: World;
  let count = 0;

  beforeAll(async () => {
    test = await startTestApp();
    world = await makeWorld(test);
  });
  afterAll(() => test.close());

  const admin = () => world.people.admin.auth;
  const invitation = (change: object = {}) => ({
    email: `newcomer${++count}@kerfside.example`,
    name: 'Ines Marl',
    discipline: 'pharmacy',
    unitId: world.unitId,
    memberships: [{ conferenceId: world.conferenceId, role: 'panellist' }],
    ...change,
  });
  const invite = (body: object) => test.http().post('/api/people/invitations').set(admin()).send(body);
  const accept = (token: string, password = 'eleven plums on a tin tray') =>
    test.http().post(`/api/auth/invitations/${token}/accept`).send({ name: 'Inès Marl', password });

  describe('invitation', () => {
    it('goes by mail, is accepted with name and password, and signs in', async () => {
      const body = invitation({ email: '  Ines.Marl@Kerfside.example '.trim() });
      const { body: person } = await invite(body).expect(201);
      expect(person).toMatchObject({ email: 'ines.marl@kerfside.example', hasAccepted: false, isActive: true, isAdministrator: false, memberships: [{ role: 'panellist' }] });
      const [mail] = await outboxOf(test, 'ines.marl@kerfside.example');
      expect(Object.keys(mail!.data).sort()).toEqual(['conferences', 'expires', 'name', 'unit', 'url']);
      const token = await lastLinkOf(test, 'ines.marl@kerfside.example', 'invitation');
      const { expiresAt, createdAt } = await test.dataSource.manager.findOneByOrFail(OneTimeToken, { personId: person.id });
      expect(expiresAt.getTime() - createdAt.getTime()).toBe(7 * 24 * 60 * 60 * 1000);

      const { body: shown } = await test.http().get(`/api/auth/invitations/${token}`).expect(200);
      expect(shown).toMatchObject({ email: 'ines.marl@kerfside.example', name: 'Ines Marl', conferences: [expect.stringMatching(/^Hip revision/)] });

      const accepted = await accept(token).expect(200);
      expect(refreshCookieOf(accepted).value).not.toBe('');
      const { body: me } = await test.http().get('/api/auth/me').set('Authorization', `Bearer ${accepted.body.accessToken}`).expect(200);
      expect(me).toMatchObject({ name: 'Inès Marl', memberships: [{ conferenceId: world.conferenceId, role: 'panellist' }] });

      for (const again of [await accept(token), await test.http().get(`/api/auth/invitations/${token}`)])
        expect([again.status, again.body.type, again.body.detail]).toEqual([410, 'urn:kerfside:problem:gone', expect.stringMatching(/sign in/i)]);
      await test.http().post(`/api/people/${person.id}/invitation`).set(admin()).expect(409);
    });

    it('is accepted once, also where it is sent twice at once', async () => {
      const body = invitation();
      await invite(body).expect(201);
      const token = await lastLinkOf(test, body.email, 'invitation');
      const answers = await Promise.all([accept(token), accept(token), accept(token)]);
      expect(answers.map(({ status }) => status).sort()).toEqual([200, 410, 410]);
    });

    it('sent again makes the one before worthless', async () => {
      const body = invitation();
      const { body: person } = await invite(body).expect(201);
      const first = await lastLinkOf(test, body.email, 'invitation');
      await test.http().post(`/api/people/${person.id}/invitation`).set(admin()).expect(204);
      await accept(first).expect(410);
      await accept(await lastLinkOf(test, body.email, 'invitation')).expect(200);
    });

    it('no longer works after its week, nor for a person put out, and an unknown one is told apart', async () => {
      const body = invitation();
      const { body: person } = await invite(body).expect(201);
      const token = await lastLinkOf(test, body.email, 'invitation');
      await test.dataSource.manager.update(OneTimeToken, { personId: person.id }, { expiresAt: new Date(Date.now() - 1) });
      const late = await accept(token).expect(410);
      expect(late.body.detail).toMatch(/Ask the administrator for a new invitation/);
      await accept('A'.repeat(43)).expect(404);

      const other = invitation();
      const { body: outPerson } = await invite(other).expect(201);
      await test.http().patch(`/api/people/${outPerson.id}`).set(admin()).send({ isActive: false }).expect(200);
      await accept(await lastLinkOf(test, other.email, 'invitation')).expect(410);
    });

    it('wants a good password, and stays open until it gets one', async () => {
      const body = invitation();
      await invite(body).expect(201);
      const token = await lastLinkOf(test, body.email, 'invitation');
      const refused = await accept(token, 'Inès Marl Inès Marl').expect(422);
      expect(refused.body.errors).toMatchObject([{ field: 'password', code: 'personal' }]);
      await accept(token).expect(200);
    });

    it.each<[string, object, string[]]>([
      ['an address that is taken', { email: 'TAKEN@kerfside.example' }, ['email']],
      ['no address', { email: 'nobody' }, ['email']],
      ['a unit that is not there', { unitId: '00000000-0000-4000-8000-000000000000' }, ['unitId']],
      ['a conference that is not there', { memberships: [{ conferenceId: '00000000-0000-4000-8000-000000000000', role: 'chair' }] }, ['memberships[0].conferenceId']],
      ['a role that is not one', { memberships: [{ conferenceId: '00000000-0000-4000-8000-000000000000', role: 'king' }] }, ['memberships[0].role']],
      ['a field that is not asked for', { isAdministrator: true }, ['isAdministrator']],
      ['a name of spaces', { name: '   ' }, ['name']],
    ])('refuses %s by field, and leaves nothing behind', async (_, change, fields) => {
      if (!(await test.dataSource.manager.existsBy(Person, { email: 'taken@kerfside.example' }))) await invite(invitation({ email: 'taken@kerfside.example' })).expect(201);
      const before = await test.dataSource.manager.count(Person);
      const response = await invite(invitation(change));
      expect([response.status, response.body.errors.map(({ field }: { field: string }) => field)]).toEqual([422, fields]);
      expect(await test.dataSource.manager.count(Person)).toBe(before);
    });

    it('makes one person where two administrators invite the same at once', async () => {
      const body = invitation();
      const answers = await Promise.all([invite(body), invite(body), invite(body)]);
      expect(answers.map(({ status }) => status).sort()).toEqual([201, 422, 422]);
      expect(await outboxOf(test, body.email)).toHaveLength(1);
    });
  });

  describe('list', () => {
    const list = (query: string) => test.http().get(`/api/people?${query}`).set(admin());

    it('pages through everybody once, in the order of names', async () => {
      const seen: { id: string; name: string }[] = [];
      for (let cursor: string | null = ''; cursor !== null; ) {
        const { body }: { body: { items: typeof seen; nextCursor: string | null } } = await list(`limit=3${cursor ? `&cursor=${cursor}` : ''}`).expect(200);
        expect(body.items.length).toBeLessThanOrEqual(3);
        seen.push(...body.items);
        cursor = body.nextCursor;
      }
      expect(new Set(seen.map(({ id }) => id)).size).toBe(seen.length);
      expect(seen.length).toBe(await test.dataSource.manager.count(Person));
      expect(seen.map(({ name }) => name)).toEqual(seen.map(({ name }) => name).sort((a, b) => a.localeCompare(b, 'en', { sensitivity: 'base' })));
    });

    it('finds by part of name or address, taking % and _ as they are', async () => {
      expect((await list('query=chair.').expect(200)).body.items).toMatchObject([{ id: world.people.chair.id }]);
      expect((await list('query=Observer%20Pers').expect(200)).body.items).toMatchObject([{ id: world.people.observer.id }]);
      expect((await list('query=%25').expect(200)).body.items).toEqual([]);
      expect((await list('query=_').expect(200)).body.items).toEqual([]);
    });

    it('refuses a cursor of its own making by field', async () => {
      const response = await list('cursor=abc').expect(422);
      expect(response.body.errors[0].field).toBe('cursor');
    });

    it('shows no hash', async () => {
      expect((await list('limit=100')).text).not.toContain('argon2');
    });
  });

  describe('change', () => {
    const change = (id: string, body: object, auth = admin()) => test.http().patch(`/api/people/${id}`).set(auth).send(body);

    it('writes what was sent, and says on the trail which fields', async () => {
      const { id } = world.people.observer;
      const { body } = await change(id, { name: ' Orla Fenn ', discipline: 'physiotherapy' }).expect(200);
      expect(body).toMatchObject({ name: 'Orla Fenn', discipline: 'physiotherapy', unitId: expect.any(String) });
      const [entry] = await test.dataSource.manager.find(AuditEntry, { where: { action: 'person.update', recordId: id } });
      expect(entry).toMatchObject({ personId: world.people.admin.id, details: { fields: ['name', 'discipline'] } });
    });

    it.each([
      [{ name: null }, 'name'],
      [{ name: '  ' }, 'name'],
      [{ unitId: '00000000-0000-4000-8000-000000000000' }, 'unitId'],
      [{ isActive: 'no' }, 'isActive'],
      [{ email: 'x@kerfside.example' }, 'email'],
    ])('refuses %j', async (body, field) => {
      const response = await change(world.people.observer.id, body).expect(422);
      expect(response.body.errors[0].field).toBe(field);
    });

    it('shuts out at once who is put out, and lets in again', async () => {
      const { id, email } = world.people.surgeon2;
      const auth = await signIn(test, email);
      await change(id, { isActive: false }).expect(200);
      await test.http().get('/api/auth/me').set(auth).expect(401);
      expect((await test.http().post('/api/auth/sign-in').send({ email, password: PASSWORD })).status).toBe(401);
      await change(id, { isActive: true }).expect(200);
      await test.http().get('/api/auth/me').set(auth).expect(401);
      await signIn(test, email);
    });

    it('never leaves the site without an administrator', async () => {
      const { id } = world.people.admin;
      for (const body of [{ isActive: false }, { isAdministrator: false }]) {
        const response = await change(id, body);
        expect([response.status, response.body.type]).toEqual([409, 'urn:kerfside:problem:conflict']);
      }
      // one who has not accepted yet could not take over
      const { body: invited } = await invite(invitation()).expect(201);
      await change(invited.id, { isAdministrator: true }).expect(200);
      await change(id, { isAdministrator: false }).expect(409);
    });

    it('keeps one of two administrators who put each other out at once', async () => {
      await change(world.people.chair.id, { isAdministrator: true }).expect(200);
      const answers = await Promise.all([
        change(world.people.chair.id, { isAdministrator: false }, world.people.admin.auth),
        change(world.people.admin.id, { isAdministrator: false }, world.people.chair.auth),
      ]);
      expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
      await test.dataSource.manager.update(Person, { id: world.people.admin.id }, { isAdministrator: true });
      await test.dataSource.manager.update(Person, { id: world.people.chair.id }, { isAdministrator: false });
    });

    it('knows who is not there', async () => {
      await change('00000000-0000-4000-8000-000000000000', { name: 'X' }).expect(404);
      await test.http().get('/api/people/00000000-0000-4000-8000-000000000000').set(admin()).expect(404);
    });
  });

  describe('units', () => {
    it('are made and changed by the administrator, and seen by everyone', async () => {
      const { body: unit } = await test.http().post('/api/units').set(admin()).send({ name: 'Quarry Bank' }).expect(201);
      await test.http().post('/api/units').set(admin()).send({ name: 'Quarry Bank' }).expect(422);
      const { body: changed } = await test.http().patch(`/api/units/${unit.id}`).set(admin()).send({ name: 'Quarry Bank', contactEmail: 'hips@kerfside.example' }).expect(200);
      expect(changed).toEqual({ id: unit.id, name: 'Quarry Bank', contactEmail: 'hips@kerfside.example' });
      const { body: list } = await test.http().get('/api/units').set(world.people.observer.auth).expect(200);
      expect(list.items).toContainEqual(changed);
      await test.http().patch('/api/units/00000000-0000-4000-8000-000000000000').set(admin()).send({ name: 'X' }).expect(404);
    });
  });
});
