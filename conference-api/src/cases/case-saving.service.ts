import { Injectable } from '@nestjs/common';
import type { EntityManager } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { caseSearchText, caseTexts } from '../calc/cases/case-text.js';
import { keptSection, repeatedKeys } from '../calc/cases/content-rules.js';
import { contentDifferences, sectionDifferences } from '../calc/cases/differences.js';
import { screenIdentifiers } from '../calc/identifiers/identifier-screen.js';
import { type CaseContent, CONTENT_SECTIONS, type ContentSection } from '../calc/vocabulary/case-content.js';
import { toPersonRef } from '../common/people/person-ref.js';
import { Problem, staleVersion, wrongStage } from '../common/problems/problem.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { RatingRound } from '../ratings/entities/rating-round.entity.js';
import { CASE_STAGES } from './case-actions.js';
import type { CaseChangesDto, SaveCaseDto, SavedCaseDto } from './dto/case.dto.js';
import { Case } from './entities/case.entity.js';
import { CaseVersion } from './entities/case-version.entity.js';

type Sections = Partial<CaseContent>;

/** Saves sections as they are typed, each save a version; an edit made on an older one changes nothing. */
@Injectable()
export class CaseSavingService {
  constructor(
    private readonly access: AccessService,
    private readonly work: UnitOfWork,
  ) {}

  save(actor: Actor, id: string, body: SaveCaseDto): Promise<SavedCaseDto> {
    return this.work.run(actor, async (tx) => {
      const { manager } = tx;
      const found = await this.access.case(actor, Permission.CaseWrite, id, { stages: CASE_STAGES.edit, manager, lock: true });
      const sent = readSections(body.changes);
      if (body.baseVersion !== found.version) throw await this.conflict(manager, found, body.baseVersion, sent);
      const changed = CONTENT_SECTIONS.filter((section) => sent[section] && sectionDifferences(section, found.content[section], sent[section]).length);
      if (!changed.length) return { version: found.version, savedAt: found.updatedAt.toISOString() };
      if (found.stage !== 'draft') refuseIdentifiers(sent, changed);
      if (changed.includes('options') && (await manager.existsBy(RatingRound, { caseId: id })))
        throw wrongStage('The options are being rated: they can not change once a round has opened.');
      const content: CaseContent = { ...found.content, ...sent };
      Object.assign(found, columnsOf(content), { content, searchText: caseSearchText(found.code, content), version: found.version + 1, updatedAt: tx.now });
      await manager.save(found);
      await manager.insert(CaseVersion, { caseId: id, version: found.version, content: content as object, authorId: actor.personId, at: tx.now });
      await tx.audit({
        action: 'case.save',
        recordKind: 'case',
        recordId: id,
        caseId: id,
        conferenceId: found.conferenceId,
        details: { version: found.version, sections: changed },
      });
      await tx.event({ kind: 'case-changed', conferenceId: found.conferenceId, caseId: id });
      return { version: found.version, savedAt: tx.now.toISOString() };
    });
  }

  /** Tells what changed since, so that the page can show it and nothing typed is lost. */
  private async conflict(manager: EntityManager, found: Case, baseVersion: number, sent: Sections): Promise<Problem> {
    const base = await manager.findOneBy(CaseVersion, { caseId: found.id, version: baseVersion });
    const latest = await manager.findOne(CaseVersion, { where: { caseId: found.id, version: found.version }, relations: { author: { unit: true } } });
    const sections = CONTENT_SECTIONS.filter((section) => sent[section]);
    return staleVersion('The case was saved meanwhile, perhaps in another window. Nothing of this edit was saved.', {
      currentVersion: found.version,
      currentContent: Object.fromEntries(sections.map((section) => [section, found.content[section]])),
      changes: base ? contentDifferences(base.content, found.content) : [],
      by: latest ? toPersonRef(latest.author) : null,
    });
  }
}

function readSections(changes: CaseChangesDto | null | undefined): Sections {
  const sent: Sections = {};
  for (const section of CONTENT_SECTIONS) {
    const value = changes?.[section] as CaseContent[typeof section] | null | undefined;
    if (!value) continue;
    Object.assign(sent, { [section]: keptSection(section, value) });
  }
  const errors = CONTENT_SECTIONS.flatMap((section) => repeatedKeys(section, sent[section] ?? {}).map((path) => ({ section, path }))).map(
    ({ section, path }) => ({ field: `changes.${section}.${path}`, code: 'repeated', message: 'Each entry of a list is there once: this one repeats an earlier one.' }),
  );
  if (errors.length) throw new Problem('invalid', errors[0]!.message, errors);
  return sent;
}

// what everybody reads already is not checked by a second person again: what is certain does not get in
function refuseIdentifiers(sent: Sections, changed: ContentSection[]): void {
  const texts = caseTexts(Object.fromEntries(changed.map((section) => [section, sent[section]])) as unknown as CaseContent);
  const errors = texts.flatMap(({ section, path, label, text }) =>
    screenIdentifiers({ text })
      .findings.filter(({ strength }) => strength === 'certain')
      .map((finding) => ({
        field: `changes.${section}.${path}`,
        code: 'identifier',
        message: `${label}: '${finding.text}' looks like an identifier (${finding.kind}). Take it out.`,
      })),
  );
  if (errors.length) throw new Problem('invalid', errors[0]!.message, errors);
}

/** What of the heading stands in columns of its own, for the list. */
const columnsOf = ({ heading }: CaseContent): Pick<Case, 'title' | 'side' | 'joint' | 'urgency'> => ({
  title: heading.title ?? '',
  side: heading.side ?? null,
  joint: heading.joint ?? 'hip',
  urgency: heading.urgency ?? 'routine',
});
