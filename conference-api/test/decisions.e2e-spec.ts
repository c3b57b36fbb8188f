import { createHash } from 'node:crypto';
import type { Case } from '../src/cases/entities/case.entity.js';
import { Conference } from '../src/conferences/entities/conference.entity.js';
import { canonicalHash } from '../src/decisions/canonical-hash.js';
import { Decision } from '../src/decisions/entities/decision.entity.js';
import { OutboxMail } from '../src/mail/entities/outbox-mail.entity.js';
import { makeCase, makeMeeting, OPTIONS } from './factories/case-rows.js';
import { makeWorld, PASSWORD, type World, type WorldPerson } from './factories/world.js';
import { startTestApp, type TestApp } from './support/test-app.js';

describe('decisions', () => {
  let test: TestApp;
  let world: World;

  beforeAll(async () => {
    test = await startTestApp();
    world = await makeWorld(test);
  });
  afterAll(() => test.close());

  const as = (who: WorldPerson) => world.people[who].auth;
  const write = (caseId: string, body: object, who: WorldPerson = 'chair') =>
    test.http().put(`/api/cases/${caseId}/decision`).set(as(who)).send({ dissent: [], ...body });
  const sign = (caseId: string, baseRevision: number, password = PASSWORD) =>
    test.http().post(`/api/cases/${caseId}/decision/sign`).set(as('chair')).send({ baseRevision, password });
  const rate = (caseId: string, who: WorldPerson, value: number, round: number) =>
    test.http().put(`/api/cases/${caseId}/rounds/${round}/rating`).set(as(who)).send({ ratings: OPTIONS.map(({ id }) => ({ optionId: id, value: id === 'remove' ? value : 3 })) });

  /** A listed case at a running meeting, both rounds held. */
  async function heldCase(): Promise<Case> {
    const found = await makeCase(test, world, { stage: 'listed' });
    await makeMeeting(test, world, { cases: [found], present: ['chair', 'panellist', 'surgeon', 'microbiology'] });
    await rate(found.id, 'panellist', 6, 1);
    await test.http().post(`/api/cases/${found.id}/rounds/2/open`).set(as('chair'));
    await rate(found.id, 'panellist', 8, 2);
    await rate(found.id, 'chair', 9, 2);
    await test.http().post(`/api/cases/${found.id}/rounds/2/close`).set(as('chair'));
    return found;
  }
  async function signedCase() {
    const found = await heldCase();
    await write(found.id, { chosenOptionId: 'remove', text: 'Remove the shell with curved blades.' });
    const { body } = await sign(found.id, 1);
    return { found, decision: body };
  }

  it('begins the draft with the option the panel rated highest', async () => {
    const found = await heldCase();
    const { body } = await write(found.id, { text: 'Remove it.' });
    expect(body).toMatchObject({ state: 'draft', revision: 1, content: { chosenOptionId: 'remove' } });
    expect(body.rounds.map((round: { figures: { n: number }[] }) => round.figures[0]!.n)).toEqual([1, 2]);
  });

  it('refuses an edit made on an older draft, and says what stands there', async () => {
    const found = await heldCase();
    await write(found.id, { chosenOptionId: 'remove', text: 'One' });
    await write(found.id, { chosenOptionId: 'remove', text: 'Two', baseRevision: 1 });
    const { status, body } = await write(found.id, { chosenOptionId: 'remove', text: 'Three', baseRevision: 1 });
    expect(status).toBe(409);
    expect(body).toMatchObject({ type: 'urn:kerfside:problem:stale-version', currentRevision: 2, current: { text: 'Two' } });
  });

  it('signs with the password, moves the case on and tells all members', async () => {
    const found = await heldCase();
    await write(found.id, {
      chosenOptionId: 'remove',
      text: 'Remove the shell with curved blades.',
      dissent: [{ personId: world.people.microbiology.id, words: 'I would wait for cultures.' }],
    });
    const wrong = await sign(found.id, 1, 'not the password at all');
    expect([wrong.status, wrong.body.errors[0].field]).toEqual([422, 'password']);
    const { status, body } = await sign(found.id, 1);
    expect(status).toBe(200);
    expect(body).toMatchObject({ state: 'signed', kind: 'decision', chosenOptionTitle: OPTIONS[1]!.title });
    const { body: shown } = await test.http().get(`/api/cases/${found.id}`).set(as('observer'));
    expect(shown.stage).toBe('decided');
    const mails = await test.dataSource.manager.find(OutboxMail, { where: { template: 'decision-signed' } });
    const told = mails.filter((mail) => mail.purpose.startsWith(`decision-signed:${body.id}:`)).map((mail) => mail.recipient);
    const members: WorldPerson[] = ['surgeon', 'surgeon2', 'panellist', 'microbiology', 'chair', 'coordinator', 'observer'];
    expect(told.sort()).toEqual(members.map((who) => world.people[who].email).sort());
    expect(JSON.stringify(mails.map((mail) => mail.data))).not.toMatch(/blades|vertical|shell/i);
  });

  it('refuses to sign while the second round is open, or without text', async () => {
    const found = await makeCase(test, world, { stage: 'listed' });
    await makeMeeting(test, world, { cases: [found], present: ['chair', 'panellist'] });
    await write(found.id, { chosenOptionId: 'remove', text: '' });
    expect((await sign(found.id, 1)).body.errors[0].field).toBe('text');
    await write(found.id, { chosenOptionId: 'remove', text: 'Remove it.', baseRevision: 1 });
    expect((await sign(found.id, 2)).status).toBe(409);
    await test.http().post(`/api/cases/${found.id}/rounds/2/open`).set(as('chair'));
    expect((await sign(found.id, 2)).status).toBe(409);
  });

  it('gives one signature where two windows sign at once', async () => {
    const found = await heldCase();
    await write(found.id, { chosenOptionId: 'remove', text: 'Remove it.' });
    const answers = await Promise.all([sign(found.id, 1), sign(found.id, 1), sign(found.id, 1)]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409, 409]);
    expect(await test.dataSource.manager.countBy(Decision, { caseId: found.id })).toBe(1);
  });

  it('numbers decisions of one conference without gaps where cases are signed at once', async () => {
    const cases = await Promise.all([heldCase(), heldCase(), heldCase()]);
    for (const found of cases) await write(found.id, { chosenOptionId: 'remove', text: 'Remove it.' });
    await Promise.all(cases.map((found) => sign(found.id, 1)));
    const numbers = (await test.dataSource.manager.find(Decision, { where: { conferenceId: world.conferenceId } }))
      .map((decision) => decision.number)
      .filter((number) => number !== null)
      .sort((a, b) => a - b);
    expect(numbers).toEqual(numbers.map((_, index) => index + 1));
  });

  it('is advice where the quorum was not met', async () => {
    const found = await makeCase(test, world, { stage: 'listed' });
    await makeMeeting(test, world, { cases: [found], present: ['chair'] });
    await test.http().post(`/api/cases/${found.id}/rounds/2/open`).set(as('chair'));
    await test.http().post(`/api/cases/${found.id}/rounds/2/close`).set(as('chair'));
    await write(found.id, { chosenOptionId: 'remove', text: 'Remove it.' });
    const { body } = await sign(found.id, 1);
    expect(body).toMatchObject({ kind: 'advice', quorumMissing: ['1 more member who rate'] });
  });

  it('takes a dissent only of somebody who was there', async () => {
    const found = await heldCase();
    const { status, body } = await write(found.id, { text: 'x', dissent: [{ personId: world.people.surgeon2.id, words: 'No.' }] });
    expect([status, body.errors[0].field]).toEqual([422, 'dissent']);
  });

  it('changes no signed decision through any route, nor by SQL', async () => {
    const { found, decision } = await signedCase();
    expect((await write(found.id, { text: 'Something else', baseRevision: 1 })).status).toBe(409);
    expect((await sign(found.id, 1)).status).toBe(409);
    await expect(test.dataSource.query('UPDATE decisions SET hash = ? WHERE id = ?', ['0'.repeat(64), decision.id])).rejects.toThrow(/never changed/);
    await expect(test.dataSource.query('DELETE FROM decisions WHERE id = ?', [decision.id])).rejects.toThrow(/never deleted/);
  });

  it('amends by a new version that says why and what it replaces', async () => {
    const { found, decision } = await signedCase();
    expect((await test.http().post(`/api/decisions/${decision.id}/amend`).set(as('panellist')).send({ reason: 'x' })).status).toBe(403);
    const draft = await test.http().post(`/api/decisions/${decision.id}/amend`).set(as('chair')).send({ reason: 'Cultures came back positive.' });
    expect(draft.body).toMatchObject({ version: 2, state: 'draft', replacesNumber: decision.number });
    const again = await test.http().post(`/api/decisions/${decision.id}/amend`).set(as('chair')).send({ reason: 'Twice.' });
    expect(again.status).toBe(409);
    await write(found.id, { chosenOptionId: 'watch', text: 'Wait, treat first.', baseRevision: 1 });
    const { body } = await sign(found.id, 2);
    expect(body).toMatchObject({ state: 'signed', version: 2, amendmentReason: 'Cultures came back positive.', replacesNumber: decision.number });
    const { body: list } = await test.http().get(`/api/cases/${found.id}/decisions`).set(as('observer'));
    expect(list.items.map((item: { replacedByNumber: number | null }) => item.replacedByNumber)).toEqual([null, body.number]);
  });

  it('shows a draft to the chair alone', async () => {
    const found = await heldCase();
    const { body } = await write(found.id, { text: 'Not yet for you.' });
    expect((await test.http().get(`/api/decisions/${body.id}`).set(as('panellist'))).status).toBe(404);
    expect((await test.http().get(`/api/cases/${found.id}/decisions`).set(as('panellist'))).body.items).toEqual([]);
    expect((await test.http().get(`/api/decisions/${body.id}`).set(as('outsider'))).status).toBe(404);
  });

  it('finds a changed byte in the database and names the decision', async () => {
    const { decision } = await signedCase();
    const check = async () => (await test.http().get(`/api/decisions/${decision.id}/check`).set(as('observer'))).body;
    expect(await check()).toMatchObject({ intact: true, faults: [] });
    await test.dataSource.query('DROP TRIGGER signed_decisions_stay');
    await test.dataSource.query('UPDATE decisions SET record = REPLACE(record, ?, ?) WHERE id = ?', ['curved', 'curvet', decision.id]);
    const { intact, faults } = await check();
    expect(intact).toBe(false);
    expect(faults).toEqual([`Decision ${decision.number}: its content does not fit its fingerprint.`]);
    await test.dataSource.query('UPDATE decisions SET record = REPLACE(record, ?, ?) WHERE id = ?', ['curvet', 'curved', decision.id]);
  });

  it('takes the final decision of the treating surgeon, with a reason where it differs', async () => {
    const { found } = await signedCase();
    const final = (body: object, who: WorldPerson = 'surgeon') => test.http().post(`/api/cases/${found.id}/final-decisions`).set(as(who)).send(body);
    expect((await final({ kind: 'as-agreed' }, 'chair')).status).toBe(403);
    expect((await final({ kind: 'as-agreed' }, 'surgeon2')).status).toBe(403);
    expect((await final({ kind: 'with-variation' })).body.errors[0].field).toBe('reason');
    expect((await final({ kind: 'as-agreed', plannedWeek: '2026-W51', patientInformed: true })).status).toBe(201);
    expect((await final({ kind: 'with-variation', reason: 'Longer stem.' })).body.version).toBe(2);
    const outcome = (body: object) => test.http().post(`/api/cases/${found.id}/outcomes`).set(as('surgeon')).send({ steps: [], boneLostHours: [], ...body });
    expect((await outcome({ boneLostHours: [13] })).status).toBe(422);
    expect((await outcome({ minutes: 140, boneLostHours: [6, 5, 6] })).body).toMatchObject({ version: 1, boneLostHours: [5, 6] });
    expect((await outcome({ minutes: 150 })).body.errors[0].field).toBe('amendmentReason');
    expect((await outcome({ minutes: 150, amendmentReason: 'Time was read wrongly.' })).body.version).toBe(2);
  });

  it('hashes the canonical form of RFC 8785', () => {
    // RFC 8785, section 3.2.3, sorting of the property names; section 3.2.2 for numbers and strings
    const input = { numbers: [333333333.33333329, 1e30, 4.5, 2e-3, 0.000000000000000000000000001], string: '\u20ac$\u000F\u000aA\'\u0042\u0022\u005c\\"/', literals: [null, true, false] };
    const printed = '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}';
    expect(canonicalHash(input)).toBe(createHash('sha256').update(printed, 'utf8').digest('hex'));
  });

  it('keeps the chain of another conference apart', async () => {
    const conference = await test.dataSource.manager.findOneByOrFail(Conference, { id: world.otherConferenceId });
    expect(conference.lastDecisionNumber).toBe(0);
  });
});
