import { Injectable } from '@nestjs/common';
import { DataSource } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { caseSearchText, caseTexts } from '../calc/cases/case-text.js';
import { caseReadiness } from '../calc/cases/readiness.js';
import { screenIdentifiers } from '../calc/identifiers/identifier-screen.js';
import { emptyContent } from '../calc/vocabulary/case-content.js';
import { forbidden } from '../common/problems/problem.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { CaseSavingService } from './case-saving.service.js';
import { CaseViewService } from './case-view.service.js';
import { nextCaseCode } from './case-code.js';
import type { CaseDto, CreateCaseDto, IdentifierFindingsDto, ReadinessDto, SaveCaseDto, SavedCaseDto } from './dto/case.dto.js';
import { Case } from './entities/case.entity.js';
import { CaseVersion } from './entities/case-version.entity.js';
import { findProjections } from './find-projections.js';

@Injectable()
export class CasesService {
  constructor(
    private readonly access: AccessService,
    private readonly work: UnitOfWork,
    private readonly view: CaseViewService,
    private readonly saving: CaseSavingService,
    private readonly dataSource: DataSource,
  ) {}

  /** Begins a draft that only its presenter sees. */
  async create(actor: Actor, body: CreateCaseDto): Promise<CaseDto> {
    const { conferenceId } = body;
    this.access.conference(actor, Permission.CaseCreate, conferenceId);
    const content = emptyContent();
    content.heading = { title: body.title ?? '', side: body.side ?? null, joint: body.joint ?? 'hip', urgency: 'routine' };
    const created = await this.work.run(actor, async (tx) => {
      const code = await nextCaseCode(tx.manager, conferenceId);
      const begun = await tx.manager.save(
        tx.manager.create(Case, {
          conferenceId,
          code,
          presenterId: actor.personId,
          treatingSurgeonId: actor.personId,
          stage: 'draft',
          title: content.heading.title ?? '',
          side: content.heading.side ?? null,
          joint: content.heading.joint ?? 'hip',
          urgency: 'routine',
          content,
          searchText: caseSearchText(code, content),
          version: 1,
          createdAt: tx.now,
          updatedAt: tx.now,
        }),
      );
      await tx.manager.save(tx.manager.create(CaseVersion, { caseId: begun.id, version: 1, content, authorId: actor.personId, at: tx.now }));
      await tx.audit({ action: 'case.create', recordKind: 'case', recordId: begun.id, caseId: begun.id, conferenceId });
      await tx.event({ kind: 'case-changed', conferenceId, caseId: begun.id });
      return begun.id;
    });
    return this.findOne(actor, created);
  }

  async findOne(actor: Actor, id: string): Promise<CaseDto> {
    return this.view.show(actor, await this.access.case(actor, Permission.CaseRead, id));
  }

  save(actor: Actor, id: string, body: SaveCaseDto): Promise<SavedCaseDto> {
    return this.saving.save(actor, id, body);
  }

  async readiness(actor: Actor, id: string): Promise<ReadinessDto> {
    const found = await this.access.case(actor, Permission.CaseRead, id);
    return caseReadiness(found.content, await findProjections(this.dataSource.manager, id));
  }

  /** For the presenter, who can mend it, and the coordinator, who checks; nobody else has a use for a list of slips. */
  async identifiers(actor: Actor, id: string): Promise<IdentifierFindingsDto> {
    const found = await this.access.case(actor, Permission.CaseRead, id);
    if (found.presenterId !== actor.personId && actor.roles.get(found.conferenceId) !== 'coordinator')
      throw forbidden('Only the presenter and the coordinator see what looks like an identifier.');
    const items = caseTexts(found.content).flatMap(({ text, ...place }) =>
      screenIdentifiers({ text }).findings.map((finding) => ({ ...place, ...finding })),
    );
    return { items };
  }
}
