import { Injectable } from '@nestjs/common';
import { In, IsNull } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { caseReadiness } from '../calc/cases/readiness.js';
import { forbidden, Problem, staleVersion, wrongStage } from '../common/problems/problem.js';
import { type Transaction, UnitOfWork } from '../database/unit-of-work.js';
import { AgendaItem } from '../meetings/entities/agenda-item.entity.js';
import { Meeting } from '../meetings/entities/meeting.entity.js';
import { RatingRound } from '../ratings/entities/rating-round.entity.js';
import { RoundsService } from '../ratings/rounds.service.js';
import { CASE_STAGES } from './case-actions.js';
import { CaseMailsService } from './case-mails.service.js';
import { CaseViewService } from './case-view.service.js';
import type { CaseDto, PostCaseDto, ReleaseCaseDto, ReturnCaseDto, WithdrawCaseDto } from './dto/case.dto.js';
import { Case } from './entities/case.entity.js';
import { findProjections } from './find-projections.js';

/** Moves a case from stage to stage, up to its release, and out of the way. */
@Injectable()
export class CaseStageService {
  constructor(
    private readonly access: AccessService,
    private readonly work: UnitOfWork,
    private readonly view: CaseViewService,
    private readonly rounds: RoundsService,
    private readonly mails: CaseMailsService,
  ) {}

  /** draft → checking, unless the readiness list blocks. */
  async post(actor: Actor, id: string, body: PostCaseDto): Promise<CaseDto> {
    const posted = await this.work.run(actor, async (tx) => {
      const found = await this.access.case(actor, Permission.CaseWrite, id, { stages: CASE_STAGES.post, manager: tx.manager, lock: true });
      refuseOtherVersion(found, body.baseVersion);
      const { items } = caseReadiness(found.content, await findProjections(tx.manager, id));
      const blocking = items.filter((item) => !item.done && item.weight === 'blocks-posting');
      if (blocking.length)
        throw new Problem(
          'invalid',
          'The case can not be posted yet.',
          blocking.map((item) => ({ field: item.section, code: item.id, message: item.remedy })),
        );
      return this.move(tx, found, 'case.post', { stage: 'checking', postedAt: tx.now, returnRemark: null });
    });
    return this.view.show(actor, posted);
  }

  /** checking → open: the first rating round opens with the options as they are, and the raters are told. */
  async release(actor: Actor, id: string, body: ReleaseCaseDto): Promise<CaseDto> {
    const released = await this.work.run(actor, async (tx) => {
      const found = await this.access.case(actor, Permission.CaseCheck, id, { stages: CASE_STAGES.check, manager: tx.manager, lock: true });
      refuseOwn(actor, found);
      refuseOtherVersion(found, body.baseVersion);
      await this.move(tx, found, 'case.release', { stage: 'open', releasedAt: tx.now, releasedById: actor.personId, returnRemark: null });
      await this.rounds.openFirst(tx, found);
      await tx.event({ kind: 'rating-changed', conferenceId: found.conferenceId, caseId: id });
      await this.mails.released(tx, found);
      return found;
    });
    return this.view.show(actor, released);
  }

  /** checking → draft, with what to mend; the coordinator does not see it any more until it is posted again. */
  async return(actor: Actor, id: string, body: ReturnCaseDto): Promise<{ returned: boolean }> {
    await this.work.run(actor, async (tx) => {
      const found = await this.access.case(actor, Permission.CaseCheck, id, { stages: CASE_STAGES.check, manager: tx.manager, lock: true });
      refuseOwn(actor, found);
      await this.move(tx, found, 'case.return', { stage: 'draft', returnRemark: body.remark });
      await this.mails.returned(tx, found);
    });
    return { returned: true };
  }

  /** Any stage before decided → withdrawn; its pictures are deleted when the retention is over. */
  async withdraw(actor: Actor, id: string, body: WithdrawCaseDto): Promise<CaseDto> {
    const withdrawn = await this.work.run(actor, async (tx) => {
      const found = await this.access.case(actor, Permission.CaseWithdraw, id, { stages: CASE_STAGES.withdraw, manager: tx.manager, lock: true });
      await this.takeOffAgenda(tx, found);
      await tx.manager.update(RatingRound, { caseId: id, closedAt: IsNull() }, { closedAt: tx.now });
      return this.move(tx, found, 'case.withdraw', { stage: 'withdrawn', withdrawnReason: body.reason, withdrawnAt: tx.now });
    });
    return this.view.show(actor, withdrawn);
  }

  private async move(tx: Transaction, found: Case, action: string, changes: Partial<Case>): Promise<Case> {
    const { id, conferenceId, stage: from, version } = found;
    await tx.manager.update(Case, { id }, { ...(changes as Omit<Partial<Case>, 'content'>), updatedAt: tx.now } as object);
    Object.assign(found, changes, { updatedAt: tx.now });
    await tx.audit({ action, recordKind: 'case', recordId: id, caseId: id, conferenceId, details: { from, to: found.stage, version } });
    await tx.event({ kind: 'case-changed', conferenceId, caseId: id });
    return found;
  }

  private async takeOffAgenda(tx: Transaction, found: Case): Promise<void> {
    const items = await tx.manager.find(AgendaItem, { where: { caseId: found.id, state: 'listed' }, relations: { meeting: true } });
    if (items.some((item) => item.meeting.state === 'running'))
      throw wrongStage('The meeting that discusses the case is running: ask the chair to defer it first.');
    const planned = items.filter((item) => item.meeting.state === 'planned');
    if (!planned.length) return;
    await tx.manager.delete(AgendaItem, { id: In(planned.map(({ id }) => id)) });
    for (const { meetingId } of planned) {
      await tx.manager.increment(Meeting, { id: meetingId }, 'version', 1);
      await tx.event({ kind: 'meeting-changed', conferenceId: found.conferenceId, meetingId });
    }
  }
}

function refuseOtherVersion(found: Case, baseVersion: number): void {
  if (baseVersion !== found.version)
    throw staleVersion('The case was saved meanwhile: look at it again first.', { currentVersion: found.version });
}

function refuseOwn(actor: Actor, found: Case): void {
  if (found.presenterId === actor.personId) throw forbidden('A second person checks a case, never its presenter.');
}
