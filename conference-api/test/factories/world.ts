import { hash } from 'argon2';
import { randomBytes } from 'node:crypto';
import type { Discipline, Role } from '../../src/calc/vocabulary/people.js';
import { Conference } from '../../src/conferences/entities/conference.entity.js';
import { Membership } from '../../src/conferences/entities/membership.entity.js';
import { Person } from '../../src/people/entities/person.entity.js';
import { Unit } from '../../src/people/entities/unit.entity.js';
import type { TestApp } from '../support/test-app.js';

export const PASSWORD = 'seven herons over wet slate';

export interface TestPerson {
  id: string;
  email: string;
  /** Authorization header. */
  auth: { Authorization: string };
}

export const WORLD_PEOPLE = [
  'surgeon',
  'surgeon2',
  'panellist',
  'microbiology',
  'chair',
  'coordinator',
  'observer',
  'outsider',
  'admin',
] as const;
export type WorldPerson = (typeof WORLD_PEOPLE)[number];

export interface World {
  conferenceId: string;
  otherConferenceId: string;
  unitId: string;
  otherUnitId: string;
  people: Record<WorldPerson, TestPerson>;
}

const ROLE_OF: Partial<Record<WorldPerson, Role>> = {
  surgeon: 'surgeon',
  surgeon2: 'surgeon',
  panellist: 'panellist',
  microbiology: 'panellist',
  chair: 'chair',
  coordinator: 'coordinator',
  observer: 'observer',
};

const DISCIPLINE_OF: Partial<Record<WorldPerson, Discipline>> = {
  microbiology: 'infection-microbiology',
  panellist: 'musculoskeletal-radiology',
  coordinator: 'administration',
  admin: 'administration',
};

/** Signs in over HTTP, as a person does. */
export async function signIn(test: TestApp, email: string, password = PASSWORD): Promise<{ Authorization: string }> {
  const response = await test.http().post('/api/auth/sign-in').send({ email, password });
  if (response.status !== 200) throw new Error(`sign-in of ${email} answered ${response.status}: ${response.text}`);
  return { Authorization: `Bearer ${response.body.accessToken}` };
}

/** Two conferences and a person of every role, signed in; `outsider` is a surgeon of the other conference only. */
export async function makeWorld(test: TestApp): Promise<World> {
  const { manager } = test.dataSource;
  // cheap parameters: the cost of guessing is not what these tests look at
  const passwordHash = await hash(PASSWORD, { memoryCost: 1024, timeCost: 2, parallelism: 1 });
  const tag = randomBytes(3).toString('hex');
  const units = await manager.save(Unit, [
    manager.create(Unit, { name: `Alder Fell ${tag}`, contactEmail: null }),
    manager.create(Unit, { name: `Wharf Road ${tag}`, contactEmail: null }),
  ]);
  const rule = { quorumRule: { raters: 2, disciplines: [] }, timeZone: 'Europe/London', slotStart: '2026-01-07T07:30' };
  const conferences = await manager.save(Conference, [
    manager.create(Conference, { name: `Hip revision ${tag}`, code: 'HIP', ...rule }),
    manager.create(Conference, { name: `Knee revision ${tag}`, code: 'KNEE', ...rule }),
  ]);
  const conferenceId = conferences[0]!.id;
  const otherConferenceId = conferences[1]!.id;
  const people = {} as Record<WorldPerson, TestPerson>;
  for (const [index, name] of WORLD_PEOPLE.entries()) {
    const person = await manager.save(
      manager.create(Person, {
        email: `${name}.${tag}@kerfside.example`,
        name: `${name[0]!.toUpperCase()}${name.slice(1)} Person`,
        discipline: DISCIPLINE_OF[name] ?? 'revision-surgery',
        unitId: units[index % 2]!.id,
        passwordHash,
        isAdministrator: name === 'admin',
      }),
    );
    const role = name === 'outsider' ? 'surgeon' : ROLE_OF[name];
    if (role)
      await manager.insert(Membership, { conferenceId: name === 'outsider' ? otherConferenceId : conferenceId, personId: person.id, role });
    people[name] = { id: person.id, email: person.email, auth: await signIn(test, person.email) };
  }
  return { conferenceId, otherConferenceId, unitId: units[0]!.id, otherUnitId: units[1]!.id, people };
}
