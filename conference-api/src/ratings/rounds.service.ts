import { Injectable } from '@nestjs/common';
import { type EntityManager, IsNull } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import type { Case } from '../cases/entities/case.entity.js';
import { notFound, Problem, wrongStage } from '../common/problems/problem.js';
import { type Transaction, UnitOfWork } from '../database/unit-of-work.js';
import { AgendaItem } from '../meetings/entities/agenda-item.entity.js';
import type { RatingDto } from './dto/rating.dto.js';
import { RatingRound } from './entities/rating-round.entity.js';
import { RatingsService } from './ratings.service.js';

@Injectable()
export class RoundsService {
  constructor(
    private readonly access: AccessService,
    private readonly work: UnitOfWork,
    private readonly ratings: RatingsService,
  ) {}

  /** The first round opens when a case is released, with the options as they stand then. */
  async openFirst(tx: Transaction, found: Case): Promise<void> {
    await this.insert(tx, found, 1);
  }

  /** The second round opens at the meeting; the first is closed by it. */
  async open(actor: Actor, caseId: string, number: number): Promise<RatingDto> {
    if (number !== 2) throw new Problem('conflict', 'Only the second round is opened by hand; the first opens when the case is released.');
    const found = await this.work.run(actor, async (tx) => {
      const locked = await this.access.case(actor, Permission.RoundControl, caseId, { stages: ['listed'], manager: tx.manager, lock: true });
      await this.refuseOutsideMeeting(tx.manager, caseId);
      if (await tx.manager.existsBy(RatingRound, { caseId, number })) throw new Problem('conflict', 'The second round was opened already.');
      await tx.manager.update(RatingRound, { caseId, closedAt: IsNull() }, { closedAt: tx.now });
      await this.insert(tx, locked, 2);
      await tx.audit({ action: 'round.open', recordKind: 'case', recordId: caseId, caseId, conferenceId: locked.conferenceId, details: { round: number } });
      await tx.event({ kind: 'rating-changed', conferenceId: locked.conferenceId, caseId });
      return locked;
    });
    return this.ratings.view(actor, found);
  }

  async close(actor: Actor, caseId: string, number: number): Promise<RatingDto> {
    const found = await this.work.run(actor, async (tx) => {
      const locked = await this.access.case(actor, Permission.RoundControl, caseId, { stages: ['open', 'listed'], manager: tx.manager, lock: true });
      const round = await tx.manager.findOne(RatingRound, { where: { caseId, number }, lock: { mode: 'pessimistic_write' } });
      if (!round) throw notFound('round');
      if (round.closedAt) throw wrongStage('This round is closed already.');
      await tx.manager.update(RatingRound, { id: round.id }, { closedAt: tx.now });
      await tx.audit({ action: 'round.close', recordKind: 'case', recordId: caseId, caseId, conferenceId: locked.conferenceId, details: { round: number } });
      await tx.event({ kind: 'rating-changed', conferenceId: locked.conferenceId, caseId });
      return locked;
    });
    return this.ratings.view(actor, found);
  }

  private async insert(tx: Transaction, found: Case, number: number): Promise<void> {
    await tx.manager.insert(RatingRound, {
      caseId: found.id,
      number,
      options: found.content.options.options ?? [],
      caseVersion: found.version,
      openedAt: tx.now,
      closedAt: null,
    });
  }

  private async refuseOutsideMeeting(manager: EntityManager, caseId: string): Promise<void> {
    const running = await manager.existsBy(AgendaItem, { caseId, state: 'listed', meeting: { state: 'running' } });
    if (!running) throw wrongStage('The second round opens at the meeting: start the meeting first.');
  }
}
