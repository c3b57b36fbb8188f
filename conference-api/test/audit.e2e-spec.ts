import { AuditEntry } from '../src/audit/entities/audit-entry.entity.js';
import { makeCaseAt, readyContent } from './factories/cases.js';
import { makeWorld, type World, type WorldPerson } from './factories/world.js';
import { queriesOf } from './support/query-count.js';
import { startTestApp, type TestApp } from './support/test-app.js';

interface Entry {
  id: string;
  at: string;
  action: string;
  personId: string | null;
  personName: string | null;
  recordKind: string;
  recordId: string;
  caseId: string | null;
  address: string;
  details: Record<string, unknown>;
}

describe('audit trail', () => {
  let test: TestApp;
  let world: World;
  let caseId: string;

  beforeAll(async () => {
    test = await startTestApp();
    world = await makeWorld(test);
    caseId = (await makeCaseAt(test, world, 'open')).id;
  });
  afterAll(() => test.close());

  const read = async (path: string, who: WorldPerson) => test.http().get(path).set(world.people[who].auth);
  const entriesOf = async (path: string, who: WorldPerson): Promise<Entry[]> => {
    const response = await read(path, who);
    expect(response.status).toBe(200);
    return response.body.items;
  };
  /** All text of a value, wherever it stands. */
  const textsIn = (value: unknown): string[] =>
    typeof value === 'string' ? [value] : value && typeof value === 'object' ? Object.values(value).flatMap(textsIn) : [];

  it('of a case says who did what when and from where, newest first', async () => {
    const entries = await entriesOf(`/api/cases/${caseId}/audit`, 'chair');
    expect(entries.map(({ action }) => action)).toEqual(['case.release', 'case.post', expect.any(String), 'case.create']);
    expect(entries[0]).toMatchObject({ personId: world.people.coordinator.id, personName: 'Coordinator Person', recordKind: 'case', recordId: caseId, caseId });
    expect(entries[1]).toMatchObject({ personId: world.people.surgeon.id, personName: 'Surgeon Person' });
    for (const { address, at } of entries) {
      expect(address).toMatch(/127\.0\.0\.1$/);
      expect(Math.abs(Date.now() - new Date(at).getTime())).toBeLessThan(60_000);
    }
  });

  it('of a case is the chair\'s alone; for the administrator outside the conference the case does not exist', async () => {
    for (const who of ['surgeon', 'panellist', 'coordinator', 'observer'] as const) expect((await read(`/api/cases/${caseId}/audit`, who)).status).toBe(403);
    expect((await read(`/api/cases/${caseId}/audit`, 'admin')).status).toBe(404);
  });

  it('of the site is filtered by person, case and action', async () => {
    const bySurgeon = await entriesOf(`/api/audit?personId=${world.people.surgeon.id}`, 'admin');
    expect(bySurgeon.length).toBeGreaterThan(0);
    expect(new Set(bySurgeon.map(({ personId }) => personId))).toEqual(new Set([world.people.surgeon.id]));
    const ofCase = await entriesOf(`/api/audit?caseId=${caseId}&action=case.post`, 'admin');
    expect(ofCase).toMatchObject([{ action: 'case.post', caseId }]);
    const refused = await read('/api/audit?personId=me', 'admin');
    expect([refused.status, refused.body.errors[0].field]).toEqual([422, 'personId']);
  });

  it('pages through every entry once', async () => {
    const seen: string[] = [];
    for (let cursor: string | null = ''; cursor !== null; ) {
      const { body }: { body: { items: Entry[]; nextCursor: string | null } } = await read(`/api/audit?limit=4${cursor ? `&cursor=${cursor}` : ''}`, 'admin');
      seen.push(...body.items.map(({ id }) => id));
      cursor = body.nextCursor;
    }
    expect(seen).toEqual([...seen].sort((a, b) => Number(b) - Number(a)));
    expect(new Set(seen).size).toBe(await test.dataSource.manager.count(AuditEntry));
  });

  it('asks no query per entry', async () => {
    const few = await queriesOf(test, () => entriesOf('/api/audit?limit=1', 'admin'));
    const many = await queriesOf(test, () => entriesOf('/api/audit?limit=100', 'admin'));
    expect(many.result.length).toBeGreaterThan(10);
    // the token, the entries, the names
    expect([few.queries.length, many.queries.length]).toEqual([3, 3]);
  });

  it('holds none of what the case says', async () => {
    const words = textsIn(readyContent()).filter((text) => text.includes(' '));
    expect(words.length).toBeGreaterThan(10);
    const trail = JSON.stringify(await test.dataSource.manager.find(AuditEntry));
    for (const text of words) expect(trail).not.toContain(text);
  });

  it('is not written where the change was not made', async () => {
    const before = await test.dataSource.manager.count(AuditEntry);
    const refused = await test.http().post(`/api/cases/${caseId}/release`).set(world.people.coordinator.auth).send({ baseVersion: 1 });
    expect(refused.status).toBe(409);
    expect(await test.dataSource.manager.count(AuditEntry)).toBe(before);
  });
});
