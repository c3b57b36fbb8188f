import { Injectable } from '@nestjs/common';
import { DataSource } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import type { OutcomeContent } from '../calc/vocabulary/outcomes.js';
import { Case } from '../cases/entities/case.entity.js';
import { toPersonRef } from '../common/people/person-ref.js';
import { invalid, wrongStage } from '../common/problems/problem.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { FinalDecision } from '../decisions/entities/final-decision.entity.js';
import type { OutcomeDto, OutcomeListDto, WriteOutcomeDto } from './dto/outcome.dto.js';
import { Outcome } from './entities/outcome.entity.js';

/** What was found and done; an amendment is a new version with its reason. */
@Injectable()
export class OutcomesService {
  constructor(
    private readonly access: AccessService,
    private readonly work: UnitOfWork,
    private readonly dataSource: DataSource,
  ) {}

  async findOfCase(actor: Actor, caseId: string): Promise<OutcomeListDto> {
    await this.access.case(actor, Permission.CaseRead, caseId);
    const rows = await this.dataSource.manager.find(Outcome, { where: { caseId }, relations: { by: { unit: true } }, order: { version: 'DESC' } });
    return { items: rows.map(toDto) };
  }

  async write(actor: Actor, caseId: string, body: WriteOutcomeDto): Promise<OutcomeDto> {
    const saved = await this.work.run(actor, async (tx) => {
      const found = await this.access.case(actor, Permission.OutcomeWrite, caseId, { stages: ['final', 'reported'], manager: tx.manager, lock: true });
      const final = await tx.manager.findOne(FinalDecision, { where: { caseId }, order: { version: 'DESC' } });
      if (final?.kind === 'not-proceeding') throw wrongStage('The final decision is not to proceed, so there is no outcome to report.');
      const earlier = await tx.manager.countBy(Outcome, { caseId });
      if (earlier && !body.amendmentReason?.trim()) throw invalid('amendmentReason', 'missing', 'Say why the reported outcome is amended.');
      const row = await tx.manager.save(
        tx.manager.create(Outcome, {
          caseId,
          version: earlier + 1,
          content: toContent(body),
          amendmentReason: earlier ? body.amendmentReason!.trim() : null,
          byId: actor.personId,
          at: tx.now,
        }),
      );
      await tx.manager.update(Case, { id: caseId }, { stage: 'reported', updatedAt: tx.now });
      await tx.audit({ action: 'outcome.write', recordKind: 'case', recordId: caseId, caseId, conferenceId: found.conferenceId, details: { version: row.version } });
      await tx.event({ kind: 'case-changed', conferenceId: found.conferenceId, caseId });
      return row;
    });
    return toDto(await this.dataSource.manager.findOneOrFail(Outcome, { where: { id: saved.id }, relations: { by: { unit: true } } }));
  }
}

const toContent = (body: WriteOutcomeDto): OutcomeContent => ({
  steps: body.steps.map(({ stepId, method, asPlanned }) => ({ stepId, method: method ?? '', asPlanned: asPlanned ?? null })),
  missingKit: body.missingKit ?? '',
  minutes: body.minutes ?? null,
  bloodLoss: body.bloodLoss ?? null,
  complications: body.complications ?? [],
  defectFound: body.defectFound ?? null,
  removedShellMm: body.removedShellMm ?? null,
  implantedShellMm: body.implantedShellMm ?? null,
  boneLostHours: [...new Set(body.boneLostHours)].sort((a, b) => a - b),
  cultures: body.cultures ?? '',
  lesson: body.lesson ?? '',
});

const toDto = (row: Outcome): OutcomeDto => ({
  id: row.id,
  version: row.version,
  ...row.content,
  amendmentReason: row.amendmentReason,
  by: toPersonRef(row.by),
  at: row.at.toISOString(),
});
