import { randomUUID } from 'node:crypto';
import { type CaseContent, type CaseOption, emptyContent } from '../../src/calc/vocabulary/case-content.js';
import type { Stage } from '../../src/calc/vocabulary/case.js';
import type { MeetingState } from '../../src/calc/vocabulary/meetings.js';
import { Case } from '../../src/cases/entities/case.entity.js';
import { CaseVersion } from '../../src/cases/entities/case-version.entity.js';
import { AgendaItem } from '../../src/meetings/entities/agenda-item.entity.js';
import { Attendance } from '../../src/meetings/entities/attendance.entity.js';
import { Meeting } from '../../src/meetings/entities/meeting.entity.js';
import { RatingRound } from '../../src/ratings/entities/rating-round.entity.js';
import type { TestApp } from '../support/test-app.js';
import type { World, WorldPerson } from './world.js';

export const OPTIONS: CaseOption[] = [
  { id: 'retain', title: 'Retain the shell, cement a liner' },
  { id: 'remove', title: 'Remove the shell with curved blades', isProposal: true },
  { id: 'watch', title: 'No operation for now' },
];

let lastNumber = 0;

export interface CaseFacts {
  stage?: Stage;
  presenter?: WorldPerson;
  content?: Partial<CaseContent>;
  conferenceId?: string;
}

/** A case put straight into the tables at a stage, with the first round where members can rate. */
export async function makeCase(test: TestApp, world: World, facts: CaseFacts = {}): Promise<Case> {
  const { manager } = test.dataSource;
  const now = new Date();
  const stage = facts.stage ?? 'open';
  const presenterId = world.people[facts.presenter ?? 'surgeon'].id;
  const content: CaseContent = {
    ...emptyContent(),
    heading: { title: 'Well-fixed shell, vertical', side: 'left', joint: 'hip', question: 'Remove or retain the shell?' },
    plan: { steps: [{ id: 'step-1', kind: 'exposure', method: 'Posterior approach, whole rim seen' }] },
    options: { options: OPTIONS },
    ...facts.content,
  };
  const found = await manager.save(
    manager.create(Case, {
      conferenceId: facts.conferenceId ?? world.conferenceId,
      code: `T${Date.now().toString(36).slice(-5)}-${++lastNumber}`,
      presenterId,
      treatingSurgeonId: presenterId,
      stage,
      title: content.heading.title ?? '',
      side: content.heading.side ?? null,
      content,
      searchText: '',
      releasedAt: stage === 'draft' || stage === 'checking' ? null : now,
      updatedAt: now,
    }),
  );
  await manager.insert(CaseVersion, { caseId: found.id, version: 1, content, authorId: presenterId, at: now });
  if (!['draft', 'checking', 'withdrawn'].includes(stage))
    await manager.insert(RatingRound, { caseId: found.id, number: 1, options: content.options.options ?? [], caseVersion: 1, openedAt: now, closedAt: null });
  return found;
}

/** A meeting with cases on its agenda, in a state, with the people given present. */
export async function makeMeeting(
  test: TestApp,
  world: World,
  facts: { state?: MeetingState; cases?: Case[]; present?: WorldPerson[]; startsAt?: Date } = {},
): Promise<Meeting> {
  const { manager } = test.dataSource;
  const startsAt = facts.startsAt ?? new Date();
  const meeting = await manager.save(
    manager.create(Meeting, {
      conferenceId: world.conferenceId,
      // the slot's date is unique in a conference; tests hold many meetings
      slotAt: new Date(startsAt.getTime() + Math.floor(Math.random() * 1e9)),
      startsAt,
      minutes: 60,
      state: facts.state ?? 'running',
      agendaDueAt: startsAt,
      startedAt: facts.state === 'planned' ? null : startsAt,
    }),
  );
  for (const [position, { id: caseId }] of (facts.cases ?? []).entries())
    await manager.insert(AgendaItem, { id: randomUUID(), meetingId: meeting.id, caseId, position, minutes: 15, state: 'listed' });
  for (const name of facts.present ?? [])
    await manager.insert(Attendance, { meetingId: meeting.id, personId: world.people[name].id, state: 'present', at: startsAt });
  return meeting;
}
