import { Conference } from '../src/conferences/entities/conference.entity.js';
import { makeCase, makeMeeting, OPTIONS } from './factories/case-rows.js';
import { makeWorld, type World, type WorldPerson } from './factories/world.js';
import { startTestApp, type TestApp } from './support/test-app.js';

// The scale of 1 to 9 and two rounds: RAND/UCLA Appropriateness Method (Fitch K et al., RAND MR-1269, 2001).
describe('ratings', () => {
  let test: TestApp;
  let world: World;

  beforeAll(async () => {
    test = await startTestApp();
    world = await makeWorld(test);
  });
  afterAll(() => test.close());

  const give = (who: WorldPerson, caseId: string, values: number[], round = 1, more: object = {}) =>
    test
      .http()
      .put(`/api/cases/${caseId}/rounds/${round}/rating`)
      .set(world.people[who].auth)
      .send({ ratings: OPTIONS.map(({ id }, index) => ({ optionId: id, value: values[index] })), ...more });
  const look = async (who: WorldPerson, caseId: string) => (await test.http().get(`/api/cases/${caseId}/rounds`).set(world.people[who].auth)).body;

  it('stays blind until the own rating is in', async () => {
    const { id } = await makeCase(test, world);
    await give('panellist', id, [2, 8, 5], 1, { preferredOptionId: 'remove', reason: 'Vertical and impinging' });
    const before = await look('chair', id);
    expect(before.rounds[0]).toMatchObject({ given: 1, mine: null, figures: null, reasons: null });
    expect(JSON.stringify(before)).not.toContain('impinging');
    const after = (await give('chair', id, [4, 9, 5])).body;
    expect(after.rounds[0].figures.map((figure: { median: number; low: number; high: number }) => [figure.median, figure.low, figure.high])).toEqual([
      [3, 2, 4],
      [8.5, 8, 9],
      [5, 5, 5],
    ]);
    expect(after.rounds[0].reasons).toEqual([{ text: 'Vertical and impinging', person: null }]);
  });

  it('shows observers and coordinators nothing of an open round', async () => {
    const { id } = await makeCase(test, world);
    await give('panellist', id, [2, 8, 5]);
    for (const who of ['observer', 'coordinator'] as const) expect((await look(who, id)).rounds[0].figures).toBeNull();
    expect((await give('observer', id, [1, 1, 1])).status).toBe(403);
    expect((await give('coordinator', id, [1, 1, 1])).status).toBe(403);
  });

  it('keeps the earlier rating on record and counts only the last', async () => {
    const { id } = await makeCase(test, world);
    await give('panellist', id, [1, 9, 5]);
    const { body } = await give('panellist', id, [3, 7, 5]);
    expect(body.rounds[0]).toMatchObject({ given: 1, mine: { revision: 2 }, earlier: [{ revision: 1 }] });
    expect(body.rounds[0].figures[0].values).toEqual([3]);
  });

  it.each([
    ['a value of 0', { ratings: [{ optionId: 'retain', value: 0 }] }, 'ratings[0].value'],
    ['a value of 10', { ratings: [{ optionId: 'retain', value: 10 }] }, 'ratings[0].value'],
    ['half a value', { ratings: [{ optionId: 'retain', value: 4.5 }] }, 'ratings[0].value'],
    ['an option left out', { ratings: [{ optionId: 'retain', value: 4 }] }, 'ratings'],
    ['an option of no round', { ratings: [{ optionId: 'else', value: 4 }] }, 'ratings[0].optionId'],
    ['an option twice', { ratings: [1, 2, 3, 4].map((value) => ({ optionId: OPTIONS[value % 3]!.id, value })) }, 'ratings[3].optionId'],
    ['a preferred option of no round', { ratings: OPTIONS.map(({ id }) => ({ optionId: id, value: 5 })), preferredOptionId: 'else' }, 'preferredOptionId'],
    ['text instead of a list', { ratings: 'all nine' }, 'ratings'],
  ])('refuses %s by field', async (_, body, field) => {
    const { id } = await makeCase(test, world);
    const response = await test.http().put(`/api/cases/${id}/rounds/1/rating`).set(world.people.panellist.auth).send(body);
    expect(response.status).toBe(422);
    expect(response.headers['content-type']).toContain('application/problem+json');
    expect(response.body.errors.map((error: { field: string }) => error.field)).toContain(field);
  });

  it('opens the second round only at a running meeting, and closes the first by it', async () => {
    const found = await makeCase(test, world, { stage: 'listed' });
    const open = () => test.http().post(`/api/cases/${found.id}/rounds/2/open`).set(world.people.chair.auth);
    expect((await open()).status).toBe(409);
    await makeMeeting(test, world, { cases: [found] });
    const { status, body } = await open();
    expect(status).toBe(200);
    expect(body.rounds.map((round: { state: string }) => round.state)).toEqual(['closed', 'open']);
    expect((await give('panellist', found.id, [5, 5, 5], 1)).status).toBe(409);
    expect((await give('panellist', found.id, [5, 5, 5], 2)).status).toBe(200);
    expect((await test.http().post(`/api/cases/${found.id}/rounds/2/open`).set(world.people.panellist.auth)).status).toBe(403);
  });

  it('takes two ratings of one person at once as two revisions of one', async () => {
    const { id } = await makeCase(test, world);
    const answers = await Promise.all([1, 2, 3, 4].map((value) => give('panellist', id, [value, 8, 5])));
    expect(answers.map((answer) => answer.status)).toEqual([200, 200, 200, 200]);
    const { rounds } = await look('panellist', id);
    expect(rounds[0].given).toBe(1);
    expect([rounds[0].mine, ...rounds[0].earlier].map((ballot: { revision: number }) => ballot.revision).sort()).toEqual([1, 2, 3, 4]);
  });

  it('counts a rating that arrives while the round closes, or refuses it', async () => {
    const found = await makeCase(test, world, { stage: 'listed' });
    const close = test.http().post(`/api/cases/${found.id}/rounds/1/close`).set(world.people.chair.auth);
    const [closed, ...given] = await Promise.all([close, give('panellist', found.id, [1, 2, 3]), give('microbiology', found.id, [1, 2, 3]), give('surgeon2', found.id, [1, 2, 3])]);
    expect(closed.status).toBe(200);
    const taken = given.filter((answer) => answer.status === 200).length;
    expect(given.every((answer) => [200, 409].includes(answer.status))).toBe(true);
    expect((await look('chair', found.id)).rounds[0].figures[0].n).toBe(taken);
  });

  it('shows names only where the conference says so', async () => {
    const { id } = await makeCase(test, world);
    await give('panellist', id, [2, 8, 5], 1, { reason: 'Bone is thin' });
    await give('surgeon2', id, [2, 8, 5]);
    expect((await look('surgeon2', id)).rounds[0].reasons[0].person).toBeNull();
    await test.dataSource.manager.update(Conference, { id: world.conferenceId }, { namesShown: 'chair' });
    await give('chair', id, [2, 8, 5]);
    expect((await look('chair', id)).rounds[0].reasons[0].person).toMatchObject({ id: world.people.panellist.id });
    expect((await look('surgeon2', id)).rounds[0].reasons[0].person).toBeNull();
    await test.dataSource.manager.update(Conference, { id: world.conferenceId }, { namesShown: 'nobody' });
  });

  it('lets no stranger know that the case exists', async () => {
    const { id } = await makeCase(test, world);
    expect((await give('outsider', id, [1, 2, 3])).status).toBe(404);
    expect((await test.http().get(`/api/cases/${id}/rounds`).set(world.people.outsider.auth)).status).toBe(404);
  });
});
