import { AuditEntry } from '../src/audit/entities/audit-entry.entity.js';
import { LiveEvent } from '../src/events/entities/live-event.entity.js';
import { makeWorld, type World, type WorldPerson } from './factories/world.js';
import { startTestApp, type TestApp } from './support/test-app.js';

const NOBODY = '00000000-0000-4000-8000-000000000000';

describe('conferences', () => {
  let test: TestApp;
  let world: World;

  beforeAll(async () => {
    test = await startTestApp();
    world = await makeWorld(test);
  });
  afterAll(() => test.close());

  const as = (who: WorldPerson) => world.people[who].auth;
  const get = (path: string, who: WorldPerson) => test.http().get(`/api/conferences${path}`).set(as(who));
  const patch = (who: WorldPerson, body: object, id = world.conferenceId) => test.http().patch(`/api/conferences/${id}`).set(as(who)).send(body);
  const versionNow = async () => Number((await get(`/${world.conferenceId}`, 'admin')).body.version);

  it('are listed to their members, and all to an administrator', async () => {
    const ids = async (who: WorldPerson) => (await get('', who).expect(200)).body.items.map(({ id }: { id: string }) => id).sort();
    expect(await ids('observer')).toEqual([world.conferenceId]);
    expect(await ids('outsider')).toEqual([world.otherConferenceId]);
    expect(await ids('admin')).toEqual([world.conferenceId, world.otherConferenceId].sort());
  });

  it.each<[WorldPerson, string | null, boolean]>([
    ['surgeon', 'surgeon', false],
    ['chair', 'chair', true],
    ['coordinator', 'coordinator', false],
    ['admin', null, true],
  ])('tell the %s the own role and whether the settings are theirs', async (who, myRole, maySetUp) => {
    expect((await get(`/${world.conferenceId}`, who).expect(200)).body).toMatchObject({ myRole, maySetUp, timeZone: 'Europe/London' });
  });

  it('do not exist for a stranger', async () => {
    const real = await get(`/${world.conferenceId}`, 'outsider');
    const unreal = await get(`/${NOBODY}`, 'outsider');
    expect([real.status, real.body]).toEqual([404, unreal.body]);
    await get(`/${world.conferenceId}/members`, 'outsider').expect(404);
    await patch('outsider', { baseVersion: 1, slotMinutes: 30 }).expect(404);
    await get(`/${NOBODY}`, 'admin').expect(404);
    await get(`/${NOBODY}/members`, 'admin').expect(404);
  });

  describe('made by an administrator', () => {
    const create = (body: object, who: WorldPerson = 'admin') => test.http().post('/api/conferences').set(as(who)).send(body);

    it('need no more than name and code', async () => {
      const { body } = await create({ name: 'Shoulder revision', code: 'SHO' }).expect(201);
      expect(body).toMatchObject({ name: 'Shoulder revision', code: 'SHO', slotRule: 'FREQ=WEEKLY', slotMinutes: 60, consensusRule: 'rand', namesShown: 'nobody', version: 1 });
      expect((await get(`/${body.id}`, 'admin').expect(200)).body).toEqual(body);
    });

    it('refuse a name or code that is taken', async () => {
      await create({ name: 'Elbow revision', code: 'ELB' }).expect(201);
      expect((await create({ name: 'Elbow revision', code: 'ELBO' }).expect(422)).body.errors).toMatchObject([{ field: 'name', code: 'taken' }]);
      expect((await create({ name: 'Elbow revision two', code: 'ELB' }).expect(422)).body.errors).toMatchObject([{ field: 'code', code: 'taken' }]);
    });

    it('and by nobody else', async () => {
      await create({ name: 'Wrist revision', code: 'WRI' }, 'chair').expect(403);
    });
  });

  describe('settings', () => {
    it('are the chair\'s and the administrator\'s', async () => {
      await patch('chair', { baseVersion: await versionNow(), slotMinutes: 45 }).expect(200);
      await patch('admin', { baseVersion: await versionNow(), slotMinutes: 50 }).expect(200);
      for (const who of ['surgeon', 'panellist', 'coordinator', 'observer'] as const) await patch(who, { baseVersion: await versionNow(), slotMinutes: 99 }).expect(403);
      expect((await get(`/${world.conferenceId}`, 'chair')).body.slotMinutes).toBe(50);
    });

    it('but the name only the administrator\'s', async () => {
      const { body } = await get(`/${world.conferenceId}`, 'chair');
      await patch('chair', { baseVersion: body.version, name: 'Renamed' }).expect(403);
      await patch('chair', { baseVersion: body.version, name: body.name, slotMinutes: 55 }).expect(200);
      const { body: renamed } = await patch('admin', { baseVersion: await versionNow(), name: 'Hip and cup revision' }).expect(200);
      expect(renamed.name).toBe('Hip and cup revision');
    });

    it('are refused on an older version, with what is there now', async () => {
      const baseVersion = await versionNow();
      const { body: first } = await patch('chair', { baseVersion, agendaHoursBefore: 24 }).expect(200);
      const late = await patch('admin', { baseVersion, agendaHoursBefore: 72 });
      expect([late.status, late.body.type]).toEqual([409, 'urn:kerfside:problem:stale-version']);
      expect(late.body.current).toMatchObject({ version: first.version, agendaHoursBefore: 24 });
    });

    it('are taken from one of two who save at once', async () => {
      const baseVersion = await versionNow();
      const answers = await Promise.all([20, 30, 40].map((slotMinutes) => patch('chair', { baseVersion, slotMinutes })));
      expect(answers.map(({ status }) => status).sort()).toEqual([200, 409, 409]);
      const saved = answers.find(({ status }) => status === 200)!.body;
      expect((await get(`/${world.conferenceId}`, 'chair')).body).toMatchObject({ slotMinutes: saved.slotMinutes, version: baseVersion + 1 });
    });

    it.each([
      [{ timeZone: 'Europe/Nowhere' }, 'timeZone'],
      [{ slotStart: '2026-02-30T07:30' }, 'slotStart'],
      [{ slotRule: 'each Wednesday' }, 'slotRule'],
      [{ slotRule: 'FREQ=WEEKLY;UNTIL=20200101T000000Z' }, 'slotRule'],
      [{ slotMinutes: null }, 'slotMinutes'],
      [{ slotMinutes: 2 }, 'slotMinutes'],
      [{ quorumRule: { raters: 0, disciplines: [] } }, 'quorumRule.raters'],
      [{ quorumRule: { raters: 3, disciplines: [{ discipline: 'alchemy', atLeast: 1 }] } }, 'quorumRule.disciplines[0].discipline'],
      [{ consensusRule: 'loudest' }, 'consensusRule'],
      [{ code: 'ABC' }, 'code'],
    ])('refuse %j by field', async (body, field) => {
      const response = await patch('chair', { baseVersion: await versionNow(), ...body }).expect(422);
      expect(response.body.errors.map((error: { field: string }) => error.field)).toEqual([field]);
    });

    it('name on the trail the fields that changed', async () => {
      const quorumRule = { raters: 3, disciplines: [{ discipline: 'anaesthesia', atLeast: 1 }] };
      const { body } = await patch('chair', { baseVersion: await versionNow(), quorumRule, namesShown: 'nobody' }).expect(200);
      expect(body.quorumRule).toEqual(quorumRule);
      const entries = await test.dataSource.manager.find(AuditEntry, { where: { action: 'conference.update' }, order: { id: 'DESC' }, take: 1 });
      expect(entries).toMatchObject([{ personId: world.people.chair.id, conferenceId: world.conferenceId, details: { fields: ['quorumRule'] } }]);
    });
  });

  describe('members', () => {
    const set = (personId: string, role: string, who: WorldPerson = 'admin') => test.http().put(`/api/conferences/${world.otherConferenceId}/members/${personId}`).set(as(who)).send({ role });
    const remove = (personId: string) => test.http().delete(`/api/conferences/${world.otherConferenceId}/members/${personId}`).set(as('admin'));

    it('are seen by members and administrators, with unit and discipline', async () => {
      for (const who of ['observer', 'admin'] as const) {
        const { body } = await get(`/${world.conferenceId}/members`, who).expect(200);
        expect(body.items).toHaveLength(7);
        expect(body.items).toContainEqual({
          person: { id: world.people.chair.id, name: 'Chair Person', discipline: 'revision-surgery', unit: expect.any(String) },
          role: 'chair',
        });
      }
    });

    it('come and go with access at once, told to that person\'s pages only', async () => {
      const { id } = world.people.panellist;
      await get(`/${world.otherConferenceId}`, 'panellist').expect(404);
      await set(id, 'observer').expect(204);
      expect((await get(`/${world.otherConferenceId}`, 'panellist').expect(200)).body.myRole).toBe('observer');
      await set(id, 'chair').expect(204);
      expect((await get(`/${world.otherConferenceId}`, 'panellist').expect(200)).body.maySetUp).toBe(true);
      await set(id, 'chair').expect(204);
      await remove(id).expect(204);
      await get(`/${world.otherConferenceId}`, 'panellist').expect(404);
      await get(`/${world.conferenceId}`, 'panellist').expect(200);
      await remove(id).expect(404);
      const where = { personId: id, kind: 'membership-changed' } as const;
      expect(await test.dataSource.manager.countBy(LiveEvent, where)).toBe(3);
      const entries = await test.dataSource.manager.find(AuditEntry, { where: { recordId: id, conferenceId: world.otherConferenceId }, order: { id: 'ASC' } });
      expect(entries.map(({ action, details }) => [action, details])).toEqual([
        ['membership.set', { role: 'observer', before: null }],
        ['membership.set', { role: 'chair', before: 'observer' }],
        ['membership.remove', { before: 'chair' }],
      ]);
    });

    it('are set by administrators only, for people and roles that are there', async () => {
      await set(world.people.panellist.id, 'observer', 'chair').expect(403);
      await set(NOBODY, 'observer').expect(404);
      await set(world.people.panellist.id, 'king').expect(422);
      await test.http().put(`/api/conferences/${NOBODY}/members/${world.people.panellist.id}`).set(as('admin')).send({ role: 'chair' }).expect(404);
    });

    it('get one role each where two set it at once', async () => {
      const answers = await Promise.all(['observer', 'panellist', 'surgeon', 'chair'].map((role) => set(world.people.observer.id, role)));
      expect(answers.map(({ status }) => status)).toEqual([204, 204, 204, 204]);
      const { body } = await get(`/${world.otherConferenceId}/members`, 'admin');
      expect(body.items.filter(({ person }: { person: { id: string } }) => person.id === world.people.observer.id)).toHaveLength(1);
    });
  });
});
