import { OutboxMail } from '../src/mail/entities/outbox-mail.entity.js';
import { AgendaDueService } from '../src/meetings/agenda-due.service.js';
import { Meeting } from '../src/meetings/entities/meeting.entity.js';
import { SlotMeetingsService } from '../src/meetings/slot-meetings.service.js';
import { makeMeeting } from './factories/case-rows.js';
import { createMeeting, makeListable, setSlot } from './factories/slots.js';
import { makeWorld, type World } from './factories/world.js';
import { makeDatabase, startTestApp, type TestApp } from './support/test-app.js';

const HOUR = 3_600_000;

describe('what the server does by itself for meetings', () => {
  let database: Awaited<ReturnType<typeof makeDatabase>>;
  let test: TestApp;
  let other: TestApp;
  let world: World;

  const meetings = () => test.dataSource.manager.find(Meeting, { where: { conferenceId: world.conferenceId }, order: { startsAt: 'ASC' } });
  const starts = async () => (await meetings()).map(({ startsAt }) => startsAt.toISOString());
  const makeAhead = (now: string, app = test) => app.app.get(SlotMeetingsService).makeAhead(new Date(now));
  const sendDue = (now: Date, app = test) => app.app.get(AgendaDueService).sendDue(now);
  const mailsOf = (meetingId: string) => test.dataSource.manager.createQueryBuilder(OutboxMail, 'mail').where('mail.purpose LIKE :of', { of: `agenda:${meetingId}:%` }).getMany();

  beforeAll(async () => {
    database = await makeDatabase();
    test = await startTestApp({}, database.url);
    await test.dataSource.runMigrations({ transaction: 'none' });
    other = await startTestApp({}, database.url);
    world = await makeWorld(test);
  });
  afterAll(async () => {
    await test?.close();
    await other?.close();
    await database?.drop();
  });
  beforeEach(async () => {
    await test.dataSource.query('DELETE FROM agenda_items');
    await test.dataSource.query('DELETE FROM meetings');
    await test.dataSource.query('DELETE FROM outbox_mails');
    await setSlot(test, world.conferenceId, { timeZone: 'Europe/London', slotStart: '2026-01-07T07:30', slotRule: 'FREQ=WEEKLY;BYDAY=WE', slotMinutes: 60, agendaHoursBefore: 48 });
  });

  describe('the slot', () => {
    it('has its next eight meetings made, at the same time by the clock over both changes (tz database; Python’s zoneinfo agrees)', async () => {
      await makeAhead('2026-03-11T12:00:00Z');
      expect(await starts()).toEqual([
        '2026-03-18T07:30:00.000Z',
        '2026-03-25T07:30:00.000Z',
        '2026-04-01T06:30:00.000Z',
        '2026-04-08T06:30:00.000Z',
        '2026-04-15T06:30:00.000Z',
        '2026-04-22T06:30:00.000Z',
        '2026-04-29T06:30:00.000Z',
        '2026-05-06T06:30:00.000Z',
      ]);
      const [first] = await meetings();
      expect(first).toMatchObject({ minutes: 60, state: 'planned', ofSlot: true });
      expect(first!.agendaDueAt.toISOString()).toBe('2026-03-16T07:30:00.000Z');
    });

    it('is right in other zones', async () => {
      // Python's zoneinfo: Paris goes back on 25 Oct 2026, Sydney's UTC date is the day before
      await setSlot(test, world.conferenceId, { timeZone: 'Europe/Paris', slotStart: '2026-10-15T08:00', slotRule: 'FREQ=WEEKLY' });
      await makeAhead('2026-10-14T12:00:00Z');
      expect((await starts()).slice(0, 4)).toEqual(['2026-10-15T06:00:00.000Z', '2026-10-22T06:00:00.000Z', '2026-10-29T07:00:00.000Z', '2026-11-05T07:00:00.000Z']);
      await test.dataSource.query('DELETE FROM meetings');
      await setSlot(test, world.conferenceId, { timeZone: 'Australia/Sydney', slotStart: '2026-03-30T07:30', slotRule: 'FREQ=WEEKLY;BYDAY=MO' });
      await makeAhead('2026-03-29T12:00:00Z');
      expect((await starts()).slice(0, 3)).toEqual(['2026-03-29T20:30:00.000Z', '2026-04-05T21:30:00.000Z', '2026-04-12T21:30:00.000Z']);
    });

    it('is made once, however often and by however many processes', async () => {
      await Promise.all([makeAhead('2026-03-11T12:00:00Z'), makeAhead('2026-03-11T12:00:00Z', other), makeAhead('2026-03-11T12:00:00Z')]);
      const before = (await meetings()).map(({ id }) => id);
      await makeAhead('2026-03-11T12:05:00Z', other);
      expect(before).toHaveLength(8);
      expect((await meetings()).map(({ id }) => id)).toEqual(before);
      await makeAhead('2026-03-18T12:00:00Z');
      expect((await starts()).at(-1)).toBe('2026-05-13T06:30:00.000Z');
      expect(await meetings()).toHaveLength(9);
    });

    it('does not make again what was moved or cancelled', async () => {
      await makeAhead('2026-03-11T12:00:00Z');
      const [first, second] = await meetings();
      await test.dataSource.manager.update(Meeting, { id: first!.id }, { startsAt: new Date('2026-03-19T10:00:00Z') });
      await test.dataSource.manager.update(Meeting, { id: second!.id }, { state: 'cancelled' });
      await makeAhead('2026-03-11T12:00:00Z');
      expect(await meetings()).toHaveLength(8);
      expect(await starts()).not.toContain('2026-03-18T07:30:00.000Z');
    });

    it('follows a change of the rule, and leaves meetings with cases to a person', async () => {
      await makeAhead('2026-03-11T12:00:00Z');
      const [first] = await meetings();
      const found = await makeListable(test, world);
      await test.dataSource.query("INSERT INTO agenda_items (id, meetingId, caseId, position, minutes) VALUES (UUID(), ?, ?, 0, 10)", [first!.id, found.id]);
      await setSlot(test, world.conferenceId, { slotStart: '2026-03-12T17:00', slotRule: 'FREQ=WEEKLY' });
      await makeAhead('2026-03-11T12:00:00Z');
      const now = await starts();
      // 18 March has a case and stays; the Wednesdays up to the last new date are gone
      expect(now).toContain('2026-03-18T07:30:00.000Z');
      expect(now).not.toContain('2026-03-25T07:30:00.000Z');
      expect(now.filter((at) => at.endsWith('T17:00:00.000Z') || at.endsWith('T16:00:00.000Z'))).toHaveLength(8);
    });

    it('follows a change of when the agenda is due', async () => {
      await makeAhead('2026-03-11T12:00:00Z');
      await setSlot(test, world.conferenceId, { agendaHoursBefore: 24 });
      await makeAhead('2026-03-11T12:00:00Z');
      expect((await meetings())[0]!.agendaDueAt.toISOString()).toBe('2026-03-17T07:30:00.000Z');
    });

    it('of one conference with a rule that gives nothing does not stop the others', async () => {
      await setSlot(test, world.otherConferenceId, { slotRule: 'FREQ=WEEKLY;UNTIL=20260101T000000Z' });
      await makeAhead('2026-03-11T12:00:00Z');
      expect(await meetings()).toHaveLength(8);
      expect(await test.dataSource.manager.countBy(Meeting, { conferenceId: world.otherConferenceId })).toBe(0);
    });
  });

  describe('the agenda', () => {
    const dueMeeting = async (startsInHours = 40) => {
      const meeting = await makeMeeting(test, world, { state: 'planned', startsAt: new Date(Date.now() + startsInHours * HOUR) });
      await test.dataSource.manager.update(Meeting, { id: meeting.id }, { agendaDueAt: new Date(meeting.startsAt.getTime() - 48 * HOUR) });
      return test.dataSource.manager.findOneByOrFail(Meeting, { id: meeting.id });
    };

    it('goes out by itself at the set time, not before, and once', async () => {
      const meeting = await dueMeeting(72);
      expect(await sendDue(new Date(meeting.agendaDueAt.getTime() - 1000))).toBe(0);
      const at = new Date(meeting.agendaDueAt.getTime() + 1000);
      expect(await sendDue(at)).toBe(1);
      expect(await sendDue(at)).toBe(0);
      const mails = await mailsOf(meeting.id);
      expect(mails).toHaveLength(7);
      // no cases: it says so instead of being silent
      expect(mails[0]!.data).toMatchObject({ items: [], sequence: 0, minutes: 60 });
      expect(await test.dataSource.manager.findOneByOrFail(Meeting, { id: meeting.id })).toMatchObject({ agendaSendings: 1, agendaSentVersion: meeting.version });
    });

    it('goes out once with two processes at work', async () => {
      const due = [await dueMeeting(), await dueMeeting(41), await dueMeeting(42)];
      const counts = await Promise.all([sendDue(new Date()), sendDue(new Date(), other), sendDue(new Date()), sendDue(new Date(), other)]);
      expect(counts.reduce((sum, count) => sum + count)).toBe(3);
      for (const { id } of due) expect(await mailsOf(id)).toHaveLength(7);
    });

    it('that was sent early goes out again at the set time only where it has changed', async () => {
      const meeting = await createMeeting(test, world, 5);
      const send = (baseVersion: number) => test.http().post(`/api/meetings/${meeting.id}/agenda/send`).set(world.people.chair.auth).send({ baseVersion });
      expect((await send(1)).status).toBe(200);
      const atDue = new Date(new Date(meeting.agendaDueAt).getTime() + 1000);
      expect(await sendDue(atDue)).toBe(0);
      const found = await makeListable(test, world);
      await test.http().put(`/api/meetings/${meeting.id}/agenda`).set(world.people.chair.auth).send({ baseVersion: 1, items: [{ caseId: found.id, minutes: 20 }] });
      expect(await sendDue(atDue)).toBe(1);
      const mails = await mailsOf(meeting.id);
      expect(mails).toHaveLength(14);
      expect(mails.at(-1)!.data).toMatchObject({ sequence: 1, items: [{ code: found.code, minutes: 20, presenter: 'Surgeon Person' }] });
    });

    it('is not sent for a meeting that is over, cancelled or running', async () => {
      const [over, cancelled, running] = [await dueMeeting(-1), await dueMeeting(), await dueMeeting(43)];
      await test.dataSource.manager.update(Meeting, { id: cancelled.id }, { state: 'cancelled' });
      await test.dataSource.manager.update(Meeting, { id: running.id }, { state: 'running' });
      expect(await sendDue(new Date())).toBe(0);
      expect(await mailsOf(over.id)).toEqual([]);
    });
  });
});
