import { AuditEntry } from '../src/audit/entities/audit-entry.entity.js';
import { LiveEvent } from '../src/events/entities/live-event.entity.js';
import { OutboxMail } from '../src/mail/entities/outbox-mail.entity.js';
import { Mention } from '../src/discussions/entities/mention.entity.js';
import { Remark } from '../src/discussions/entities/remark.entity.js';
import { RemarkVersion } from '../src/discussions/entities/remark-version.entity.js';
import { HOSTILE_ADDRESSES, HOSTILE_MARKUP } from './data/hostile-strings.js';
import { addImageRow, makeCaseAt, setStage } from './factories/cases.js';
import { makeWorld, type World, type WorldPerson } from './factories/world.js';
import { queriesOf } from './support/query-count.js';
import { startTestApp, type TestApp } from './support/test-app.js';

let test: TestApp;
let world: World;
let caseId: string;

beforeAll(async () => {
  test = await startTestApp();
  world = await makeWorld(test);
}, 120_000);
afterAll(() => test.close());
beforeEach(async () => {
  caseId = (await makeCaseAt(test, world, 'open')).id;
});

const as = (name: WorldPerson) => world.people[name].auth;
const text = (words: string) => ({ type: 'text', text: words });
const doc = (...inline: object[]) => ({ type: 'doc', content: [{ type: 'paragraph', content: inline }] });
const said = (words: string) => doc(text(words));
const mention = (name: WorldPerson, label = 'Somebody') => ({ type: 'mention', attrs: { id: world.people[name].id, label } });

const begin = (name: WorldPerson, body: object, id = caseId) =>
  test.http().post(`/api/cases/${id}/threads`).set(as(name)).send({ anchorKind: 'case', kind: 'remark', content: said('A thought'), ...body });
const reply = (name: WorldPerson, threadId: string, body: object) => test.http().post(`/api/threads/${threadId}/remarks`).set(as(name)).send(body);
const edit = (name: WorldPerson, id: string, body: object) => test.http().patch(`/api/remarks/${id}`).set(as(name)).send(body);
const remove = (name: WorldPerson, id: string) => test.http().delete(`/api/remarks/${id}`).set(as(name));
const threads = async (name: WorldPerson, id = caseId) => (await test.http().get(`/api/cases/${id}/threads`).set(as(name))).body;
const unread = async (name: WorldPerson) => (await test.http().get('/api/unread').set(as(name))).body;
const mailsOf = (template: string, name: WorldPerson) => test.dataSource.manager.findBy(OutboxMail, { template, recipient: world.people[name].email });

describe('threads', () => {
  it('stand beside the case, a section, a step of the plan or an image', async () => {
    const imageId = await addImageRow(test, caseId, world.people.surgeon.id);
    for (const [anchorKind, anchorRef] of [['case', ''], ['section', 'infection'], ['section', 'images'], ['step', 'step-2'], ['image', imageId]])
      expect((await begin('panellist', { anchorKind, anchorRef })).body).toMatchObject({ anchorKind, anchorRef, remarks: [{ isMine: true }] });
    expect((await threads('observer')).items.map(({ anchorKind }: { anchorKind: string }) => anchorKind)).toEqual(['case', 'section', 'section', 'step', 'image']);
  });

  it('refuse an anchor that the case does not have', async () => {
    const other = (await makeCaseAt(test, world, 'open')).id;
    const othersImage = await addImageRow(test, other, world.people.surgeon.id);
    for (const [anchorKind, anchorRef] of [['case', 'x'], ['section', 'nowhere'], ['section', undefined], ['step', 'step-99'], ['image', othersImage], ['image', 'x']]) {
      const response = await begin('panellist', { anchorKind, anchorRef });
      expect([anchorRef, response.status, response.body.errors?.[0].field]).toEqual([anchorRef, 422, 'anchorRef']);
    }
    expect((await begin('panellist', { anchorKind: 'moon' })).status).toBe(422);
    expect((await threads('panellist')).items).toEqual([]);
  });

  it('are open to every member while the case is out, and to nobody before or after', async () => {
    for (const name of ['surgeon', 'surgeon2', 'panellist', 'chair', 'coordinator', 'observer'] as const) expect([name, (await begin(name, {})).status]).toEqual([name, 201]);
    for (const name of ['outsider', 'admin'] as const) expect([name, (await begin(name, {})).status]).toEqual([name, 404]);
    const threadId = (await threads('chair')).items[0].id;
    const remarkId = (await threads('chair')).items[0].remarks[0].id;
    for (const [response, what] of [
      [await reply('outsider', threadId, { content: said('x') }), 'thread'],
      [await edit('outsider', remarkId, { baseVersion: 1, content: said('x') }), 'remark'],
      [await remove('outsider', remarkId), 'remark'],
      [await test.http().get(`/api/remarks/${remarkId}/versions`).set(as('outsider')), 'remark'],
    ] as const)
      expect([response.status, response.body.detail]).toEqual([404, expect.stringContaining(`no such ${what}`)]);
    for (const stage of ['listed', 'decided', 'final', 'reported'] as const) {
      await setStage(test, caseId, stage);
      expect((await begin('panellist', {})).status).toBe(201);
    }
    await setStage(test, caseId, 'withdrawn');
    expect((await begin('surgeon', {})).status).toBe(409);
    await setStage(test, caseId, 'draft');
    expect((await begin('surgeon', {})).status).toBe(409);
    expect((await begin('panellist', {})).status).toBe(404);
  });

  it('hold replies, also to one remark, of the same thread only', async () => {
    const first = (await begin('panellist', {})).body;
    const second = (await begin('panellist', {})).body;
    const answer = await reply('chair', first.id, { content: said('Agreed'), replyToId: first.remarks[0].id });
    expect([answer.status, answer.body.replyToId]).toEqual([201, first.remarks[0].id]);
    expect((await reply('chair', second.id, { content: said('x'), replyToId: first.remarks[0].id })).body.errors[0].field).toBe('replyToId');
    expect((await threads('surgeon')).items.map(({ remarks }: { remarks: unknown[] }) => remarks.length)).toEqual([2, 1]);
  });
});

describe('questions to the presenter', () => {
  it('stay open until answered by the presenter, who is told by mail once', async () => {
    const before = (await mailsOf('question-asked', 'surgeon')).length;
    const question = (await begin('panellist', { kind: 'question', content: doc(text('Which driver? '), mention('surgeon')) })).body;
    expect(question.answeredAt).toBeNull();
    expect(await mailsOf('question-asked', 'surgeon')).toHaveLength(before + 1);
    expect((await mailsOf('mention', 'surgeon')).filter(({ purpose }) => purpose.includes(question.remarks[0].id))).toEqual([]);
    const listed = async () => (await test.http().get('/api/cases?limit=100').set(as('chair'))).body.items.find(({ id }: { id: string }) => id === caseId).openQuestions;
    expect(await listed()).toBe(1);
    expect((await reply('chair', question.id, { content: said('Hex'), answers: true })).status).toBe(403);
    await reply('chair', question.id, { content: said('Perhaps hex') });
    expect(await listed()).toBe(1);
    expect((await reply('surgeon', question.id, { content: said('Hex 3.5'), answers: true })).status).toBe(201);
    expect(await listed()).toBe(0);
    expect((await threads('chair')).items[0].answeredAt).not.toBeNull();
  });

  it('are said to be answered, or open again, by the presenter or who asked', async () => {
    const question = (await begin('panellist', { kind: 'question' })).body;
    const set = (name: WorldPerson, answered: unknown) => test.http().put(`/api/threads/${question.id}/answered`).set(as(name)).send({ answered });
    expect((await set('chair', true)).status).toBe(403);
    expect((await set('outsider', true)).status).toBe(404);
    expect((await set('panellist', 'yes')).status).toBe(422);
    expect((await set('panellist', true)).body.answeredAt).not.toBeNull();
    expect((await set('surgeon', false)).body.answeredAt).toBeNull();
    const remark = (await begin('panellist', {})).body;
    expect((await test.http().put(`/api/threads/${remark.id}/answered`).set(as('panellist')).send({ answered: true })).status).toBe(422);
  });

  it('are not asked by the presenter, and close when their words are deleted', async () => {
    expect((await begin('surgeon', { kind: 'question' })).body.errors[0].field).toBe('kind');
    const question = (await begin('panellist', { kind: 'question' })).body;
    await remove('panellist', question.remarks[0].id);
    expect((await threads('chair')).items[0].answeredAt).not.toBeNull();
  });
});

describe('mentions', () => {
  it('name members as the server knows them and tell them, once a remark', async () => {
    const count = async () => (await mailsOf('mention', 'microbiology')).length;
    const before = await count();
    const begun = (await begin('panellist', { content: doc(mention('microbiology', '<img src=x onerror=alert(1)>'), text(' what do you think?'), mention('panellist')) })).body;
    const [remark] = begun.remarks;
    expect(remark.content.content[0].content[0].attrs).toEqual({ id: world.people.microbiology.id, label: 'Microbiology Person', mentionSuggestionChar: '@' });
    expect(await count()).toBe(before + 1);
    expect(await mailsOf('mention', 'panellist')).toEqual([]);
    await edit('panellist', remark.id, { baseVersion: 1, content: doc(mention('microbiology'), mention('chair'), text(' please')) });
    expect(await count()).toBe(before + 1);
    expect((await mailsOf('mention', 'chair')).filter(({ purpose }) => purpose.includes(remark.id))).toHaveLength(1);
    expect(await test.dataSource.manager.countBy(Mention, { remarkId: remark.id })).toBe(2);
    expect(JSON.stringify(await test.dataSource.manager.find(OutboxMail))).not.toContain('what do you think');
  });

  it('refuse people who are not members, and take the mention’s words along', async () => {
    for (const name of ['outsider', 'admin'] as const) {
      const response = await begin('panellist', { content: doc(mention(name)) });
      expect([response.status, response.body.errors[0].code]).toEqual([422, 'mention']);
    }
    expect((await threads('panellist')).items).toEqual([]);
  });
});

describe('editing', () => {
  it('is the author’s, keeps what was said before, and refuses an edit on an older version', async () => {
    const [remark] = (await begin('panellist', { content: said('One stage') })).body.remarks;
    for (const name of ['chair', 'coordinator', 'surgeon'] as const) expect((await edit(name, remark.id, { baseVersion: 1, content: said('x') })).status).toBe(403);
    const edited = await edit('panellist', remark.id, { baseVersion: 1, content: said('Two stages') });
    expect(edited.body).toMatchObject({ version: 2, content: said('Two stages') });
    expect(edited.body.editedAt).not.toBeNull();
    const stale = await edit('panellist', remark.id, { baseVersion: 1, content: said('Three stages') });
    expect(stale.body).toMatchObject({ status: 409, type: 'urn:kerfside:problem:stale-version', currentVersion: 2, currentContent: said('Two stages') });
    expect((await edit('panellist', remark.id, { baseVersion: 2, content: said('Two stages') })).body.version).toBe(2);
    const { body } = await test.http().get(`/api/remarks/${remark.id}/versions`).set(as('observer'));
    expect(body.items.map(({ version, content }: { version: number; content: unknown }) => [version, content])).toEqual([
      [1, said('One stage')],
      [2, said('Two stages')],
    ]);
  });

  it('lets one of several simultaneous edits through', async () => {
    const [remark] = (await begin('panellist', {})).body.remarks;
    const edits = await Promise.all([1, 2, 3, 4].map((index) => edit('panellist', remark.id, { baseVersion: 1, content: said(`Version ${index}`) })));
    expect(edits.map(({ status }) => status).sort()).toEqual([200, 409, 409, 409]);
    expect(await test.dataSource.manager.countBy(RemarkVersion, { remarkId: remark.id })).toBe(1);
  });
});

describe('deleting', () => {
  it('leaves a mark and no words anywhere', async () => {
    const begun = (await begin('panellist', { content: said('Unwise words') })).body;
    const [remark] = begun.remarks;
    await edit('panellist', remark.id, { baseVersion: 1, content: said('Other words') });
    await reply('chair', begun.id, { content: said('Answer stays'), replyToId: remark.id });
    for (const name of ['surgeon', 'observer', 'microbiology'] as const) expect((await remove(name, remark.id)).status).toBe(403);
    expect((await remove('panellist', remark.id)).status).toBe(204);
    expect((await remove('panellist', remark.id)).status).toBe(204);
    const [thread] = (await threads('surgeon')).items;
    expect(thread.remarks[0]).toMatchObject({ id: remark.id, content: null, isNew: false, author: { id: world.people.panellist.id } });
    expect(thread.remarks[0].deletedAt).not.toBeNull();
    expect(thread.remarks[1].content).toEqual(said('Answer stays'));
    expect((await test.http().get(`/api/remarks/${remark.id}/versions`).set(as('chair'))).body.items).toEqual([]);
    const kept = JSON.stringify([await test.dataSource.manager.findBy(Remark, { caseId }), await test.dataSource.manager.findBy(RemarkVersion, { remarkId: remark.id })]);
    expect(kept).not.toMatch(/Unwise|Other words/);
    expect((await edit('panellist', remark.id, { baseVersion: 2, content: said('Back') })).status).toBe(409);
  });

  it.each(['chair', 'coordinator'] as const)('is open to the %s for what others said', async (name) => {
    const [remark] = (await begin('panellist', {})).body.remarks;
    expect((await remove(name, remark.id)).status).toBe(204);
    const entries = await test.dataSource.manager.findBy(AuditEntry, { recordId: remark.id, action: 'remark.delete' });
    expect(entries).toEqual([expect.objectContaining({ personId: world.people[name].id, details: { own: false } })]);
  });
});

describe('what is new', () => {
  it('is counted for each reader by case, without the own and the deleted, until it is read', async () => {
    const ofCase = async (name: WorldPerson) => (await unread(name)).items.find((item: { caseId: string }) => item.caseId === caseId)?.count ?? 0;
    const begun = (await begin('panellist', {})).body;
    await reply('chair', begun.id, { content: said('Second') });
    const third = (await reply('chair', begun.id, { content: said('Third') })).body;
    expect([await ofCase('surgeon'), await ofCase('chair'), await ofCase('panellist'), await ofCase('outsider')]).toEqual([3, 1, 2, 0]);
    await remove('chair', third.id);
    expect(await ofCase('surgeon')).toBe(2);
    expect((await threads('surgeon')).unread).toBe(2);
    expect((await test.http().get(`/api/cases/${caseId}`).set(as('surgeon'))).body.unread).toBe(2);
    expect((await test.http().put(`/api/cases/${caseId}/read`).set(as('surgeon'))).status).toBe(204);
    expect([await ofCase('surgeon'), await ofCase('panellist')]).toEqual([0, 1]);
    await reply('panellist', begun.id, { content: said('Fourth') });
    expect(await ofCase('surgeon')).toBe(1);
    expect((await threads('surgeon')).items[0].remarks.map(({ isNew }: { isNew: boolean }) => isNew)).toEqual([false, false, false, true]);
    expect((await test.http().put(`/api/cases/${caseId}/read`).set(as('outsider'))).status).toBe(404);
  });

  it('does not count cases that one may not see any more', async () => {
    await begin('panellist', {});
    const before = (await unread('observer')).total;
    await setStage(test, caseId, 'withdrawn');
    expect((await unread('observer')).total).toBe(before - 1);
  });

  it('is marked read where nothing was said yet', async () => {
    expect((await test.http().put(`/api/cases/${caseId}/read`).set(as('surgeon'))).status).toBe(204);
    await begin('panellist', {});
    expect((await threads('surgeon')).unread).toBe(1);
  });

  it('is announced to open pages by ids only', async () => {
    await begin('panellist', { content: said('Only on the page') });
    const events = await test.dataSource.manager.findBy(LiveEvent, { caseId, kind: 'remarks-changed' });
    expect(events).toEqual([expect.objectContaining({ conferenceId: world.conferenceId, actorId: world.people.panellist.id })]);
    const entries = await test.dataSource.manager.findBy(AuditEntry, { caseId, action: 'remark.write' });
    expect(JSON.stringify([events, entries])).not.toContain('Only on the page');
  });
});

describe('hostile content', () => {
  it('comes back as the text it is', async () => {
    const content = { type: 'doc', content: HOSTILE_MARKUP.map((words) => ({ type: 'paragraph', content: [text(words)] })) };
    const response = await begin('panellist', { content });
    expect(response.status).toBe(201);
    const list = await test.http().get(`/api/cases/${caseId}/threads`).set(as('surgeon'));
    expect(list.headers['content-type']).toContain('application/json');
    expect(list.headers['x-content-type-options']).toBe('nosniff');
    expect(list.body.items[0].remarks[0].content).toEqual(content);
  });

  it('is refused as an address, a node or an attribute, by its path, and nothing is written', async () => {
    for (const href of HOSTILE_ADDRESSES) {
      const response = await begin('panellist', { content: doc({ ...text('x'), marks: [{ type: 'link', attrs: { href } }] }) });
      expect([href, response.status, response.body.errors?.[0].field]).toEqual([href, 422, 'content.content[0].content[0].marks[0].attrs.href']);
    }
    const [remark] = (await begin('panellist', {})).body.remarks;
    for (const content of [
      { type: 'doc', content: [{ type: 'image', attrs: { src: 'x', onerror: 'alert(1)' } }] },
      { type: 'doc', content: [{ type: 'paragraph', attrs: { style: 'position:fixed' }, content: [text('x')] }] },
      { type: 'doc', content: [] },
      [],
      'text',
      null,
      {},
    ]) {
      expect((await begin('panellist', { content })).status).toBe(422);
      expect((await reply('panellist', remark.threadId, { content })).status).toBe(422);
      expect((await edit('panellist', remark.id, { baseVersion: 1, content })).status).toBe(422);
    }
    expect((await threads('panellist')).items.map(({ remarks }: { remarks: unknown[] }) => remarks.length)).toEqual([1]);
  });

  it('nested without end is refused, not a server’s error', async () => {
    for (const levels of [45, 30_000]) {
      const body = `{"anchorKind":"case","kind":"remark","content":${'{"type":"blockquote","content":['.repeat(levels)}${']}'.repeat(levels)}}`;
      const response = await test.http().post(`/api/cases/${caseId}/threads`).set(as('panellist')).set('Content-Type', 'application/json').send(body);
      expect([levels, response.status < 500 && response.status >= 400]).toEqual([levels, true]);
    }
  });

  // a valid check digit: 943 476 5919 is the number that NHS England's data dictionary gives as its example
  it.each(['Ask patient@ward.example about it', 'NHS number 943 476 5919'])('that surely names a patient is refused with the remedy: %s', async (words) => {
    const response = await begin('panellist', { content: said(words) });
    expect([response.status, response.body.errors[0]]).toEqual([422, expect.objectContaining({ field: 'content', code: 'identifier' })]);
    expect(response.body.errors[0].message).toContain('Take it out');
  });
});

it('asks a fixed number of queries for the threads of a case', async () => {
  const few = await queriesOf(test, () => threads('surgeon'));
  const { id } = (await begin('panellist', {})).body;
  for (let index = 0; index < 5; index++) await reply(index % 2 ? 'chair' : 'microbiology', id, { content: said(`Reply ${index}`) });
  for (let index = 0; index < 5; index++) await begin('observer', {});
  const many = await queriesOf(test, () => threads('surgeon'));
  expect(many.result.items).toHaveLength(6);
  expect(many.queries.length).toBe(few.queries.length);
});
