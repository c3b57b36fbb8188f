import { Injectable } from '@nestjs/common';
import { DataSource, In } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { Case } from '../cases/entities/case.entity.js';
import { toPersonRef } from '../common/people/person-ref.js';
import { invalid } from '../common/problems/problem.js';
import { Membership } from '../conferences/entities/membership.entity.js';
import { Settings } from '../config/settings.js';
import { type Transaction, UnitOfWork } from '../database/unit-of-work.js';
import type { FinalDecisionDto, FinalDecisionListDto, WriteFinalDecisionDto } from './dto/decision.dto.js';
import { FinalDecision } from './entities/final-decision.entity.js';

/** What the treating surgeon will do; a later word is a new version, none is changed. */
@Injectable()
export class FinalDecisionsService {
  constructor(
    private readonly access: AccessService,
    private readonly work: UnitOfWork,
    private readonly settings: Settings,
    private readonly dataSource: DataSource,
  ) {}

  async findOfCase(actor: Actor, caseId: string): Promise<FinalDecisionListDto> {
    await this.access.case(actor, Permission.DecisionRead, caseId);
    const rows = await this.dataSource.manager.find(FinalDecision, { where: { caseId }, relations: { by: { unit: true } }, order: { version: 'DESC' } });
    return { items: rows.map(toDto) };
  }

  async write(actor: Actor, caseId: string, body: WriteFinalDecisionDto): Promise<FinalDecisionDto> {
    const reason = body.reason?.trim() ?? '';
    const saved = await this.work.run(actor, async (tx) => {
      const found = await this.access.case(actor, Permission.FinalDecisionWrite, caseId, { stages: ['decided', 'final'], manager: tx.manager, lock: true });
      if (body.kind !== 'as-agreed' && !reason)
        throw invalid('reason', 'missing', 'Say why: a variation, or not proceeding, needs its reason.');
      const earlier = await tx.manager.countBy(FinalDecision, { caseId });
      const row = await tx.manager.save(
        tx.manager.create(FinalDecision, {
          caseId,
          version: earlier + 1,
          kind: body.kind,
          reason,
          plannedWeek: body.plannedWeek ?? null,
          patientInformed: body.patientInformed ?? null,
          byId: actor.personId,
          at: tx.now,
        }),
      );
      await tx.manager.update(Case, { id: caseId }, { stage: 'final', updatedAt: tx.now });
      await tx.audit({ action: 'final-decision.write', recordKind: 'case', recordId: caseId, caseId, conferenceId: found.conferenceId, details: { kind: body.kind, version: row.version } });
      await tx.event({ kind: 'case-changed', conferenceId: found.conferenceId, caseId });
      await this.tellConference(tx, found, row);
      return row;
    });
    return toDto(await this.dataSource.manager.findOneOrFail(FinalDecision, { where: { id: saved.id }, relations: { by: { unit: true } } }));
  }

  private async tellConference(tx: Transaction, found: Case, row: FinalDecision): Promise<void> {
    const members = await tx.manager.find(Membership, {
      where: { conferenceId: found.conferenceId, role: In(['chair', 'coordinator']), person: { isActive: true } },
      relations: { person: true },
    });
    await tx.mail(
      members.map(({ person }) => ({
        purpose: `final-decision:${row.id}:${person.id}`,
        personId: person.id,
        recipient: person.email,
        template: 'final-decision',
        data: { name: person.name, code: found.code, kind: row.kind, url: `${this.settings.publicUrl}/cases/${found.id}` },
      })),
    );
  }
}

const toDto = (row: FinalDecision): FinalDecisionDto => ({
  id: row.id,
  version: row.version,
  kind: row.kind,
  reason: row.reason,
  plannedWeek: row.plannedWeek,
  patientInformed: row.patientInformed,
  by: toPersonRef(row.by),
  at: row.at.toISOString(),
});
