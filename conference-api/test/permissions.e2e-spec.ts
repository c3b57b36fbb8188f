import { RouteDeclarations } from '../src/access/route-declarations.js';
import { makeWorld, type World } from './factories/world.js';
import { statusOf } from './support/permission-calls.js';
import { PERSON_OF, type Scene, type Subject, SUBJECTS } from './support/permission-subjects.js';
import { type Kind, KINDS, PERMISSION_TABLE, type PermissionRow } from './support/permission-table.js';
import { startTestApp, type TestApp } from './support/test-app.js';

describe('permissions', () => {
  let test: TestApp;
  let world: World;
  /** Subjects that no call changes: those of readers, and of everyone who is refused. */
  const untouched = new Map<string, Subject>();

  beforeAll(async () => {
    test = await startTestApp();
    world = await makeWorld(test);
  });
  afterAll(() => test.close());

  async function subjectFor({ route, about, answers }: PermissionRow, kind: Kind, scene: Scene): Promise<Subject> {
    const make = SUBJECTS[about];
    if (!make) throw new Error(`${route}: nothing makes '${about}'`);
    const isChanged = !route.startsWith('GET ') && answers[kind] === 'ok';
    if (isChanged || about.includes('session')) return make(scene);
    const kept = untouched.get(about) ?? (await make(scene));
    untouched.set(about, kept);
    return kept;
  }

  const answerOf = (status: number, expected: string) => (expected === 'ok' && (status < 300 || status === 409) ? 'ok' : String(status));

  it('the table names every route of the application, and no other', () => {
    const declared = test.app.get(RouteDeclarations).list().map(({ method, path }) => `${method} ${path}`);
    const inTable = PERMISSION_TABLE.map(({ route }) => route);
    expect({ missing: declared.filter((route) => !inTable.includes(route)), unknown: inTable.filter((route) => !declared.includes(route)) }).toEqual({ missing: [], unknown: [] });
  });

  it('a route is public only where nobody gets in by the table', () => {
    for (const { method, path, declaration } of test.app.get(RouteDeclarations).list()) {
      const rows = PERMISSION_TABLE.filter(({ route }) => route === `${method} ${path}`);
      expect([`${method} ${path}`, rows.every(({ answers }) => answers.nobody !== '401')]).toEqual([`${method} ${path}`, declaration.kind === 'public']);
    }
  });

  it.each(PERMISSION_TABLE.map((row) => [row.route, row.about, row] as const))('%s, about %s', async (route, _, row) => {
    const given: Partial<Record<Kind, string>> = {};
    for (const kind of KINDS) {
      const scene: Scene = { test, world, who: PERSON_OF[kind] };
      given[kind] = answerOf(await statusOf(scene, route, await subjectFor(row, kind, scene)), row.answers[kind]);
    }
    expect(given).toEqual(row.answers);
  });
});
