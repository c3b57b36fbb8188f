import { createHash, randomBytes, randomUUID } from 'node:crypto';
import sharp from 'sharp';
import { OneTimeToken } from '../../src/auth/entities/one-time-token.entity.js';
import { Session } from '../../src/auth/entities/session.entity.js';
import type { Stage } from '../../src/calc/vocabulary/case.js';
import { Case } from '../../src/cases/entities/case.entity.js';
import { Membership } from '../../src/conferences/entities/membership.entity.js';
import { OutboxMail } from '../../src/mail/entities/outbox-mail.entity.js';
import { Person } from '../../src/people/entities/person.entity.js';
import { Unit } from '../../src/people/entities/unit.entity.js';
import { makeCase, makeMeeting } from '../factories/case-rows.js';
import { addImageRow } from '../factories/cases.js';
import { PASSWORD, type World, type WorldPerson } from '../factories/world.js';
import { refreshCookieOf } from './cookies.js';
import type { Kind } from './permission-table.js';
import type { TestApp } from './test-app.js';

/** What one call needs besides its route: values of the path, query, headers, and fields of the body. */
export interface Subject {
  params?: Record<string, string>;
  query?: string;
  headers?: Record<string, string>;
  body?: object;
}

export interface Scene {
  test: TestApp;
  world: World;
  /** Whose call it will be. */
  who: WorldPerson | null;
}

export const PERSON_OF: Record<Kind, WorldPerson | null> = {
  nobody: null,
  presenter: 'surgeon',
  surgeon: 'surgeon2',
  panellist: 'panellist',
  chair: 'chair',
  coordinator: 'coordinator',
  observer: 'observer',
  administrator: 'admin',
  stranger: 'outsider',
};

export const paragraph = (text: string) => ({ type: 'doc', content: [{ type: 'paragraph', content: [{ type: 'text', text }] }] });

type Maker = (scene: Scene) => Promise<Subject>;

const ofCase = (found: { id: string }, more: Record<string, string> = {}): Subject => ({ params: { id: found.id, caseId: found.id, version: '1', ...more } });

const caseAt = (stage: Stage, conference: 'conferenceId' | 'otherConferenceId' = 'conferenceId'): Maker => async ({ test, world }) =>
  ofCase(await makeCase(test, world, { stage, conferenceId: world[conference], presenter: conference === 'conferenceId' ? 'surgeon' : 'outsider' }), { number: '1' });

/** A listed case at a running meeting, with who may decide there. */
async function heldCase({ test, world }: Scene) {
  const found = await makeCase(test, world, { stage: 'listed' });
  await makeMeeting(test, world, { cases: [found], present: ['chair', 'panellist', 'surgeon', 'microbiology'] });
  return found;
}

async function as(scene: Scene, who: WorldPerson, method: 'put' | 'post', path: string, body: object) {
  const response = await scene.test.http()[method](path).set(scene.world.people[who].auth).send(body);
  if (response.status >= 300) throw new Error(`${method} ${path} as ${who} answered ${response.status}: ${response.text}`);
  return response.body;
}

async function draftedDecision(scene: Scene) {
  const found = await heldCase(scene);
  for (const step of ['open', 'close']) await as(scene, 'chair', 'post', `/api/cases/${found.id}/rounds/2/${step}`, {});
  const decision = await as(scene, 'chair', 'put', `/api/cases/${found.id}/decision`, { chosenOptionId: 'remove', text: 'Remove it.', dissent: [] });
  return { found, decisionId: String(decision.id) };
}

async function decidedCase(scene: Scene) {
  const { found } = await draftedDecision(scene);
  const signed = await as(scene, 'chair', 'post', `/api/cases/${found.id}/decision/sign`, { baseRevision: 1, password: PASSWORD });
  return { found, decisionId: String(signed.id) };
}

async function newcomer({ test, world }: Scene): Promise<Person> {
  const { manager } = test.dataSource;
  const email = `newcomer.${randomBytes(4).toString('hex')}@kerfside.example`;
  return manager.save(manager.create(Person, { email, name: 'New Comer', discipline: 'pharmacy', unitId: world.unitId, passwordHash: null }));
}

async function link(scene: Scene, purpose: OneTimeToken['purpose']): Promise<string> {
  const token = randomBytes(32).toString('base64url');
  const hash = createHash('sha256').update(token).digest('hex');
  const { id: personId } = await newcomer(scene);
  await scene.test.dataSource.manager.insert(OneTimeToken, { hash, purpose, personId, expiresAt: new Date(Date.now() + 60_000), usedAt: null });
  return token;
}

async function sessionOf({ test, world }: Scene, who: WorldPerson): Promise<Subject> {
  const id = randomUUID();
  const now = new Date();
  await test.dataSource.manager.insert(Session, {
    ...{ id, personId: world.people[who].id, device: 'Elsewhere', address: '192.0.2.1' },
    ...{ lastUsedAt: now, expiresAt: new Date(now.getTime() + 60_000), endedAt: null, endedWhy: null },
  });
  return { params: { id } };
}

async function storedPicture(scene: Scene): Promise<{ id: string; query: string }> {
  const { test, world } = scene;
  const found = await makeCase(test, world, { stage: 'draft' });
  const { auth } = world.people.surgeon;
  const picture = await sharp({ create: { width: 64, height: 64, channels: 3, background: '#667788' } }).png().toBuffer();
  const { body, status, text } = await test.http().post(`/api/cases/${found.id}/images`).set(auth).attach('file', picture, 'shell.png');
  if (status !== 201) throw new Error(`upload answered ${status}: ${text}`);
  const address = new URL(String(body.addresses.thumb), test.url);
  return { id: String(body.id), query: address.search };
}

const questionOn = async (scene: Scene) => {
  const found = await makeCase(scene.test, scene.world);
  const thread = await as(scene, 'panellist', 'post', `/api/cases/${found.id}/threads`, { anchorKind: 'case', kind: 'question', content: paragraph('Is the rim seen?') });
  return { threadId: String(thread.id), remarkId: String(thread.remarks[0].id) };
};

const meetingIn = (state: 'planned' | 'running'): Maker => async ({ test, world }) => {
  const found = await makeCase(test, world, { stage: 'listed' });
  const startsAt = new Date(Date.now() + (state === 'planned' ? 86_400_000 : 0));
  const meeting = await makeMeeting(test, world, { state, cases: [found], startsAt });
  const [item] = await test.dataSource.query('SELECT id FROM agenda_items WHERE meetingId = ?', [meeting.id]);
  return { params: { id: meeting.id, personId: world.people.observer.id, itemId: String(item.id) } };
};

export const SUBJECTS: Record<string, Maker> = {
  nothing: async () => ({ params: { name: 'proportion' } }),
  'the right password': async ({ world }) => ({ body: { email: world.people.observer.email, password: PASSWORD } }),
  'a signed-in browser': async ({ test, world }) => {
    const response = await test.http().post('/api/auth/sign-in').send({ email: world.people.observer.email, password: PASSWORD });
    return { headers: { Cookie: refreshCookieOf(response).header } };
  },
  'a reset link': async (scene) => ({ body: { token: await link(scene, 'password-reset') } }),
  'an invitation': async (scene) => ({ params: { token: await link(scene, 'invitation') } }),
  'the own session': (scene) => sessionOf(scene, scene.who ?? 'observer'),
  'the session of somebody else': (scene) => sessionOf(scene, 'microbiology'),
  'a newcomer': async (scene) => ({ params: { id: (await newcomer(scene)).id } }),
  'a member': async (scene) => {
    const { id: personId } = await newcomer(scene);
    const { conferenceId } = scene.world;
    await scene.test.dataSource.manager.insert(Membership, { conferenceId, personId, role: 'observer' });
    return { params: { id: conferenceId, personId } };
  },
  'a newcomer to the conference': async (scene) => ({ params: { id: scene.world.conferenceId, personId: (await newcomer(scene)).id } }),
  'a unit': async ({ test }) => {
    const { manager } = test.dataSource;
    const unit = await manager.save(manager.create(Unit, { name: `Unit ${randomUUID()}`, contactEmail: null }));
    return { params: { id: unit.id } };
  },
  'a failed mail': async ({ test }) => {
    const { manager } = test.dataSource;
    const mail = manager.create(OutboxMail, {
      ...{ purpose: `test:${randomUUID()}`, personId: null, recipient: 'nobody@kerfside.example', template: 'rating-due' },
      ...{ data: {}, state: 'failed' as const, nextAttemptAt: new Date(), messageId: `<${randomUUID()}@kerfside.example>` },
    });
    return { params: { id: String((await manager.save(mail)).id) } };
  },
  'the conference': async ({ world }) => ({ params: { id: world.conferenceId, conferenceId: world.conferenceId } }),
  'a draft': caseAt('draft'),
  'a case being checked': caseAt('checking'),
  'an open case': caseAt('open'),
  'a withdrawn case': caseAt('withdrawn'),
  'a case of the other conference': caseAt('open', 'otherConferenceId'),
  'a listed case': async (scene) => ofCase(await heldCase(scene), { number: '2' }),
  'a drafted decision': async (scene) => {
    const { found, decisionId } = await draftedDecision(scene);
    return ofCase(found, { id: decisionId });
  },
  'a decided case': async (scene) => {
    const { found, decisionId } = await decidedCase(scene);
    return ofCase(found, { decisionId });
  },
  'a decided case that another surgeon treats': async (scene) => {
    const { found } = await decidedCase(scene);
    await scene.test.dataSource.manager.update(Case, { id: found.id }, { treatingSurgeonId: scene.world.people.surgeon2.id });
    return ofCase(found);
  },
  'a case with its final decision': async (scene) => {
    const { found } = await decidedCase(scene);
    await as(scene, 'surgeon', 'post', `/api/cases/${found.id}/final-decisions`, { kind: 'as-agreed' });
    return ofCase(found);
  },
  'a picture': async ({ test, world }) => {
    const found = await makeCase(test, world);
    return { params: { id: await addImageRow(test, found.id, world.people.surgeon.id) } };
  },
  'a stored picture': async (scene) => {
    const { id, query } = await storedPicture(scene);
    return { params: { id, size: 'thumb' }, query };
  },
  'a stored picture under a changed address': async (scene) => {
    const { id, query } = await storedPicture(scene);
    const last = query.at(-1) === '0' ? '1' : '0';
    return { params: { id, size: 'thumb' }, query: query.slice(0, -1) + last };
  },
  'a question': async (scene) => ({ params: { id: (await questionOn(scene)).threadId } }),
  'a remark': async (scene) => ({ params: { id: (await questionOn(scene)).remarkId } }),
  'a planned meeting': meetingIn('planned'),
  'a running meeting': meetingIn('running'),
};
