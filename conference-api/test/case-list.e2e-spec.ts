import { maySeeCase } from '../src/access/access.policy.js';
import type { Actor } from '../src/access/actor.js';
import { STAGES } from '../src/calc/vocabulary/case.js';
import { ROLES } from '../src/calc/vocabulary/people.js';
import { Case } from '../src/cases/entities/case.entity.js';
import { visibleCases } from '../src/cases/visible-cases.js';
import { Ballot } from '../src/ratings/entities/ballot.entity.js';
import { RatingRound } from '../src/ratings/entities/rating-round.entity.js';
import { makeCaseAt, makeDraft, makeMeeting, readyContent, setStage } from './factories/cases.js';
import { makeWorld, type World, type WorldPerson } from './factories/world.js';
import { queriesOf } from './support/query-count.js';
import { startTestApp, type TestApp } from './support/test-app.js';

let test: TestApp;
let world: World;

const list = async (name: WorldPerson, query = '') => {
  const response = await test.http().get(`/api/cases?${query}`).set(world.people[name].auth);
  if (response.status !== 200) throw new Error(`${query}: ${response.text}`);
  return response.body as { items: { id: string; code: string; [key: string]: unknown }[]; nextCursor: string | null };
};
const ids = async (name: WorldPerson, query = '') => (await list(name, `limit=100&${query}`)).items.map(({ id }) => id);
const titled = (title: string, more: object = {}) => ({ heading: { ...readyContent().heading, title, ...more } });

/** Reads page by page; `between` runs after each page. */
async function readAll(name: WorldPerson, query: string, between: () => Promise<unknown> = async () => undefined): Promise<string[]> {
  const seen: string[] = [];
  let cursor: string | null = '';
  while (cursor !== null) {
    const page: Awaited<ReturnType<typeof list>> = await list(name, `limit=4&${query}${cursor ? `&cursor=${cursor}` : ''}`);
    seen.push(...page.items.map(({ id }) => id));
    cursor = page.nextCursor;
    await between();
  }
  return seen;
}

const at = {} as Record<'draft' | 'checking' | 'open' | 'knee' | 'urgent' | 'listed' | 'withdrawn' | 'other', string>;

beforeAll(async () => {
  test = await startTestApp();
  world = await makeWorld(test);
  at.draft = (await makeCaseAt(test, world, 'draft', { changes: titled('Unfinished') })).id;
  at.checking = (await makeCaseAt(test, world, 'checking', { changes: titled('Waiting for the check') })).id;
  at.open = (await makeCaseAt(test, world, 'open', { changes: titled('Broken screw under the liner') })).id;
  at.knee = (await makeCaseAt(test, world, 'open', { changes: titled('Stiff knee', { joint: 'knee' }), presenter: world.people.surgeon2 })).id;
  at.urgent = (await makeCaseAt(test, world, 'open', { changes: titled('Septic shell', { urgency: 'urgent', urgencyReason: 'Sepsis' }) })).id;
  at.listed = (await makeCaseAt(test, world, 'open', { changes: titled('Listed one') })).id;
  await makeMeeting(test, world, [at.listed]);
  at.withdrawn = (await makeCaseAt(test, world, 'open', { changes: titled('Taken back') })).id;
  await setStage(test, at.withdrawn, 'withdrawn');
  const { outsider } = world.people;
  at.other = (await test.http().post('/api/cases').set(outsider.auth).send({ conferenceId: world.otherConferenceId })).body.id;
  await setStage(test, at.other, 'open');
}, 120_000);
afterAll(() => test.close());

describe('who sees what', () => {
  it.each<[WorldPerson, (keyof typeof at)[]]>([
    ['surgeon', ['draft', 'checking', 'open', 'knee', 'urgent', 'listed', 'withdrawn']],
    ['surgeon2', ['open', 'knee', 'urgent', 'listed']],
    ['panellist', ['open', 'knee', 'urgent', 'listed']],
    ['observer', ['open', 'knee', 'urgent', 'listed']],
    ['chair', ['open', 'knee', 'urgent', 'listed', 'withdrawn']],
    ['coordinator', ['checking', 'open', 'knee', 'urgent', 'listed', 'withdrawn']],
    ['outsider', ['other']],
    ['admin', []],
  ])('%s', async (name, keys) => {
    expect((await ids(name)).sort()).toEqual(keys.map((key) => at[key]).sort());
  });

  it('says the same as the policy, for every role, stage and presenter', async () => {
    const cases = await test.dataSource.manager.find(Case);
    for (const role of ROLES)
      for (const stage of STAGES) {
        await test.dataSource.manager.update(Case, { id: at.open }, { stage });
        for (const person of ['surgeon', 'panellist'] as const) {
          const roles = new Map([[world.conferenceId, role]]);
          const actor: Actor = { personId: world.people[person].id, sessionId: '', name: '', isAdministrator: false, roles, address: '' };
          const { sql, parameters } = visibleCases(actor, 'c');
          const shown = await test.dataSource.manager.createQueryBuilder(Case, 'c').select('c.id').where(sql, parameters).getMany();
          const expected = cases.map((found) => (found.id === at.open ? { ...found, stage } : found)).filter((found) => maySeeCase(actor, found));
          expect([role, stage, person, shown.map(({ id }) => id).sort()]).toEqual([role, stage, person, expected.map(({ id }) => id).sort()]);
        }
      }
    await setStage(test, at.open, 'open');
  });
});

describe('filters', () => {
  it.each<[string, WorldPerson, (keyof typeof at)[]]>([
    ['stage=listed', 'panellist', ['listed']],
    ['stage=listed,withdrawn', 'chair', ['listed', 'withdrawn']],
    ['joint=knee', 'panellist', ['knee']],
    ['urgency=urgent', 'panellist', ['urgent']],
    ['mine=true', 'surgeon2', ['knee']],
    ['mine=false&stage=open', 'surgeon2', ['open', 'urgent']],
    ['stage=open&joint=hip&urgency=routine', 'panellist', ['open']],
  ])('%s', async (query, name, keys) => {
    expect((await ids(name, query)).sort()).toEqual(keys.map((key) => at[key]).sort());
  });

  it('conference', async () => {
    expect(await ids('panellist', `conferenceId=${world.conferenceId}`)).toHaveLength(4);
    expect(await ids('panellist', `conferenceId=${world.otherConferenceId}`)).toEqual([]);
  });

  it('awaiting my rating: an open round without my ballot, for those who may rate', async () => {
    expect((await ids('panellist', 'awaitingMyRating=true')).sort()).toEqual([at.open, at.knee, at.urgent, at.listed].sort());
    expect(await ids('observer', 'awaitingMyRating=true')).toEqual([]);
    const round = await test.dataSource.manager.findOneByOrFail(RatingRound, { caseId: at.urgent });
    const ballot = test.dataSource.manager.create(Ballot, { roundId: round.id, personId: world.people.panellist.id, revision: 1, reason: '', at: new Date() });
    await test.dataSource.manager.save(ballot);
    expect((await ids('panellist', 'awaitingMyRating=true')).sort()).toEqual([at.open, at.knee, at.listed].sort());
    expect(await ids('panellist', 'awaitingMyRating=false')).toEqual([at.urgent]);
    const item = (await list('panellist')).items.find(({ id }) => id === at.urgent);
    expect(item).toMatchObject({ ratings: 1, awaitingMyRating: false, isMine: false });
    expect((await list('chair')).items.find(({ id }) => id === at.urgent)).toMatchObject({ ratings: 1, awaitingMyRating: true });
    await test.dataSource.manager.update(RatingRound, { id: round.id }, { closedAt: new Date() });
    expect((await list('chair')).items.find(({ id }) => id === at.urgent)).toMatchObject({ ratings: null, awaitingMyRating: false });
  });

  it.each(['stage=nowhere', 'joint=elbow', 'limit=0', 'limit=1000', 'cursor=abc', 'sort=name', 'mine=perhaps', 'conferenceId=1', 'colour=red', `cursor=${Buffer.from('["updated","desc",1,"x","y"]').toString('base64url')}`])(
    'refuses %s',
    async (query) => {
      const response = await test.http().get(`/api/cases?${query}`).set(world.people.surgeon.auth);
      expect([query, response.status]).toEqual([query, 422]);
    },
  );
});

describe('search', () => {
  it.each<[string, (keyof typeof at)[]]>([
    ['broken', ['open']],
    ['BROK lin', ['open']],
    ['"broken screw"', ['open']],
    ['under the liner', ['open']],
    ['septic -shell', ['urgent']],
    ['+septic* ~>< () "', ['urgent']],
    ['nosuchword', []],
    ['broken nosuchword', []],
    ["' OR 1=1 --", []],
    ['%', []],
  ])('%s', async (query, keys) => {
    expect((await ids('panellist', `query=${encodeURIComponent(query)}`)).sort()).toEqual(keys.map((key) => at[key]).sort());
  });

  it('finds a case by its code, by chosen words and by what was said of it', async () => {
    const { code } = (await list('panellist')).items.find(({ id }) => id === at.knee)!;
    expect(await ids('panellist', `query=${code}`)).toEqual([at.knee]);
    expect((await ids('panellist', 'query=titanium')).length).toBeGreaterThan(1);
    const content = { type: 'doc', content: [{ type: 'paragraph', content: [{ type: 'text', text: 'Consider a trabecular augment' }] }] };
    await test.http().post(`/api/cases/${at.knee}/threads`).set(world.people.chair.auth).send({ anchorKind: 'case', kind: 'remark', content });
    expect(await ids('panellist', 'query=trabecular')).toEqual([at.knee]);
    expect((await list('panellist', 'query=trabecular')).items[0]).toMatchObject({ unread: 1, openQuestions: 0 });
    expect((await list('chair', 'query=trabecular')).items[0]).toMatchObject({ unread: 0 });
  });

  it('never finds what one may not see', async () => {
    expect(await ids('panellist', 'query=unfinished')).toEqual([]);
    expect(await ids('surgeon', 'query=unfinished')).toEqual([at.draft]);
  });
});

describe('order and pages', () => {
  let many: string[];
  beforeAll(async () => {
    many = [];
    for (let index = 0; index < 14; index++) many.push((await makeDraft(test, world, world.people.surgeon2)).id);
    // several at the same moment: the id decides between them
    const moment = new Date('2026-03-03T03:03:03.003Z');
    for (const id of many.slice(0, 6)) await test.dataSource.manager.update(Case, { id }, { updatedAt: moment });
  }, 60_000);

  it.each(['updated', 'released', 'urgency', 'code'].flatMap((sort) => ['asc', 'desc'].map((order) => [sort, order])))(
    'sort=%s&order=%s gives every case once over all pages, in one order',
    async (sort, order) => {
      const query = `sort=${sort}&order=${order}`;
      const whole = await ids('surgeon2', query);
      expect(new Set(whole).size).toBe(whole.length);
      expect(whole).toHaveLength(18);
      expect(await readAll('surgeon2', query)).toEqual(whole);
      const reversed = await ids('surgeon2', `sort=${sort}&order=${order === 'asc' ? 'desc' : 'asc'}`);
      expect(reversed).toEqual([...whole].reverse());
    },
  );

  it('sorts by what it says', async () => {
    const codes = (await list('surgeon2', 'limit=100&sort=code&order=asc')).items.map(({ code }) => code);
    expect(codes).toEqual([...codes].sort());
    expect((await ids('surgeon2', 'sort=urgency&order=desc'))[0]).toBe(at.urgent);
    const updated = (await list('surgeon2', 'limit=100')).items.map((item) => item['updatedAt'] as string);
    expect(updated).toEqual([...updated].sort().reverse());
  });

  it.each(['sort=code&order=asc', 'sort=code&order=desc', 'sort=released&order=desc', 'sort=urgency&order=desc'])(
    '%s: complete and without repeats while cases are saved and begun between the pages',
    async (query) => {
      const before = await ids('surgeon2', query);
      let turn = 0;
      const seen = await readAll('surgeon2', query, async () => {
        await test.dataSource.manager.update(Case, { id: many[turn++ % many.length]! }, { updatedAt: new Date() });
        if (turn === 2) await makeDraft(test, world, world.people.surgeon2);
      });
      expect(new Set(seen).size).toBe(seen.length);
      expect(before.filter((id) => !seen.includes(id))).toEqual([]);
    },
  );

  it.each(['asc', 'desc'])('sort=updated&order=%s: no repeats, and every case that was left alone, while others are saved', async (order) => {
    const touched = new Set<string>();
    const before = await ids('surgeon2', `sort=updated&order=${order}`);
    let turn = 0;
    const seen = await readAll('surgeon2', `sort=updated&order=${order}`, async () => {
      const id = many[(turn++ * 5) % many.length]!;
      touched.add(id);
      await test.dataSource.manager.update(Case, { id }, { updatedAt: new Date() });
    });
    expect(new Set(seen).size).toBe(seen.length);
    expect(before.filter((id) => !touched.has(id) && !seen.includes(id))).toEqual([]);
  });

  it('refuses a cursor of another order', async () => {
    const { nextCursor } = await list('surgeon2', 'limit=2&sort=code');
    const response = await test.http().get(`/api/cases?limit=2&sort=updated&cursor=${nextCursor}`).set(world.people.surgeon2.auth);
    expect(response.status).toBe(422);
  });
});

describe('number of queries', () => {
  // session and roles of the token; the rest is the use case's own
  const own = (queries: string[]) => queries.filter((query) => !/`sessions`|FROM `memberships`/.test(query));

  it('of the list does not depend on how many cases it shows', async () => {
    const few = await queriesOf(test, () => list('surgeon2', 'limit=2'));
    const all = await queriesOf(test, () => list('surgeon2', 'limit=100'));
    expect(all.result.items.length).toBeGreaterThan(10);
    expect(all.queries.length).toBe(few.queries.length);
    expect(own(all.queries)).toHaveLength(5);
  });

  it('of the case page does not depend on what the case holds', async () => {
    const page = (id: string) => queriesOf(test, () => test.http().get(`/api/cases/${id}`).set(world.people.surgeon2.auth));
    const bare = await page((await makeDraft(test, world, world.people.surgeon2)).id);
    const full = await page(at.knee);
    expect([bare.result.status, full.result.status]).toEqual([200, 200]);
    expect(full.queries.length).toBe(bare.queries.length);
    expect(own(full.queries)).toHaveLength(7);
  });
});
