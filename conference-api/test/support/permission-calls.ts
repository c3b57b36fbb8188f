import { randomBytes } from 'node:crypto';
import sharp from 'sharp';
import { OPTIONS } from '../factories/case-rows.js';
import { PASSWORD } from '../factories/world.js';
import { type Scene, type Subject, paragraph } from './permission-subjects.js';

const letters = () => [...randomBytes(6)].map((byte) => String.fromCharCode(65 + (byte % 26))).join('');
const soon = () => new Date(Date.now() + 86_400_000 * (30 + randomBytes(1)[0]!) + randomBytes(2).readUInt16BE() * 60_000).toISOString();

/** Well-formed bodies. A base version far ahead makes a call stale (409), which is past every permission and changes nothing. */
const STALE = 999;
const BODIES: Record<string, (scene: Scene) => object> = {
  'POST /api/auth/password-reset': () => ({ email: `${letters()}@kerfside.example` }),
  'POST /api/auth/password-reset/confirm': () => ({ password: 'eleven plums on a tin tray' }),
  'POST /api/auth/invitations/:token/accept': () => ({ name: 'New Comer', password: 'eleven plums on a tin tray' }),
  'POST /api/auth/password': () => ({ current: 'not the present password', next: 'eleven plums on a tin tray' }),
  'POST /api/calculators/:name': () => ({ successes: 3, n: 10 }),
  'POST /api/people/invitations': ({ world }) => ({
    ...{ email: `${letters()}@kerfside.example`, name: 'New Comer', discipline: 'pharmacy', unitId: world.unitId },
    memberships: [{ conferenceId: world.conferenceId, role: 'observer' }],
  }),
  'PATCH /api/people/:id': () => ({ name: 'New Name' }),
  'POST /api/units': () => ({ name: `Unit ${letters()}` }),
  'PATCH /api/units/:id': () => ({ name: `Unit ${letters()}` }),
  'POST /api/mail/:id/drop': () => ({ reason: 'Not needed any more' }),
  'POST /api/conferences': () => ({ name: `Conference ${letters()}`, code: letters() }),
  'PATCH /api/conferences/:id': () => ({ baseVersion: STALE, slotMinutes: 45 }),
  'PUT /api/conferences/:id/members/:personId': () => ({ role: 'observer' }),
  'POST /api/cases': ({ world }) => ({ conferenceId: world.conferenceId }),
  'PATCH /api/cases/:id': () => ({ baseVersion: STALE, changes: {} }),
  'POST /api/cases/:id/post': () => ({ baseVersion: STALE }),
  'POST /api/cases/:id/release': () => ({ baseVersion: 1 }),
  'POST /api/cases/:id/return': () => ({ remark: 'A name is left in the history.' }),
  'POST /api/cases/:id/withdraw': () => ({ reason: 'The operation was done elsewhere.' }),
  'PATCH /api/images/:id': () => ({ caption: 'After the fall' }),
  'POST /api/cases/:caseId/threads': () => ({ anchorKind: 'case', kind: 'remark', content: paragraph('A remark.') }),
  'POST /api/threads/:id/remarks': () => ({ content: paragraph('A reply.') }),
  'PUT /api/threads/:id/answered': () => ({ answered: true }),
  'PATCH /api/remarks/:id': () => ({ baseVersion: 1, content: paragraph('In other words.') }),
  'PUT /api/cases/:caseId/rounds/:number/rating': () => ({ ratings: OPTIONS.map(({ id }) => ({ optionId: id, value: 5 })) }),
  'POST /api/conferences/:conferenceId/meetings': () => ({ startsAt: soon(), minutes: 30 }),
  'PATCH /api/meetings/:id': () => ({ baseVersion: STALE, startsAt: soon(), minutes: 30 }),
  'POST /api/meetings/:id/cancel': () => ({ reason: 'Nobody is there.' }),
  'PUT /api/meetings/:id/agenda': () => ({ baseVersion: STALE, items: [] }),
  'POST /api/meetings/:id/agenda/send': () => ({ baseVersion: STALE }),
  'PUT /api/meetings/:id/attendance/:personId': () => ({ state: 'present' }),
  'POST /api/meetings/:id/items/:itemId/defer': () => ({ reason: 'No radiograph yet.' }),
  'PUT /api/cases/:caseId/decision': () => ({ chosenOptionId: 'remove', text: 'Remove it.', dissent: [] }),
  'POST /api/cases/:caseId/decision/sign': () => ({ baseRevision: 1, password: PASSWORD }),
  'POST /api/decisions/:id/amend': () => ({ reason: 'The side was written wrongly.' }),
  'POST /api/cases/:caseId/final-decisions': () => ({ kind: 'as-agreed' }),
  'POST /api/cases/:caseId/outcomes': () => ({ steps: [], boneLostHours: [] }),
};

/** Does the call, and says only its status: the body is let go, for an event stream has no end. */
export async function statusOf(scene: Scene, route: string, { params = {}, query = '', headers = {}, body = {} }: Subject): Promise<number> {
  const [method, path] = route.split(' ') as [string, string];
  const filled = path.replace(/:(\w+)/g, (_, name: string) => {
    // a decision's routes are about the decision, where the subject is a case that has one
    const value = path.startsWith('/api/decisions/') && name === 'id' ? (params['decisionId'] ?? params['id']) : params[name];
    if (!value) throw new Error(`${route}: the subject gives no ${name}`);
    return value;
  });
  const auth = scene.who ? scene.world.people[scene.who].auth : {};
  const answer = await fetch(`${scene.test.url}${filled}${query}`, { method, ...(await contentOf(scene, route, body, { ...auth, ...headers })) });
  await answer.body?.cancel();
  return answer.status;
}

async function contentOf(scene: Scene, route: string, body: object, headers: Record<string, string>): Promise<RequestInit> {
  if (route === 'POST /api/cases/:caseId/images') {
    const form = new FormData();
    const picture = await sharp({ create: { width: 48, height: 48, channels: 3, background: '#556677' } }).png().toBuffer();
    form.set('file', new Blob([new Uint8Array(picture)], { type: 'image/png' }), 'shell.png');
    return { headers, body: form };
  }
  if (route.startsWith('GET ')) return { headers };
  return { headers: { ...headers, 'Content-Type': 'application/json' }, body: JSON.stringify({ ...BODIES[route]?.(scene), ...body }) };
}
