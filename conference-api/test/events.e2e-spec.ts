import { Session } from '../src/auth/entities/session.entity.js';
import { Case } from '../src/cases/entities/case.entity.js';
import { type EventFacts, UnitOfWork } from '../src/database/unit-of-work.js';
import { LiveEventFeed } from '../src/events/live-event-feed.service.js';
import { LiveEvent } from '../src/events/entities/live-event.entity.js';
import { makeCase } from './factories/case-rows.js';
import { createMeeting } from './factories/slots.js';
import { makeWorld, signIn, type World, type WorldPerson } from './factories/world.js';
import { type HeardEvent, listen, type Listening } from './support/event-stream.js';
import { makeDatabase, startTestApp, type TestApp } from './support/test-app.js';

describe('live events', () => {
  let database: Awaited<ReturnType<typeof makeDatabase>>;
  let test: TestApp;
  let other: TestApp;
  let world: World;
  let open: Listening[];

  const tell = (facts: EventFacts, app = test) =>
    app.app.get(UnitOfWork).run(null, (tx) => tx.event(facts));
  const as = async (name: WorldPerson, lastEventId?: string, app = test) => {
    const listening = await listen(app.url, world.people[name].auth, lastEventId);
    open.push(listening);
    return listening;
  };
  const of = (caseId: string) => (event: HeardEvent) => event.data?.caseId === caseId;
  /** A last event that everyone hears: what is not there before it was not sent. */
  const mark = async () => {
    const meetingId = crypto.randomUUID();
    await tell({ kind: 'meeting-changed', conferenceId: world.conferenceId, meetingId });
    return (event: HeardEvent) => event.data?.meetingId === meetingId;
  };

  beforeAll(async () => {
    database = await makeDatabase();
    test = await startTestApp({}, database.url);
    await test.dataSource.runMigrations({ transaction: 'none' });
    // the second process has the same secrets, as two of one installation have
    other = await startTestApp({ KERFSIDE_TOKEN_SECRET: test.settings.tokenSecret }, database.url);
    world = await makeWorld(test);
  });
  beforeEach(() => {
    open = [];
  });
  afterEach(() => open.forEach((listening) => listening.stop()));
  afterAll(async () => {
    await test?.close();
    await other?.close();
    await database?.drop();
  });

  it('reach a member’s page with ids and kind only, unstored and unbuffered', async () => {
    const page = await as('panellist');
    expect(page.status).toBe(200);
    expect(page.headers.get('content-type')).toMatch(/^text\/event-stream/);
    expect(page.headers.get('cache-control')).toBe('no-store');
    expect(page.headers.get('x-accel-buffering')).toBe('no');
    expect(page.headers.get('content-encoding')).toBeNull();
    const meeting = await createMeeting(test, world, 5);
    const heard = await page.until((event) => event.data?.meetingId === meeting.id);
    expect(heard.event).toBe('meeting-changed');
    expect(heard.id).toBe(heard.data?.id);
    expect(heard.data).toEqual({ id: heard.id, kind: 'meeting-changed', caseId: null, meetingId: meeting.id, conferenceId: world.conferenceId });
  });

  it('need a signed-in person', async () => {
    expect((await listen(test.url, { Authorization: 'Bearer forged' })).status).toBe(401);
  });

  it('reach pages of all processes', async () => {
    const pages = [await as('surgeon'), await as('chair', undefined, other)];
    const found = await makeCase(test, world);
    await tell({ kind: 'case-changed', conferenceId: world.conferenceId, caseId: found.id });
    await tell({ kind: 'rating-changed', conferenceId: world.conferenceId, caseId: found.id }, other);
    for (const page of pages) {
      await page.until((event) => of(found.id)(event) && event.event === 'case-changed');
      await page.until((event) => of(found.id)(event) && event.event === 'rating-changed');
    }
  });

  it('reach only those who may see the case', async () => {
    const names = ['surgeon', 'surgeon2', 'coordinator', 'chair', 'observer', 'outsider', 'admin'] as const;
    const pages = Object.fromEntries(await Promise.all(names.map(async (name) => [name, await as(name)]))) as Record<(typeof names)[number], Listening>;
    const cases = {
      draft: await makeCase(test, world, { stage: 'draft' }),
      checking: await makeCase(test, world, { stage: 'checking' }),
      open: await makeCase(test, world),
      withdrawn: await makeCase(test, world, { stage: 'withdrawn' }),
      withdrawnDraft: await makeCase(test, world, { stage: 'withdrawn' }),
    };
    await test.dataSource.manager.update(Case, { id: cases.withdrawnDraft.id }, { releasedAt: null });
    for (const { id } of Object.values(cases)) await tell({ kind: 'case-changed', conferenceId: world.conferenceId, caseId: id });
    const last = await mark();
    for (const name of names.slice(0, 5)) await pages[name].until(last);
    // the two strangers have nothing to wait for: a poll later nothing has come
    await tell({ kind: 'membership-changed', personId: world.people.outsider.id });
    await pages.outsider.until((event) => event.event === 'membership-changed');

    const hears = (name: (typeof names)[number]) => (Object.keys(cases) as (keyof typeof cases)[]).filter((key) => pages[name].heard.some(of(cases[key].id)));
    expect(hears('surgeon')).toEqual(['draft', 'checking', 'open', 'withdrawn', 'withdrawnDraft']);
    expect(hears('coordinator')).toEqual(['checking', 'open', 'withdrawn', 'withdrawnDraft']);
    expect(hears('chair')).toEqual(['open', 'withdrawn', 'withdrawnDraft']);
    // who could read it learns that it is gone; who never knew of it learns nothing
    expect(hears('surgeon2')).toEqual(['open', 'withdrawn']);
    expect(hears('observer')).toEqual(['open', 'withdrawn']);
    expect(hears('outsider')).toEqual([]);
    expect(hears('admin')).toEqual([]);
    expect(pages.outsider.heard).toHaveLength(1);
    expect(pages.admin.heard).toEqual([]);
  });

  it('for one person reach that person alone', async () => {
    const [mine, theirs] = [await as('surgeon'), await as('surgeon2')];
    await tell({ kind: 'remarks-changed', conferenceId: world.conferenceId, personId: world.people.surgeon.id });
    const last = await mark();
    await Promise.all([mine.until(last), theirs.until(last)]);
    expect(mine.heard.some((event) => event.event === 'remarks-changed')).toBe(true);
    expect(theirs.heard.some((event) => event.event === 'remarks-changed')).toBe(false);
  });

  it('go on where a page left off, by Last-Event-ID', async () => {
    const page = await as('panellist');
    const found = await makeCase(test, world);
    await tell({ kind: 'case-changed', conferenceId: world.conferenceId, caseId: found.id });
    const { id } = await page.until(of(found.id));
    page.stop();
    const [missed, secret] = [await makeCase(test, world), await makeCase(test, world, { stage: 'draft' })];
    for (const { id: caseId } of [missed, secret]) await tell({ kind: 'remarks-changed', conferenceId: world.conferenceId, caseId });
    const back = await as('panellist', id);
    await back.until(of(missed.id));
    await back.until(await mark());
    expect(back.heard.filter(of(missed.id))).toHaveLength(1);
    expect(back.heard.some(of(secret.id))).toBe(false);
    // one that comes new hears nothing of the past
    const fresh = await as('panellist');
    await fresh.until(await mark());
    expect(fresh.heard.some(of(missed.id))).toBe(false);
  });

  it.each(['999999999', '0', 'x'])('tell a page to ask for everything again where its last event %s is not known', async (lastEventId) => {
    const page = await as('panellist', lastEventId);
    await page.until((event) => event.event === 'reset');
  });

  it('are heard once each, also where an earlier one is committed later', async () => {
    const page = await as('panellist');
    const [early, late] = [await makeCase(test, world), await makeCase(test, world)];
    let commit = () => {};
    let held = Promise.resolve();
    // written, and so given its id, before the next one; committed after it
    await new Promise<void>((written) => {
      held = test.app.get(UnitOfWork).run(null, async (tx) => {
        await tx.event({ kind: 'case-changed', conferenceId: world.conferenceId, caseId: early.id });
        written();
        await new Promise<void>((resolve) => (commit = resolve));
      });
    });
    await tell({ kind: 'case-changed', conferenceId: world.conferenceId, caseId: late.id });
    await page.until(of(late.id));
    commit();
    await held;
    await page.until(of(early.id));
    await page.until(await mark());
    const ids = page.heard.map((event) => Number(event.id));
    expect(Number(page.heard.find(of(early.id))!.id)).toBeLessThan(Number(page.heard.find(of(late.id))!.id));
    expect(new Set(ids).size).toBe(ids.length);
  });

  it('end when the membership changes, so that the page comes back with its new role', async () => {
    const page = await as('observer');
    const answered = await test.http().put(`/api/conferences/${world.conferenceId}/members/${world.people.observer.id}`).set(world.people.admin.auth).send({ role: 'panellist' });
    expect(answered.status).toBeLessThan(300);
    await page.ended;
    expect(page.heard.at(-1)?.event).toBe('membership-changed');
  });

  it('end with the session', async () => {
    const auth = await signIn(test, world.people.surgeon2.email);
    const page = await listen(test.url, auth);
    const stays = await as('surgeon2');
    await test.dataSource.manager.update(Session, { id: (await sessionsOf(world.people.surgeon2.id)).at(-1)! }, { endedAt: new Date(), endedWhy: 'signed-out' });
    await page.ended;
    await stays.until(await mark());
  });

  it('end with the server, without holding it up', async () => {
    const third = await startTestApp({ KERFSIDE_TOKEN_SECRET: test.settings.tokenSecret }, database.url);
    const page = await listen(third.url, world.people.chair.auth);
    expect(page.status).toBe(200);
    await Promise.all([third.close(), page.ended]);
  });

  it('are forgotten after a day', async () => {
    await test.dataSource.manager.insert(LiveEvent, { at: new Date(Date.now() - 25 * 3_600_000), kind: 'case-changed', conferenceId: world.conferenceId });
    await tell({ kind: 'case-changed', conferenceId: world.conferenceId });
    const before = await test.dataSource.manager.count(LiveEvent);
    await test.app.get(LiveEventFeed).forgetOld();
    expect(await test.dataSource.manager.count(LiveEvent)).toBe(before - 1);
  });

  async function sessionsOf(personId: string): Promise<string[]> {
    return (await test.dataSource.manager.find(Session, { where: { personId }, order: { createdAt: 'ASC' } })).map(({ id }) => id);
  }
});
