import ICAL from 'ical.js';
import { Case } from '../src/cases/entities/case.entity.js';
import { Membership } from '../src/conferences/entities/membership.entity.js';
import { OutboxMail } from '../src/mail/entities/outbox-mail.entity.js';
import { OutboxSender } from '../src/mail/outbox-sender.service.js';
import { Meeting } from '../src/meetings/entities/meeting.entity.js';
import { makeCase } from './factories/case-rows.js';
import { createMeeting, makeListable } from './factories/slots.js';
import { makeWorld, type World } from './factories/world.js';
import { mailsTo, rawOf } from './support/mail.js';
import { queriesOf } from './support/query-count.js';
import { startTestApp, type TestApp } from './support/test-app.js';

const DAY = 86_400_000;

describe('meetings', () => {
  let test: TestApp;
  let world: World;

  const as = (name: keyof World['people']) => world.people[name].auth;
  const get = (id: string, name: keyof World['people'] = 'chair') => test.http().get(`/api/meetings/${id}`).set(as(name));
  const setAgenda = (id: string, baseVersion: number, items: object[], name: keyof World['people'] = 'chair') =>
    test.http().put(`/api/meetings/${id}/agenda`).set(as(name)).send({ baseVersion, items });
  const send = (id: string, baseVersion: number, name: keyof World['people'] = 'chair') =>
    test.http().post(`/api/meetings/${id}/agenda/send`).set(as(name)).send({ baseVersion });
  const post = (path: string, body: object = {}, name: keyof World['people'] = 'chair') => test.http().post(`/api/meetings/${path}`).set(as(name)).send(body);
  const stageOf = async (caseId: string) => (await test.dataSource.manager.findOneByOrFail(Case, { id: caseId })).stage;
  const agendaMails = (meetingId: string) =>
    test.dataSource.manager
      .createQueryBuilder(OutboxMail, 'mail')
      .where('mail.purpose LIKE :purpose', { purpose: `agenda:${meetingId}:%` })
      .orderBy('mail.id')
      .getMany();

  beforeAll(async () => {
    test = await startTestApp();
    world = await makeWorld(test);
    await test.dataSource.manager.update(Membership, { personId: world.people.outsider.id }, { role: 'chair' });
  });
  afterAll(() => test?.close());

  describe('of a conference', () => {
    it('are put in by chair and coordinator, in the future only, one at a time', async () => {
      const startsAt = new Date(Date.now() + 30 * DAY).toISOString();
      const create = (name: keyof World['people'], body: object = { startsAt, minutes: 45 }) =>
        test.http().post(`/api/conferences/${world.conferenceId}/meetings`).set(as(name)).send(body);
      expect((await create('surgeon')).status).toBe(403);
      expect((await create('observer')).status).toBe(403);
      // a chair, but of another conference
      expect((await create('outsider')).status).toBe(404);
      const made = await create('coordinator');
      expect(made.status).toBe(201);
      expect(made.body).toMatchObject({ startsAt, minutes: 45, state: 'planned', items: [], version: 1, timeZone: 'Europe/London', agendaSentAt: null });
      // 48 hours is the conference's own setting
      expect(new Date(made.body.agendaDueAt).getTime()).toBe(new Date(startsAt).getTime() - 2 * DAY);
      expect((await create('chair')).status).toBe(409);
      const past = await create('chair', { startsAt: new Date(Date.now() - 1000).toISOString(), minutes: 45 });
      expect([past.status, past.body.errors[0].field]).toEqual([422, 'startsAt']);
      expect((await create('chair', { startsAt: 'tomorrow', minutes: 45 })).status).toBe(422);
      expect((await create('chair', { startsAt, minutes: 100_000 })).status).toBe(422);
    });

    it('at one time comes in once, however many ask for it at once', async () => {
      const startsAt = new Date(Date.now() + 31 * DAY).toISOString();
      const answers = await Promise.all(
        Array.from({ length: 5 }, () => test.http().post(`/api/conferences/${world.conferenceId}/meetings`).set(as('chair')).send({ startsAt, minutes: 30 })),
      );
      expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409, 409, 409]);
    });

    it('do not exist for others', async () => {
      const { id } = await createMeeting(test, world, 6);
      expect((await get(id, 'outsider')).status).toBe(404);
      expect((await get(id, 'admin')).status).toBe(404);
      expect((await setAgenda(id, 1, [], 'outsider')).status).toBe(404);
      expect((await post(`${id}/start`, {}, 'outsider')).status).toBe(404);
      expect((await post(`${id}/cancel`, { reason: 'x' }, 'outsider')).status).toBe(404);
      expect((await test.http().get(`/api/conferences/${world.conferenceId}/meetings`).set(as('outsider'))).status).toBe(404);
      const listed = (await test.http().get('/api/meetings').set(as('outsider'))).body.items;
      expect(listed.map((item: { id: string }) => item.id)).not.toContain(id);
    });
  });

  describe('in lists', () => {
    let listWorld: World;
    let ids: string[];

    beforeAll(async () => {
      const { manager } = test.dataSource;
      await manager.query("UPDATE conferences SET code = CONCAT('X', LEFT(code, 4))");
      listWorld = await makeWorld(test);
      const at = (days: number) => new Date(Math.floor(Date.now() / 1000) * 1000 + days * DAY);
      const rows = [-9, -2, 1, 2, 3].map((days, index) => ({ conferenceId: listWorld.conferenceId, slotAt: at(days), startsAt: at(days), minutes: 60, state: index === 0 ? ('closed' as const) : ('planned' as const), agendaDueAt: at(days) }));
      ids = (await manager.save(Meeting, rows.map((row) => manager.create(Meeting, row)))).map(({ id }) => id);
    });

    const list = async (query: string) => (await test.http().get(`/api/conferences/${listWorld.conferenceId}/meetings${query}`).set(listWorld.people.observer.auth)).body;

    it('come by time, coming ones first to last and past ones last to first, page by page', async () => {
      const first = await list('?limit=2');
      expect(first.items.map((item: { id: string }) => item.id)).toEqual([ids[2], ids[3]]);
      const second = await list(`?limit=2&cursor=${first.nextCursor}`);
      expect(second.items.map((item: { id: string }) => item.id)).toEqual([ids[4]]);
      expect(second.nextCursor).toBeNull();
      const past = await list('?when=past&limit=1');
      expect(past.items.map((item: { id: string }) => item.id)).toEqual([ids[1]]);
      const older = await list(`?when=past&limit=1&cursor=${past.nextCursor}`);
      expect(older.items.map((item: { id: string }) => item.id)).toEqual([ids[0]]);
    });

    it('refuse what they do not know', async () => {
      const refused = await test.http().get('/api/meetings?when=sometime').set(listWorld.people.observer.auth);
      expect([refused.status, refused.body.errors[0].field]).toEqual([422, 'when']);
      expect((await test.http().get('/api/meetings?cursor=bm9wZQ').set(listWorld.people.observer.auth)).status).toBe(422);
    });
  });

  describe('the agenda', () => {
    it('lists open cases and opens again those that are left out', async () => {
      const [a, b] = [await makeListable(test, world), await makeListable(test, world, 'surgeon2')];
      const meeting = await createMeeting(test, world, 7);
      const set = await setAgenda(meeting.id, 1, [{ caseId: b.id, minutes: 20 }, { caseId: a.id, minutes: 15 }], 'coordinator');
      expect(set.status).toBe(200);
      expect(set.body.items.map((item: { caseId: string; position: number; minutes: number }) => [item.caseId, item.position, item.minutes])).toEqual([
        [b.id, 0, 20],
        [a.id, 1, 15],
      ]);
      expect(set.body).toMatchObject({ version: 2, caseCount: 2, plannedMinutes: 35 });
      expect([await stageOf(a.id), await stageOf(b.id)]).toEqual(['listed', 'listed']);
      const left = await setAgenda(meeting.id, 2, [{ caseId: a.id, minutes: 30 }]);
      expect(left.body.items).toHaveLength(1);
      expect([await stageOf(a.id), await stageOf(b.id)]).toEqual(['listed', 'open']);
      // what does not fit stands below the meeting's end: no error
      expect((await setAgenda(meeting.id, 3, [{ caseId: a.id, minutes: 200 }])).body.plannedMinutes).toBe(200);
    });

    it('is refused on an older version, with what is there now', async () => {
      const found = await makeListable(test, world);
      const meeting = await createMeeting(test, world, 8);
      const answers = await Promise.all([setAgenda(meeting.id, 1, [{ caseId: found.id, minutes: 10 }]), setAgenda(meeting.id, 1, [{ caseId: found.id, minutes: 25 }], 'coordinator')]);
      expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
      const stale = answers.find(({ status }) => status === 409)!.body;
      const won = answers.find(({ status }) => status === 200)!.body;
      expect(stale).toMatchObject({ type: 'urn:kerfside:problem:stale-version', currentVersion: 2 });
      expect(stale.current.items[0].minutes).toBe(won.items[0].minutes);
      expect((await get(meeting.id)).body.items).toHaveLength(1);
    });

    it('changes nothing, and no version, when it is the same', async () => {
      const found = await makeListable(test, world);
      const meeting = await createMeeting(test, world, 9);
      await setAgenda(meeting.id, 1, [{ caseId: found.id, minutes: 10 }]);
      expect((await setAgenda(meeting.id, 2, [{ caseId: found.id, minutes: 10 }])).body.version).toBe(2);
    });

    it('takes only cases that can be listed here', async () => {
      const meeting = await createMeeting(test, world, 10);
      const [draft, unready, elsewhere, ready] = [
        await makeCase(test, world, { stage: 'draft' }),
        await makeCase(test, world),
        await makeListable(test, world, 'surgeon', world.otherConferenceId),
        await makeListable(test, world),
      ];
      for (const caseId of [draft.id, elsewhere.id, '3f0e9c1a-0000-4000-8000-000000000000']) {
        const refused = await setAgenda(meeting.id, 1, [{ caseId: ready.id, minutes: 10 }, { caseId, minutes: 10 }]);
        expect([refused.status, refused.body.errors[0].field, refused.body.errors[0].code]).toEqual([422, 'items[1].caseId', 'unknown-case']);
      }
      const notReady = await setAgenda(meeting.id, 1, [{ caseId: unready.id, minutes: 10 }]);
      expect([notReady.status, notReady.body.errors[0].code]).toEqual([422, 'not-ready']);
      expect((await setAgenda(meeting.id, 1, [{ caseId: ready.id, minutes: 10 }, { caseId: ready.id, minutes: 5 }])).body.errors[0].code).toBe('twice');
      expect((await setAgenda(meeting.id, 1, [{ caseId: ready.id, minutes: 0 }])).status).toBe(422);
      expect((await setAgenda(meeting.id, 1, [{ caseId: ready.id, minutes: 10, colour: 'red' }])).status).toBe(422);
      // nothing of the refused ones was kept
      expect((await get(meeting.id)).body).toMatchObject({ version: 1, items: [] });
      expect(await stageOf(ready.id)).toBe('open');
    });

    it('holds a case on one coming meeting only, also when two ask at once', async () => {
      const found = await makeListable(test, world);
      const [one, two] = [await createMeeting(test, world, 11), await createMeeting(test, world, 12)];
      const answers = await Promise.all([one, two].map(({ id }) => setAgenda(id, 1, [{ caseId: found.id, minutes: 10 }])));
      expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
      const refused = answers.find(({ status }) => status === 409)!.body;
      expect(refused).toMatchObject({ type: 'urn:kerfside:problem:conflict', errors: [{ code: 'listed-elsewhere' }] });
    });

    it('is for chair and coordinator, and until the meeting begins', async () => {
      const meeting = await createMeeting(test, world, 13);
      for (const name of ['surgeon', 'panellist', 'observer'] as const) {
        expect((await setAgenda(meeting.id, 1, [], name)).status).toBe(403);
        expect((await send(meeting.id, 1, name)).status).toBe(403);
      }
      await post(`${meeting.id}/start`);
      const late = await setAgenda(meeting.id, 2, []);
      expect([late.status, late.body.type]).toEqual([409, 'urn:kerfside:problem:wrong-stage']);
    });

    it('offers the open cases with what each lacks, the urgent first', async () => {
      const meeting = await createMeeting(test, world, 14);
      const [ready, unready] = [await makeListable(test, world), await makeCase(test, world)];
      await test.dataSource.manager.update(Case, { id: unready.id }, { urgency: 'urgent' });
      const { items } = (await test.http().get(`/api/meetings/${meeting.id}/listable-cases`).set(as('coordinator'))).body;
      expect(items[0]).toMatchObject({ id: unready.id, canBeListed: false, urgency: 'urgent' });
      expect(items[0].missing.length).toBeGreaterThan(0);
      expect(items.find((item: { id: string }) => item.id === ready.id)).toMatchObject({ canBeListed: true, missing: [], ratings: 0 });
      // two members rate, one of them twice: two have rated
      const ratings = (ready.content.options.options ?? []).map(({ id }, index) => ({ optionId: id, value: index + 4 }));
      for (const name of ['panellist', 'microbiology', 'panellist'] as const)
        expect((await test.http().put(`/api/cases/${ready.id}/rounds/1/rating`).set(as(name)).send({ ratings })).status).toBe(200);
      const set = await setAgenda(meeting.id, 1, [{ caseId: ready.id, minutes: 10 }]);
      expect(set.body.items[0].ratings).toBe(2);
      expect((await test.http().get(`/api/meetings/${meeting.id}/listable-cases`).set(as('surgeon'))).status).toBe(403);
    });
  });

  describe('sending the agenda', () => {
    it('mails every member once, with an invitation for the calendar', async () => {
      const found = await makeListable(test, world);
      const meeting = await createMeeting(test, world, 15);
      await setAgenda(meeting.id, 1, [{ caseId: found.id, minutes: 20 }]);
      const sent = await send(meeting.id, 2);
      // surgeon, surgeon2, panellist, microbiology, chair, coordinator, observer
      expect([sent.status, sent.body.mails]).toEqual([200, 7]);
      expect(sent.body.meeting.actions.sendAgenda).toBe(false);
      const again = await send(meeting.id, 2);
      expect([again.status, again.body.detail]).toEqual([409, 'This agenda was sent already, and nothing has changed since.']);
      expect(await agendaMails(meeting.id)).toHaveLength(7);

      await test.app.get(OutboxSender).sendDue();
      const [mail, ...more] = (await mailsTo(world.people.panellist.email)).filter((caught) => caught.text.includes(meeting.id));
      expect(more).toEqual([]);
      expect(mail!.subject).toMatch(/^Hip revision \w+: agenda for \d{1,2} \w{3} \d{4}$/);
      expect(mail!.text).toContain(found.code);
      expect(mail!.text).not.toContain(found.title);
      expect(mail!.html).not.toContain(found.title);
      expect(mail!.attachments.map(({ contentType }) => contentType)).toContain('application/ics');
      const calendar = new ICAL.Component(ICAL.parse(mail!.ics!));
      const event = calendar.getFirstSubcomponent('vevent')!;
      expect(calendar.getFirstPropertyValue('method')).toBe('REQUEST');
      expect(event.getFirstPropertyValue('uid')).toBe(`meeting-${meeting.id}@kerfside.example`);
      expect(event.getFirstPropertyValue('sequence')).toBe(0);
      expect((event.getFirstPropertyValue('dtstart') as ICAL.Time).toJSDate().toISOString()).toBe(meeting.startsAt);
      expect(String(event.getFirstPropertyValue('attendee')).toLowerCase()).toBe(`mailto:${world.people.panellist.email}`);
    });

    it('once, also when two press the button at once', async () => {
      const meeting = await createMeeting(test, world, 16);
      const answers = await Promise.all([send(meeting.id, 1), send(meeting.id, 1, 'coordinator')]);
      expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
      expect(await agendaMails(meeting.id)).toHaveLength(7);
    });

    it('tells calendars when the meeting moves, with a higher sequence', async () => {
      const meeting = await createMeeting(test, world, 17);
      await send(meeting.id, 1);
      const startsAt = new Date(new Date(meeting.startsAt).getTime() + DAY / 2).toISOString();
      const moved = await test.http().patch(`/api/meetings/${meeting.id}`).set(as('chair')).send({ baseVersion: 1, startsAt, minutes: 50 });
      expect(moved.status).toBe(200);
      expect(moved.body).toMatchObject({ startsAt, minutes: 50, version: 2 });
      const mails = await agendaMails(meeting.id);
      expect(mails.map((mail) => mail.data['sequence'])).toEqual([...Array(7).fill(0), ...Array(7).fill(1)]);
      expect(mails.at(-1)!.data).toMatchObject({ startsAt, minutes: 50 });
      // one that was not sent yet moves quietly
      const quiet = await createMeeting(test, world, 18);
      await test.http().patch(`/api/meetings/${quiet.id}`).set(as('chair')).send({ baseVersion: 1, startsAt: new Date(new Date(quiet.startsAt).getTime() + DAY / 3).toISOString(), minutes: 60 });
      expect(await agendaMails(quiet.id)).toEqual([]);
      const stale = await test.http().patch(`/api/meetings/${meeting.id}`).set(as('chair')).send({ baseVersion: 1, startsAt, minutes: 55 });
      expect([stale.status, stale.body.type]).toEqual([409, 'urn:kerfside:problem:stale-version']);
    });

    it('takes a cancelled meeting out of the calendars and opens its cases again', async () => {
      const found = await makeListable(test, world);
      const meeting = await createMeeting(test, world, 19);
      await setAgenda(meeting.id, 1, [{ caseId: found.id, minutes: 20 }]);
      await send(meeting.id, 2);
      expect((await post(`${meeting.id}/cancel`, { reason: '' })).status).toBe(422);
      const cancelled = await post(`${meeting.id}/cancel`, { reason: 'The room is flooded' }, 'coordinator');
      expect(cancelled.status).toBe(200);
      expect(cancelled.body).toMatchObject({ state: 'cancelled', cancelledReason: 'The room is flooded', caseCount: 0 });
      expect(await stageOf(found.id)).toBe('open');
      await test.app.get(OutboxSender).sendDue();
      const mail = (await mailsTo(world.people.surgeon.email)).find((caught) => caught.text.includes(meeting.id) && caught.subject.includes('cancelled'))!;
      const calendar = new ICAL.Component(ICAL.parse(mail.ics!));
      expect(calendar.getFirstPropertyValue('method')).toBe('CANCEL');
      const event = calendar.getFirstSubcomponent('vevent')!;
      expect(event.getFirstPropertyValue('uid')).toBe(`meeting-${meeting.id}@kerfside.example`);
      expect(event.getFirstPropertyValue('sequence')).toBe(1);
      // RFC 6047, 2.4: the part's parameter says the same as the calendar in it
      expect(await rawOf(mail)).toMatch(/^Content-Type: text\/calendar;[^\n]*(\n\s[^\n]*)*method=CANCEL/im);
      expect(mail.text).not.toContain('flooded');
      expect((await post(`${meeting.id}/cancel`, { reason: 'again' })).status).toBe(409);
      expect((await post(`${meeting.id}/start`)).status).toBe(409);
    });
  });

  describe('the meeting itself', () => {
    it('is started and closed by the chair; what was not reached is open again', async () => {
      const [first, second] = [await makeListable(test, world), await makeListable(test, world, 'surgeon2')];
      const meeting = await createMeeting(test, world, 20);
      const { body: listed } = await setAgenda(meeting.id, 1, [{ caseId: first.id, minutes: 20 }, { caseId: second.id, minutes: 20 }]);
      expect((await post(`${meeting.id}/start`, {}, 'coordinator')).status).toBe(403);
      expect((await post(`${meeting.id}/close`)).status).toBe(409);
      const started = await post(`${meeting.id}/start`);
      expect(started.body).toMatchObject({ state: 'running', actions: { editAgenda: false, sendAgenda: false, run: true, writeAttendance: true } });
      expect(started.body.attendance.find((row: { person: { id: string } }) => row.person.id === world.people.chair.id).state).toBe('present');
      expect((await post(`${meeting.id}/start`)).status).toBe(409);

      const path = `${meeting.id}/items/${listed.items[0].id}/defer`;
      expect((await post(path, { reason: 'CT is missing' }, 'panellist')).status).toBe(403);
      const deferred = await post(path, { reason: 'CT is missing' });
      expect(deferred.body.items[0]).toMatchObject({ state: 'deferred', deferredReason: 'CT is missing' });
      expect(await stageOf(first.id)).toBe('open');
      expect((await post(path, { reason: 'again' })).status).toBe(409);
      expect((await post(`${meeting.id}/items/3f0e9c1a-0000-4000-8000-000000000000/defer`, { reason: 'x' })).status).toBe(404);

      const closed = await post(`${meeting.id}/close`);
      expect(closed.body.state).toBe('closed');
      expect(closed.body.items[1]).toMatchObject({ state: 'deferred', deferredReason: 'The meeting was closed before its turn.' });
      expect(await stageOf(second.id)).toBe('open');
      // both can stand on a later agenda
      const next = await createMeeting(test, world, 21);
      expect((await setAgenda(next.id, 1, [{ caseId: first.id, minutes: 20 }, { caseId: second.id, minutes: 20 }])).status).toBe(200);
    });

    it('is not closed over a decision that is written and not signed', async () => {
      const found = await makeListable(test, world);
      const meeting = await createMeeting(test, world, 25);
      const { body } = await setAgenda(meeting.id, 1, [{ caseId: found.id, minutes: 20 }]);
      await post(`${meeting.id}/start`);
      const draft = { text: 'Remove the shell', dissent: [] };
      const written = await test.http().put(`/api/cases/${found.id}/decision`).set(as('chair')).send(draft);
      expect(written.status).toBe(200);
      const refused = await post(`${meeting.id}/close`);
      expect(refused.status).toBe(409);
      expect(refused.body).toMatchObject({ type: 'urn:kerfside:problem:conflict', codes: [found.code] });
      expect((await get(meeting.id)).body.state).toBe('running');
      await post(`${meeting.id}/items/${body.items[0].id}/defer`, { reason: 'No agreement' });
      expect((await post(`${meeting.id}/close`)).status).toBe(200);
    });

    it('counts attendance and quorum as it is noted', async () => {
      const infected = await makeListable(test, world);
      const meeting = await createMeeting(test, world, 22);
      await test.dataSource.manager.query(
        'UPDATE conferences SET quorumRule = ? WHERE id = ?',
        [JSON.stringify({ raters: 2, disciplines: [{ discipline: 'infection-microbiology', atLeast: 1, infectionOnly: true }] }), world.conferenceId],
      );
      await setAgenda(meeting.id, 1, [{ caseId: infected.id, minutes: 20 }]);
      const note = (person: keyof World['people'], state: string | null, by: keyof World['people'] = 'coordinator') =>
        test.http().put(`/api/meetings/${meeting.id}/attendance/${world.people[person].id}`).set(as(by)).send({ state });
      expect((await note('surgeon', 'present', 'surgeon')).status).toBe(403);
      expect((await note('outsider', 'present')).status).toBe(404);
      expect((await note('surgeon', 'late')).status).toBe(422);
      await note('surgeon', 'present');
      const two = await note('chair', 'remote');
      expect(two.body.quorum).toEqual({ met: false, missing: ['1 more of infection and microbiology'] });
      const three = await note('microbiology', 'present');
      expect(three.body.quorum).toEqual({ met: true, missing: [] });
      expect((await note('microbiology', null)).body.quorum.met).toBe(false);
      expect((await note('microbiology', 'apologies')).body.quorum.met).toBe(false);
      const roles = three.body.attendance.map((row: { role: string }) => row.role).sort();
      expect(roles).toEqual(['chair', 'coordinator', 'observer', 'panellist', 'panellist', 'surgeon', 'surgeon']);
    });

    it('shows a page by the same number of queries with one case or twelve', async () => {
      const cases = [];
      for (let index = 0; index < 12; index++) cases.push(await makeListable(test, world));
      const [small, large] = [await createMeeting(test, world, 23), await createMeeting(test, world, 24)];
      await setAgenda(small.id, 1, [{ caseId: cases[0]!.id, minutes: 5 }]);
      await setAgenda(large.id, 1, cases.slice(1).map(({ id }) => ({ caseId: id, minutes: 5 })));
      const one = await queriesOf(test, () => get(small.id));
      const many = await queriesOf(test, () => get(large.id));
      expect(many.result.body.items).toHaveLength(11);
      expect(many.queries.length).toBe(one.queries.length);
      expect(many.queries.length).toBeLessThanOrEqual(7);
      const list = await queriesOf(test, () => test.http().get('/api/meetings?limit=100').set(as('chair')));
      expect(list.result.body.items.length).toBeGreaterThan(5);
      expect(list.queries.length).toBeLessThanOrEqual(3);
    });
  });
});
