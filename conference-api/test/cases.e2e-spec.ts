import { OutboxMail } from '../src/mail/entities/outbox-mail.entity.js';
import { AuditEntry } from '../src/audit/entities/audit-entry.entity.js';
import { AgendaItem } from '../src/meetings/entities/agenda-item.entity.js';
import { Meeting } from '../src/meetings/entities/meeting.entity.js';
import { RatingRound } from '../src/ratings/entities/rating-round.entity.js';
import { addImageRow, makeCaseAt, makeDraft, makeMeeting, readyContent, setStage } from './factories/cases.js';
import { makeWorld, type World, type WorldPerson } from './factories/world.js';
import { startTestApp, type TestApp } from './support/test-app.js';

let test: TestApp;
let world: World;

beforeAll(async () => {
  test = await startTestApp();
  world = await makeWorld(test);
}, 120_000);
afterAll(() => test.close());

const as = (name: WorldPerson) => world.people[name].auth;
const get = (name: WorldPerson, path: string) => test.http().get(`/api${path}`).set(as(name));
const post = (name: WorldPerson, path: string, body: object) => test.http().post(`/api${path}`).set(as(name)).send(body);
const patch = (name: WorldPerson, path: string, body: object) => test.http().patch(`/api${path}`).set(as(name)).send(body);

describe('a draft', () => {
  it('is begun by a surgeon, with the next code of the conference, each code once', async () => {
    const begun = await Promise.all(Array.from({ length: 6 }, () => post('surgeon', '/cases', { conferenceId: world.conferenceId, title: 'Draft', side: 'right' })));
    expect(begun.map(({ status }) => status)).toEqual([201, 201, 201, 201, 201, 201]);
    const codes = begun.map(({ body }) => body.code);
    expect(new Set(codes).size).toBe(6);
    expect(codes.every((code) => /^HIP-\d{4}$/.test(code))).toBe(true);
    const [{ body }] = begun as [(typeof begun)[0]];
    expect(body).toMatchObject({ stage: 'draft', version: 1, images: [], meeting: null, unread: 0, content: { heading: { title: 'Draft', side: 'right' } } });
    expect(body.actions).toMatchObject({ edit: true, editOptions: true, post: true, withdraw: true, comment: false, rate: false, check: false, addImages: true });
  });

  it('leaves the version of the conference’s settings alone', async () => {
    const before = await test.dataSource.query('SELECT version FROM conferences WHERE id = ?', [world.conferenceId]);
    await makeDraft(test, world);
    expect(await test.dataSource.query('SELECT version FROM conferences WHERE id = ?', [world.conferenceId])).toEqual(before);
  });

  it('is begun by surgeons of that conference only', async () => {
    for (const name of ['panellist', 'chair', 'coordinator', 'observer'] as const)
      expect((await post(name, '/cases', { conferenceId: world.conferenceId })).status).toBe(403);
    expect((await post('outsider', '/cases', { conferenceId: world.conferenceId })).status).toBe(404);
  });

  it('is not there for anyone but its presenter', async () => {
    const { id } = await makeDraft(test, world);
    for (const name of ['surgeon2', 'panellist', 'chair', 'coordinator', 'observer', 'outsider'] as const)
      for (const path of ['', '/readiness', '/identifiers', '/versions', '/threads', '/images'])
        expect([name, path, (await get(name, `/cases/${id}${path}`)).status]).toEqual([name, path, 404]);
    expect((await patch('surgeon2', `/cases/${id}`, { baseVersion: 1, changes: {} })).status).toBe(404);
    expect((await get('surgeon', `/cases/${id}`)).status).toBe(200);
    expect((await get('surgeon', '/cases/not-an-id')).status).toBeLessThan(500);
  });
});

describe('saving', () => {
  it('replaces the sections sent, keeps the others and raises the version', async () => {
    const { id } = await makeDraft(test, world);
    const first = await patch('surgeon', `/cases/${id}`, { baseVersion: 1, changes: { heading: { title: 'A', side: 'left' }, bone: { migrationMm: 4.5 } } });
    expect([first.status, first.body.version]).toEqual([200, 2]);
    const second = await patch('surgeon', `/cases/${id}`, { baseVersion: 2, changes: { heading: { title: 'B', joint: 'knee', urgency: 'soon' } } });
    expect(second.body.version).toBe(3);
    const { body } = await get('surgeon', `/cases/${id}`);
    expect(body.content.heading).toEqual({ title: 'B', joint: 'knee', urgency: 'soon' });
    expect(body.content.bone).toEqual({ migrationMm: 4.5 });
    const [listed] = (await get('surgeon', '/cases?mine=true&limit=1')).body.items;
    expect(listed).toMatchObject({ id, title: 'B', joint: 'knee', urgency: 'soon', side: null });
  });

  it('keeps the version where nothing changes', async () => {
    const draft = await makeDraft(test, world, world.people.surgeon, { heading: { title: 'Same', side: 'left' } });
    const again = await patch('surgeon', `/cases/${draft.id}`, { baseVersion: draft.version, changes: { heading: { side: 'left', title: 'Same' }, patient: {} } });
    expect([again.status, again.body.version]).toEqual([200, draft.version]);
    expect((await patch('surgeon', `/cases/${draft.id}`, { baseVersion: draft.version })).body.version).toBe(draft.version);
  });

  it('refuses the second of two windows and tells what the first one changed', async () => {
    const draft = await makeDraft(test, world, world.people.surgeon, { implants: { parts: [{ id: 'shell-1', part: 'shell', outerDiameterMm: 54 }] } });
    const base = draft.version;
    const first = await patch('surgeon', `/cases/${draft.id}`, { baseVersion: base, changes: { implants: { parts: [{ id: 'shell-1', part: 'shell', outerDiameterMm: 56 }] } } });
    expect(first.status).toBe(200);
    const second = await patch('surgeon', `/cases/${draft.id}`, { baseVersion: base, changes: { implants: { parts: [] }, heading: { title: 'Mine' } } });
    expect(second.status).toBe(409);
    expect(second.headers['content-type']).toContain('application/problem+json');
    expect(second.body).toMatchObject({
      type: 'urn:kerfside:problem:stale-version',
      currentVersion: base + 1,
      currentContent: { implants: { parts: [{ id: 'shell-1', outerDiameterMm: 56 }] } },
      changes: [{ section: 'implants', path: 'parts[shell-1].outerDiameterMm', label: 'Shell, outer diameter', from: '54 mm', to: '56 mm' }],
      by: { id: world.people.surgeon.id },
    });
    expect((await get('surgeon', `/cases/${draft.id}`)).body.content.heading.title).toBe('');
  });

  it('lets exactly one of several simultaneous saves through', async () => {
    const draft = await makeDraft(test, world);
    const saves = await Promise.all(
      Array.from({ length: 8 }, (_, index) => patch('surgeon', `/cases/${draft.id}`, { baseVersion: 1, changes: { heading: { title: `Window ${index}` } } })),
    );
    expect(saves.filter(({ status }) => status === 200)).toHaveLength(1);
    expect(saves.filter(({ status }) => status === 409)).toHaveLength(7);
    const { body } = await get('surgeon', `/cases/${draft.id}`);
    expect(body.version).toBe(2);
    const winner = saves.findIndex(({ status }) => status === 200);
    expect(body.content.heading.title).toBe(`Window ${winner}`);
    expect((await get('surgeon', `/cases/${draft.id}/versions`)).body.items).toHaveLength(2);
  });

  it('keeps ages of 90 and over as one group', async () => {
    const { id } = await makeDraft(test, world, world.people.surgeon, { patient: { ageYears: 97 } });
    expect((await get('surgeon', `/cases/${id}`)).body.content.patient.ageYears).toBe(90);
  });

  it.each([
    ['a wrong type', { patient: { ageYears: '71' } }, 'changes.patient.ageYears'],
    ['an unknown field', { patient: { name: 'X' } }, 'changes.patient.name'],
    ['an unknown section', { secret: {} }, 'changes.secret'],
    ['an unknown word', { bone: { teardrop: 'wobbly' } }, 'changes.bone.teardrop'],
    ['a number out of range', { bone: { inclinationDeg: 91 } }, 'changes.bone.inclinationDeg'],
    ['an id that is there twice', { plan: { steps: [{ id: 's', kind: 'liner', method: 'a' }, { id: 's', kind: 'screws', method: 'b' }] } }, 'changes.plan.steps[1].id'],
    ['a screw that is there twice', { implants: { parts: [{ id: 'p', part: 'shell', screws: [{ id: 'x' }, { id: 'x' }] }] } }, 'changes.implants.parts[0].screws[1].id'],
    ['an hour that is there twice', { plan: { rim: [{ hour: 3 }, { hour: 3 }] } }, 'changes.plan.rim[1].hour'],
    ['too many options', { options: { options: Array.from({ length: 7 }, (_, index) => ({ id: `o${index}`, title: 'T' })) } }, 'changes.options.options'],
    ['a list where an object belongs', { heading: [] }, 'changes.heading'],
    ['a list where an entry belongs', { implants: { parts: [[]] } }, 'changes.implants.parts'],
  ])('refuses %s by its field and writes nothing', async (_what, changes, field) => {
    const draft = await makeDraft(test, world);
    const response = await patch('surgeon', `/cases/${draft.id}`, { baseVersion: 1, changes });
    expect(response.status).toBe(422);
    expect(response.body.errors.map((error: { field: string }) => error.field).join()).toContain(field);
    expect((await get('surgeon', `/cases/${draft.id}`)).body.version).toBe(1);
  });

  it.each([
    ['half a surrogate pair', '\ud800 left'],
    ['a null character', 'a\u0000b'],
    ['an emoji and combining marks', '🦴 e\u0301'],
    ['quotes and backslashes', `'; DROP TABLE cases; -- \\" %_`],
  ])('takes %s as text', async (_what, title) => {
    const draft = await makeDraft(test, world);
    expect((await patch('surgeon', `/cases/${draft.id}`, { baseVersion: 1, changes: { heading: { title } } })).status).toBe(200);
    expect((await get('surgeon', `/cases/${draft.id}`)).body.content.heading.title).toBe(title.replace(/\p{Surrogate}/gu, '\ufffd'));
  });

  it('refuses bodies that are too large or nested without end, never with a 500', async () => {
    const draft = await makeDraft(test, world);
    const large = await patch('surgeon', `/cases/${draft.id}`, { baseVersion: 1, changes: { heading: { title: 'x'.repeat(2_000_000) } } });
    expect(large.status).toBe(413);
    const nested = await test
      .http()
      .patch(`/api/cases/${draft.id}`)
      .set(as('surgeon'))
      .set('Content-Type', 'application/json')
      .send(`{"baseVersion":1,"changes":{"heading":${'{"title":'.repeat(90_000)}1${'}'.repeat(90_000)}}}`);
    expect(nested.status).toBeGreaterThanOrEqual(400);
    expect(nested.status).toBeLessThan(500);
  });
});

describe('readiness', () => {
  it('names what is missing, and blocks posting by section', async () => {
    const draft = await makeDraft(test, world);
    const { body } = await get('surgeon', `/cases/${draft.id}/readiness`);
    expect(body.canBePosted).toBe(false);
    const missing = body.items.filter((item: { done: boolean; weight: string }) => !item.done && item.weight === 'blocks-posting').map((item: { id: string }) => item.id);
    expect(missing).toEqual(expect.arrayContaining(['title', 'question', 'side', 'implants', 'ap-film', 'options', 'proposal', 'reason']));
    const posted = await post('surgeon', `/cases/${draft.id}/post`, { baseVersion: 1 });
    expect(posted.status).toBe(422);
    expect(posted.body.errors.map((error: { code: string }) => error.code).sort()).toEqual([...missing].sort());
    expect(posted.body.errors.find((error: { code: string }) => error.code === 'ap-film')).toMatchObject({ field: 'images' });
  });

  it('is complete for a case that has everything', async () => {
    const draft = await makeCaseAt(test, world, 'draft');
    const { body } = await get('surgeon', `/cases/${draft.id}/readiness`);
    expect(body.items.filter((item: { done: boolean; weight: string }) => !item.done && item.weight !== 'advice')).toEqual([]);
    expect([body.canBePosted, body.canBeListed]).toEqual([true, true]);
  });

  it('keeps a case with a sure identifier from being posted, and shows where it stands', async () => {
    const content = readyContent();
    content.history.course = 'Write to jane.doe@hospital.example about it';
    const draft = await makeCaseAt(test, world, 'draft', { changes: { history: content.history } });
    const posted = await post('surgeon', `/cases/${draft.id}/post`, { baseVersion: draft.version });
    expect(posted.status).toBe(422);
    expect(posted.body.errors).toEqual([expect.objectContaining({ field: 'history', code: 'identifiers' })]);
    const { body } = await get('surgeon', `/cases/${draft.id}/identifiers`);
    expect(body.items).toContainEqual(expect.objectContaining({ section: 'history', path: 'course', label: 'Course', kind: 'email', text: 'jane.doe@hospital.example', strength: 'certain' }));
  });
});

describe('the check by a second person', () => {
  it('goes from posting to release: frozen, seen by coordinators only, opened with the options as they are', async () => {
    const found = await makeCaseAt(test, world, 'checking');
    expect((await get('coordinator', `/cases/${found.id}`)).body.actions).toMatchObject({ check: true, edit: false, comment: false });
    expect((await get('coordinator', `/cases/${found.id}/identifiers`)).status).toBe(200);
    for (const name of ['chair', 'panellist', 'surgeon2', 'observer', 'outsider'] as const) expect((await get(name, `/cases/${found.id}`)).status).toBe(404);
    expect((await patch('surgeon', `/cases/${found.id}`, { baseVersion: found.version, changes: { heading: { title: 'Late' } } })).status).toBe(409);
    expect((await post('surgeon', `/cases/${found.id}/release`, { baseVersion: found.version })).status).toBe(403);
    expect((await post('coordinator', `/cases/${found.id}/release`, { baseVersion: found.version - 1 })).body.type).toBe('urn:kerfside:problem:stale-version');
    const released = await post('coordinator', `/cases/${found.id}/release`, { baseVersion: found.version });
    expect([released.status, released.body.stage]).toEqual([200, 'open']);
    expect((await post('coordinator', `/cases/${found.id}/release`, { baseVersion: found.version })).status).toBe(409);
    const rounds = await test.dataSource.manager.findBy(RatingRound, { caseId: found.id });
    expect(rounds).toHaveLength(1);
    expect(rounds[0]).toMatchObject({ number: 1, caseVersion: found.version, closedAt: null });
    expect(rounds[0]!.options.map(({ id }) => id)).toEqual(['one-stage', 'two-stage', 'wait']);
    expect((await get('panellist', `/cases/${found.id}`)).body.actions).toMatchObject({ rate: true, comment: true, edit: false });
    expect((await get('observer', `/cases/${found.id}`)).body.actions).toMatchObject({ rate: false, comment: true });
  });

  it('tells the presenter and those who may rate, without anything clinical', async () => {
    const found = await makeCaseAt(test, world, 'open');
    const mails = (await test.dataSource.manager.find(OutboxMail)).filter((mail) => mail.purpose.includes(found.id));
    const to = (template: string) => mails.filter((mail) => mail.template === template).map((mail) => mail.recipient).sort();
    expect(to('case-released')).toEqual([world.people.surgeon.email]);
    expect(to('rating-due')).toEqual([world.people.surgeon2, world.people.panellist, world.people.microbiology, world.people.chair].map(({ email }) => email).sort());
    expect(JSON.stringify(mails)).not.toContain('Loose shell');
  });

  it('lets one of two coordinators’ clicks through', async () => {
    const found = await makeCaseAt(test, world, 'checking');
    const both = await Promise.all([1, 2].map(() => post('coordinator', `/cases/${found.id}/release`, { baseVersion: found.version })));
    expect(both.map(({ status }) => status).sort()).toEqual([200, 409]);
    expect(await test.dataSource.manager.countBy(RatingRound, { caseId: found.id })).toBe(1);
  });

  it('returns it with a remark that only the presenter reads; returned again is told again', async () => {
    const found = await makeCaseAt(test, world, 'checking');
    expect((await post('coordinator', `/cases/${found.id}/return`, { remark: '   ' })).status).toBe(422);
    const returned = await post('coordinator', `/cases/${found.id}/return`, { remark: 'A ward is named under course.' });
    expect([returned.status, returned.body]).toEqual([200, { returned: true }]);
    expect((await get('coordinator', `/cases/${found.id}`)).status).toBe(404);
    expect((await get('surgeon', `/cases/${found.id}`)).body).toMatchObject({ stage: 'draft', returnRemark: 'A ward is named under course.' });
    await post('surgeon', `/cases/${found.id}/post`, { baseVersion: found.version });
    await post('coordinator', `/cases/${found.id}/return`, { remark: 'Still there.' });
    const mails = (await test.dataSource.manager.findBy(OutboxMail, { template: 'case-returned' })).filter((mail) => mail.purpose.includes(found.id));
    expect(mails).toHaveLength(2);
    expect(JSON.stringify(mails)).not.toContain('ward');
  });
});

describe('after the release', () => {
  it('lets the presenter amend, but not the options, and keeps sure identifiers out', async () => {
    const found = await makeCaseAt(test, world, 'open');
    const options = { options: [{ id: 'one-stage', title: 'Another title', isProposal: true }, { id: 'two-stage', title: 'Two-stage exchange' }] };
    const refused = await patch('surgeon', `/cases/${found.id}`, { baseVersion: found.version, changes: { options } });
    expect([refused.status, refused.body.type]).toEqual([409, 'urn:kerfside:problem:wrong-stage']);
    const named = await patch('surgeon', `/cases/${found.id}`, { baseVersion: found.version, changes: { history: { course: 'Ask jane.doe@hospital.example' } } });
    expect([named.status, named.body.errors[0].field]).toEqual([422, 'changes.history.course']);
    const amended = await patch('surgeon', `/cases/${found.id}`, { baseVersion: found.version, changes: { infection: { crpMgL: 22 }, options: readyContent().options } });
    expect([amended.status, amended.body.version]).toEqual([200, found.version + 1]);
    expect((await patch('surgeon2', `/cases/${found.id}`, { baseVersion: found.version + 1, changes: {} })).status).toBe(403);
    expect((await patch('chair', `/cases/${found.id}`, { baseVersion: found.version + 1, changes: {} })).status).toBe(403);
  });

  it.each(['decided', 'final', 'reported'] as const)('is not edited or withdrawn any more at the stage %s', async (stage) => {
    const found = await makeCaseAt(test, world, 'open');
    await setStage(test, found.id, stage);
    expect((await patch('surgeon', `/cases/${found.id}`, { baseVersion: found.version, changes: { bone: { note: 'x' } } })).status).toBe(409);
    expect((await post('surgeon', `/cases/${found.id}/withdraw`, { reason: 'x' })).status).toBe(409);
  });
});

describe('withdrawing', () => {
  it('needs a reason, takes the case off the coming agenda, ends its round and hides it', async () => {
    const found = await makeCaseAt(test, world, 'open');
    const meetingId = await makeMeeting(test, world, [found.id]);
    expect((await get('panellist', `/cases/${found.id}`)).body.meeting.id).toBe(meetingId);
    expect((await post('surgeon', `/cases/${found.id}/withdraw`, {})).status).toBe(422);
    expect((await post('surgeon2', `/cases/${found.id}/withdraw`, { reason: 'x' })).status).toBe(403);
    const withdrawn = await post('surgeon', `/cases/${found.id}/withdraw`, { reason: 'Operated elsewhere' });
    expect(withdrawn.body).toMatchObject({ stage: 'withdrawn', withdrawnReason: 'Operated elsewhere', meeting: null });
    expect(await test.dataSource.manager.countBy(AgendaItem, { meetingId })).toBe(0);
    expect((await test.dataSource.manager.findOneByOrFail(Meeting, { id: meetingId })).version).toBe(2);
    expect((await test.dataSource.manager.findOneByOrFail(RatingRound, { caseId: found.id })).closedAt).not.toBeNull();
    expect((await get('panellist', `/cases/${found.id}`)).status).toBe(404);
    expect((await get('chair', `/cases/${found.id}`)).status).toBe(200);
  });

  it('waits while its meeting is running', async () => {
    const found = await makeCaseAt(test, world, 'open');
    const meetingId = await makeMeeting(test, world, [found.id]);
    await test.dataSource.manager.update(Meeting, { id: meetingId }, { state: 'running' });
    expect((await post('surgeon', `/cases/${found.id}/withdraw`, { reason: 'x' })).status).toBe(409);
    expect((await get('surgeon', `/cases/${found.id}`)).body.stage).toBe('listed');
  });
});

describe('history', () => {
  it('lists versions with their sections, newest first and paged, and words their differences', async () => {
    const draft = await makeDraft(test, world, world.people.surgeon, { bone: { inclinationDeg: 45 } });
    await patch('surgeon', `/cases/${draft.id}`, { baseVersion: 2, changes: { bone: { inclinationDeg: 60, teardrop: 'absent' }, heading: { title: 'Steep' } } });
    const first = (await get('surgeon', `/cases/${draft.id}/versions?limit=2`)).body;
    expect(first.items.map(({ version, sections }: { version: number; sections: string[] }) => [version, sections])).toEqual([
      [3, ['heading', 'bone']],
      [2, ['bone']],
    ]);
    const second = (await get('surgeon', `/cases/${draft.id}/versions?limit=2&cursor=${first.nextCursor}`)).body;
    expect(second.items.map(({ version }: { version: number }) => version)).toEqual([1]);
    expect(second.nextCursor).toBeNull();
    const { body } = await get('surgeon', `/cases/${draft.id}/versions/3/differences`);
    expect(body).toMatchObject({ from: 2, to: 3 });
    expect(body.differences).toContainEqual({ section: 'bone', path: 'inclinationDeg', label: 'Inclination', from: '45°', to: '60°' });
    expect((await get('surgeon', `/cases/${draft.id}/versions/3/differences?since=1`)).body).toMatchObject({ from: 1, to: 3 });
    expect((await get('surgeon', `/cases/${draft.id}/versions/3/differences?since=x`)).status).toBe(422);
    expect((await get('surgeon', `/cases/${draft.id}/versions/9/differences`)).status).toBe(404);
  });

  it('does not show members what the check took out', async () => {
    const draft = await makeDraft(test, world, world.people.surgeon, { ...readyContent(), history: { ...readyContent().history, course: 'Operated by a Mr Hollowbrook' } });
    await addImageRow(test, draft.id, world.people.surgeon.id);
    const mended = await patch('surgeon', `/cases/${draft.id}`, { baseVersion: draft.version, changes: { history: readyContent().history } });
    await post('surgeon', `/cases/${draft.id}/post`, { baseVersion: mended.body.version });
    await post('coordinator', `/cases/${draft.id}/release`, { baseVersion: mended.body.version });
    const readByPanel = (await get('panellist', `/cases/${draft.id}/versions`)).body.items.map(({ version }: { version: number }) => version);
    expect(readByPanel).toEqual([mended.body.version]);
    expect((await get('panellist', `/cases/${draft.id}/versions/${draft.version}/differences`)).status).toBe(404);
    expect((await get('panellist', `/cases/${draft.id}/versions/${mended.body.version}/differences?since=${draft.version}`)).status).toBe(404);
    const own = await get('panellist', `/cases/${draft.id}/versions/${mended.body.version}/differences`);
    expect(own.body.from).toBe(0);
    expect(own.text).not.toContain('Hollowbrook');
    expect((await get('surgeon', `/cases/${draft.id}/versions/${mended.body.version}/differences`)).text).toContain('Hollowbrook');
  });
});

it('writes down who did what, without clinical text', async () => {
  const found = await makeCaseAt(test, world, 'open');
  await patch('surgeon', `/cases/${found.id}`, { baseVersion: found.version, changes: { bone: { note: 'Very thin medial wall' } } });
  const entries = await test.dataSource.manager.find(AuditEntry, { where: { caseId: found.id }, order: { id: 'ASC' } });
  expect(entries.map(({ action }) => action)).toEqual(['case.create', 'case.save', 'case.post', 'case.release', 'case.save']);
  expect(entries.at(-1)!.details).toEqual({ version: found.version + 1, sections: ['bone'] });
  expect(JSON.stringify(entries)).not.toMatch(/medial wall|Loose shell/);
});
