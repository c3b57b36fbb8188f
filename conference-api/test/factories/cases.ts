import { randomUUID } from 'node:crypto';
import type { CaseContent } from '../../src/calc/vocabulary/case-content.js';
import type { Stage } from '../../src/calc/vocabulary/case.js';
import type { Projection } from '../../src/calc/vocabulary/images.js';
import { Case } from '../../src/cases/entities/case.entity.js';
import { CaseImage } from '../../src/images/entities/case-image.entity.js';
import { AgendaItem } from '../../src/meetings/entities/agenda-item.entity.js';
import { Meeting } from '../../src/meetings/entities/meeting.entity.js';
import type { TestApp } from '../support/test-app.js';
import type { TestPerson, World } from './world.js';

/** An invented case with all that the readiness list asks for. */
export const readyContent = (): CaseContent => ({
  heading: {
    title: 'Loose shell with a broken screw',
    side: 'left',
    joint: 'hip',
    question: 'One stage or two, and how would you take the shell out?',
    urgency: 'routine',
  },
  patient: {
    ageYears: 71,
    sex: 'female',
    bmiBand: '25-29.9',
    asa: 'III',
    comorbidities: ['diabetes'],
    metalAllergy: 'none',
    cementAllergy: 'none',
    antibioticAllergy: 'penicillin',
    anticoagulation: 'none',
    function: 'Walks 50 m with two sticks',
  },
  history: {
    indexDiagnosis: 'Dysplasia',
    indexInterval: '9 years',
    operations: [{ id: 'op-1', interval: '9 years ago', procedure: 'Uncemented replacement' }],
    reasons: ['loosening'],
    course: 'Groin pain on the first steps for a year',
  },
  implants: {
    parts: [
      {
        id: 'shell-1',
        part: 'shell',
        fixation: 'probably-fixed',
        material: 'titanium',
        maker: 'unknown',
        certainty: 'likely',
        knownFrom: 'radiograph-only',
        outerDiameterMm: 54,
        screwHoles: true,
        screws: [{ id: 'screw-1', hour: 11, headDrive: 'hex-3.5' }],
      },
      { id: 'liner-1', part: 'liner', fixation: 'unknown', maker: 'unknown', linerKind: 'standard', certainty: 'unsure', knownFrom: 'radiograph-only' },
    ],
  },
  infection: { suspicion: 'possible', crpMgL: 14, synovialWbcPerUl: 900 },
  bone: { direction: 'superior', migrationMm: 8, ischialLysis: 'mild', teardrop: 'intact', kohler: 'intact', readersClass: 'IIA' },
  plan: {
    steps: [
      { id: 'step-1', kind: 'exposure', method: 'Posterior approach, extended', fallback: 'Trochanteric osteotomy' },
      { id: 'step-2', kind: 'liner', method: 'Screw through a drilled hole', fallback: 'Ream it away' },
      { id: 'step-3', kind: 'extraction', method: 'Curved blades round the rim, then pull', fallback: 'Cut the shell in quarters' },
    ],
    kit: [{ id: 'kit-1', item: 'Universal screwdriver set', source: 'hospital', confirmed: true }],
    reconstruction: 'Larger porous shell with screws',
  },
  options: {
    options: [
      { id: 'one-stage', title: 'One-stage exchange', description: 'Shell and liner only', isProposal: true },
      { id: 'two-stage', title: 'Two-stage exchange' },
      { id: 'wait', title: 'Keep and watch' },
    ],
  },
});

/** A picture's row as it stands after an upload; no object is behind it. */
export async function addImageRow(test: TestApp, caseId: string, uploadedById: string, projection: Projection = 'ap-pelvis'): Promise<string> {
  const image = test.dataSource.manager.create(CaseImage, {
    caseId,
    state: 'ready',
    projection,
    width: 100,
    height: 100,
    sourceKind: 'png',
    sourceHash: randomUUID().replaceAll('-', '').padEnd(64, '0'),
    uploadedById,
  });
  return (await test.dataSource.manager.save(image)).id;
}

const ok = (response: { status: number; text: string; body: unknown }, status: number, what: string) => {
  if (response.status !== status) throw new Error(`${what} answered ${response.status}: ${response.text}`);
  return response.body as { id: string; code: string; version: number };
};

/** A draft of `person` with these sections saved, over HTTP. */
export async function makeDraft(test: TestApp, world: World, person: TestPerson = world.people.surgeon, changes: Partial<CaseContent> = {}) {
  const created = ok(await test.http().post('/api/cases').set(person.auth).send({ conferenceId: world.conferenceId }), 201, 'create');
  if (!Object.keys(changes).length) return created;
  const saved = ok(await test.http().patch(`/api/cases/${created.id}`).set(person.auth).send({ baseVersion: created.version, changes }), 200, 'save');
  return { ...created, version: saved.version };
}

/** A case on its way, over HTTP: posted, and released for `open`. */
export async function makeCaseAt(
  test: TestApp,
  world: World,
  stage: 'draft' | 'checking' | 'open',
  options: { presenter?: TestPerson; changes?: Partial<CaseContent> } = {},
) {
  const presenter = options.presenter ?? world.people.surgeon;
  const draft = await makeDraft(test, world, presenter, { ...readyContent(), ...options.changes });
  await addImageRow(test, draft.id, presenter.id);
  if (stage === 'draft') return draft;
  ok(await test.http().post(`/api/cases/${draft.id}/post`).set(presenter.auth).send({ baseVersion: draft.version }), 200, 'post');
  if (stage === 'checking') return draft;
  ok(await test.http().post(`/api/cases/${draft.id}/release`).set(world.people.coordinator.auth).send({ baseVersion: draft.version }), 200, 'release');
  return draft;
}

/** Sets a stage without the use case that leads there, where a test needs the stage alone. */
export const setStage = (test: TestApp, caseId: string, stage: Stage) => test.dataSource.manager.update(Case, { id: caseId }, { stage });

/** A planned meeting in a week with these cases on its agenda. */
export async function makeMeeting(test: TestApp, world: World, caseIds: string[] = []): Promise<string> {
  const { manager } = test.dataSource;
  const at = new Date(Math.floor(Date.now() / 1000) * 1000 + 7 * 86_400_000 + Math.floor(Math.random() * 1e9));
  const meeting = await manager.save(
    manager.create(Meeting, { conferenceId: world.conferenceId, slotAt: at, startsAt: at, minutes: 60, state: 'planned', agendaDueAt: new Date(at.getTime() - 86_400_000) }),
  );
  for (const [position, caseId] of caseIds.entries()) {
    await manager.insert(AgendaItem, { meetingId: meeting.id, caseId, position, minutes: 15 });
    await setStage(test, caseId, 'listed');
  }
  return meeting.id;
}
