import { Injectable } from '@nestjs/common';
import { In, IsNull } from 'typeorm';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import type { AttendanceState } from '../calc/vocabulary/meetings.js';
import { Case } from '../cases/entities/case.entity.js';
import { Problem, wrongStage } from '../common/problems/problem.js';
import { Membership } from '../conferences/entities/membership.entity.js';
import { type Transaction, UnitOfWork } from '../database/unit-of-work.js';
import { Decision } from '../decisions/entities/decision.entity.js';
import { moveCases } from './case-moves.js';
import type { DeferItemDto, MeetingDto } from './dto/meeting.dto.js';
import { AgendaItem } from './entities/agenda-item.entity.js';
import { Attendance } from './entities/attendance.entity.js';
import { Meeting } from './entities/meeting.entity.js';
import { MeetingAccessService } from './meeting-access.service.js';
import { MeetingViewService } from './meeting-view.service.js';

const NOT_REACHED = 'The meeting was closed before its turn.';

/** What the chair does at the meeting. */
@Injectable()
export class MeetingRunService {
  constructor(
    private readonly meetings: MeetingAccessService,
    private readonly work: UnitOfWork,
    private readonly view: MeetingViewService,
  ) {}

  /** The chair who starts it is there; apologies given before stay. */
  async start(actor: Actor, id: string): Promise<MeetingDto> {
    return this.work.run(actor, async (tx) => {
      const meeting = await this.meetings.meeting(actor, Permission.MeetingRun, id, { states: ['planned'], manager: tx.manager, lock: true });
      await this.change(tx, meeting, 'meeting.start', { state: 'running', startedAt: tx.now });
      await tx.manager.upsert(Attendance, { meetingId: id, personId: actor.personId, state: 'present', at: tx.now }, ['meetingId', 'personId']);
      return this.view.show(actor, meeting, tx.manager);
    });
  }

  /** What was not reached goes back to open. A decision that is written and not signed stands in the way: it would be forgotten. */
  async close(actor: Actor, id: string): Promise<MeetingDto> {
    return this.work.run(actor, async (tx) => {
      const meeting = await this.meetings.meeting(actor, Permission.MeetingRun, id, { states: ['running'], manager: tx.manager, lock: true });
      const left = await tx.manager.find(AgendaItem, { where: { meetingId: id, state: 'listed' } });
      const cases = await this.lockCases(tx, left);
      await this.refuseUnsigned(tx, cases);
      await tx.manager.update(AgendaItem, { meetingId: id, state: 'listed' }, { state: 'deferred', deferredReason: NOT_REACHED });
      await moveCases(tx, cases.filter((found) => found.stage === 'listed').map((found) => found.id), 'open', { meetingId: id, conferenceId: meeting.conferenceId });
      await this.change(tx, meeting, 'meeting.close', { state: 'closed', closedAt: tx.now }, { notReached: left.length });
      return this.view.show(actor, meeting, tx.manager);
    });
  }

  /** Before the meeting for apologies, during it for who is there. */
  async setAttendance(actor: Actor, id: string, personId: string, state: AttendanceState | null): Promise<MeetingDto> {
    return this.work.run(actor, async (tx) => {
      const meeting = await this.meetings.meeting(actor, Permission.AttendanceWrite, id, { states: ['planned', 'running'], manager: tx.manager, lock: true });
      const { conferenceId } = meeting;
      if (!(await tx.manager.existsBy(Membership, { conferenceId, personId }))) throw new Problem('not-found', 'This person is not a member of the conference.');
      if (state) await tx.manager.upsert(Attendance, { meetingId: id, personId, state, at: tx.now }, ['meetingId', 'personId']);
      else await tx.manager.delete(Attendance, { meetingId: id, personId });
      await tx.audit({ action: 'attendance.set', recordKind: 'meeting', recordId: id, conferenceId, details: { personId, state } });
      await tx.event({ kind: 'meeting-changed', conferenceId, meetingId: id });
      return this.view.show(actor, meeting, tx.manager);
    });
  }

  /** The case is open again, for a later meeting. */
  async defer(actor: Actor, id: string, itemId: string, body: DeferItemDto): Promise<MeetingDto> {
    return this.work.run(actor, async (tx) => {
      const meeting = await this.meetings.meeting(actor, Permission.MeetingRun, id, { states: ['running'], manager: tx.manager, lock: true });
      const item = await tx.manager.findOneBy(AgendaItem, { id: itemId, meetingId: id });
      if (!item) throw new Problem('not-found', 'There is no such item on this agenda.');
      if (item.state !== 'listed') throw wrongStage('The case is decided or deferred already.');
      const cases = await this.lockCases(tx, [item]);
      await tx.manager.update(AgendaItem, { id: itemId }, { state: 'deferred', deferredReason: body.reason });
      await moveCases(tx, cases.filter((found) => found.stage === 'listed').map((found) => found.id), 'open', { meetingId: id, conferenceId: meeting.conferenceId });
      await this.change(tx, meeting, 'agenda.defer', {}, { caseId: item.caseId });
      return this.view.show(actor, meeting, tx.manager);
    });
  }

  private async change(tx: Transaction, meeting: Meeting, action: string, changes: Partial<Pick<Meeting, 'state' | 'startedAt' | 'closedAt'>>, details = {}): Promise<void> {
    const { id, conferenceId } = meeting;
    const all = { ...changes, version: meeting.version + 1 };
    await tx.manager.update(Meeting, { id }, all);
    Object.assign(meeting, all);
    await tx.audit({ action, recordKind: 'meeting', recordId: id, conferenceId, details });
    await tx.event({ kind: 'meeting-changed', conferenceId, meetingId: id });
  }

  private async lockCases(tx: Transaction, items: AgendaItem[]): Promise<Case[]> {
    if (!items.length) return [];
    return tx.manager.find(Case, { where: { id: In(items.map((item) => item.caseId)) }, order: { id: 'ASC' }, lock: { mode: 'pessimistic_write' } });
  }

  private async refuseUnsigned(tx: Transaction, cases: Case[]): Promise<void> {
    if (!cases.length) return;
    const drafts = await tx.manager.find(Decision, { select: { id: true, caseId: true }, where: { caseId: In(cases.map((found) => found.id)), signedAt: IsNull() } });
    const codes = cases.filter((found) => drafts.some((draft) => draft.caseId === found.id)).map((found) => found.code);
    if (codes.length) throw new Problem('conflict', `A decision is written and not signed: ${codes.join(', ')}. Sign it or defer the case before you close the meeting.`, [], { codes });
  }
}
