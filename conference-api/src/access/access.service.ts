import { Injectable } from '@nestjs/common';
import { DataSource, type EntityManager } from 'typeorm';
import { Case } from '../cases/entities/case.entity.js';
import { forbidden, notFound, wrongStage } from '../common/problems/problem.js';
import type { Stage } from '../calc/vocabulary/case.js';
import { STAGE_WORDS } from '../calc/vocabulary/case.js';
import { mayInConference, mayOnCase, mayOnSite, maySeeCase } from './access.policy.js';
import type { Actor } from './actor.js';
import type { Permission } from './permission.js';

/** Asked first by every use case: the thing, if this person may do this to it; a problem otherwise. */
@Injectable()
export class AccessService {
  constructor(private readonly dataSource: DataSource) {}

  site(actor: Actor, permission: Permission): void {
    if (!mayOnSite(actor, permission)) throw forbidden('Only an administrator may do this.');
  }

  /** A conference whose member one is not does not exist for one. */
  conference(actor: Actor, permission: Permission, conferenceId: string): void {
    if (!actor.roles.has(conferenceId)) throw notFound('conference');
    if (!mayInConference(actor, permission, conferenceId))
      throw forbidden('Your role in this conference does not allow this.');
  }

  /** The case's row, locked where `lock` is given inside a transaction. */
  async case(
    actor: Actor,
    permission: Permission,
    caseId: string,
    options: { stages?: readonly Stage[]; manager?: EntityManager; lock?: boolean } = {},
  ): Promise<Case> {
    const manager = options.manager ?? this.dataSource.manager;
    const found = await manager.findOne(Case, {
      where: { id: caseId },
      ...(options.lock ? { lock: { mode: 'pessimistic_write' as const } } : {}),
    });
    if (!found || !maySeeCase(actor, found)) throw notFound('case');
    if (!mayOnCase(actor, permission, found))
      throw forbidden('Your role, or that it is not your own case, does not allow this.');
    if (options.stages && !options.stages.includes(found.stage))
      throw wrongStage(`The case is at the stage '${STAGE_WORDS[found.stage]}'; this is possible at: ${options.stages.map((stage) => STAGE_WORDS[stage]).join(', ')}.`);
    return found;
  }
}
