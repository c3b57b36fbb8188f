import { Injectable } from '@nestjs/common';
import { DataSource, type EntityManager, In, IsNull, LessThan, Not } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import type { DecisionContent } from '../calc/vocabulary/decisions.js';
import { Case } from '../cases/entities/case.entity.js';
import { decodeCursor, pageOf } from '../common/paging/cursor.js';
import type { PageQueryDto } from '../common/paging/page-query.dto.js';
import { invalid, notFound, Problem, staleVersion, wrongStage } from '../common/problems/problem.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { AgendaItem } from '../meetings/entities/agenda-item.entity.js';
import { Attendance } from '../meetings/entities/attendance.entity.js';
import { Meeting } from '../meetings/entities/meeting.entity.js';
import { Person } from '../people/entities/person.entity.js';
import { CircumstancesService } from './circumstances.service.js';
import { toDecisionDto } from './decision-view.js';
import type { AmendDecisionDto, DecisionDto, DecisionListDto, DecisionSummaryListDto, WriteDecisionDto } from './dto/decision.dto.js';
import { Decision } from './entities/decision.entity.js';

@Injectable()
export class DecisionsService {
  constructor(
    private readonly access: AccessService,
    private readonly work: UnitOfWork,
    private readonly circumstances: CircumstancesService,
    private readonly dataSource: DataSource,
  ) {}

  /** A draft is seen by who may write it; what is signed, by every member. */
  async findOfCase(actor: Actor, caseId: string): Promise<DecisionListDto> {
    const found = await this.access.case(actor, Permission.DecisionRead, caseId);
    const all = await this.dataSource.manager.find(Decision, { where: { caseId }, order: { version: 'DESC' } });
    const visible = all.filter((decision) => decision.signedAt || actor.roles.get(found.conferenceId) === 'chair');
    return { items: await Promise.all(visible.map((decision) => this.view(this.dataSource.manager, decision))) };
  }

  async findOne(actor: Actor, id: string): Promise<DecisionDto> {
    const decision = await this.dataSource.manager.findOneBy(Decision, { id });
    if (!decision) throw notFound('decision');
    const found = await this.access.case(actor, Permission.DecisionRead, decision.caseId);
    if (!decision.signedAt && actor.roles.get(found.conferenceId) !== 'chair') throw notFound('decision');
    return this.view(this.dataSource.manager, decision);
  }

  async findOfConference(actor: Actor, conferenceId: string, query: PageQueryDto): Promise<DecisionSummaryListDto> {
    this.access.conference(actor, Permission.DecisionRead, conferenceId);
    const limit = query.limit ?? 25;
    const before = query.cursor ? Number(decodeCursor(query.cursor, 1)[0]) : null;
    const rows = await this.dataSource.manager.find(Decision, {
      where: { conferenceId, number: before ? LessThan(before) : Not(IsNull()) },
      relations: { case: true },
      order: { number: 'DESC' },
      take: limit + 1,
    });
    const page = pageOf(rows, limit, (row) => [row.number]);
    return {
      nextCursor: page.nextCursor,
      items: page.items.map((row) => ({
        id: row.id,
        caseId: row.caseId,
        caseCode: row.case.code,
        number: row.number!,
        version: row.version,
        kind: row.record!.kind,
        signedAt: row.signedAt!.toISOString(),
        signedBy: row.record!.signedBy,
      })),
    };
  }

  /** Saves the draft; begins one where there is none. A draft can be written from the meeting's start on. */
  async write(actor: Actor, caseId: string, body: WriteDecisionDto): Promise<DecisionDto> {
    return this.work.run(actor, async (tx) => {
      const found = await this.access.case(actor, Permission.DecisionWrite, caseId, { stages: ['listed', 'decided', 'final', 'reported'], manager: tx.manager, lock: true });
      const draft = await tx.manager.findOneBy(Decision, { caseId, signedAt: IsNull() });
      if (!draft && found.stage !== 'listed') throw wrongStage('The decision is signed; amend it to begin a new version.');
      const meetingId = draft?.meetingId ?? (await this.runningMeeting(tx.manager, caseId));
      await this.refuseUnfit(tx.manager, found, meetingId, body);
      const content: DecisionContent = {
        chosenOptionId: body.chosenOptionId ?? null,
        text: body.text ?? '',
        conditions: body.conditions ?? '',
        timing: body.timing ?? '',
        dissent: body.dissent.map(({ personId, words }) => ({ personId, words })),
      };
      const saved = draft ? await this.saveDraft(tx.manager, draft, body.baseRevision, content) : await this.begin(tx.manager, actor, found, meetingId, content, body.baseRevision);
      await tx.audit({ action: 'decision.write', recordKind: 'decision', recordId: saved.id, caseId, conferenceId: found.conferenceId, details: { revision: saved.revision } });
      await tx.event({ kind: 'decision-changed', conferenceId: found.conferenceId, caseId });
      return this.view(tx.manager, saved);
    });
  }

  /** Begins a new version of a signed decision, with its content to start from. */
  async amend(actor: Actor, id: string, body: AmendDecisionDto): Promise<DecisionDto> {
    const signed = await this.dataSource.manager.findOneBy(Decision, { id });
    if (!signed) throw notFound('decision');
    return this.work.run(actor, async (tx) => {
      const found = await this.access.case(actor, Permission.DecisionWrite, signed.caseId, { stages: ['decided', 'final', 'reported'], manager: tx.manager, lock: true });
      const newest = await tx.manager.findOneOrFail(Decision, { where: { caseId: found.id }, order: { version: 'DESC' } });
      if (!newest.signedAt) throw new Problem('conflict', 'An amendment is being drafted already.');
      if (newest.id !== signed.id) throw new Problem('conflict', 'This version was replaced; amend the newest one.');
      const draft = await tx.manager.save(
        tx.manager.create(Decision, {
          conferenceId: signed.conferenceId,
          caseId: found.id,
          meetingId: signed.meetingId,
          version: signed.version + 1,
          content: signed.content,
          amendmentReason: body.reason,
          draftedById: actor.personId,
        }),
      );
      await tx.audit({ action: 'decision.amend', recordKind: 'decision', recordId: draft.id, caseId: found.id, conferenceId: found.conferenceId, details: { version: draft.version } });
      await tx.event({ kind: 'decision-changed', conferenceId: found.conferenceId, caseId: found.id });
      return this.view(tx.manager, draft);
    });
  }

  /** For a use case that has asked for access. */
  async view(manager: EntityManager, decision: Decision): Promise<DecisionDto> {
    const found = await manager.findOneOrFail(Case, { where: { id: decision.caseId }, relations: { conference: true } });
    const ids = decision.content.dissent.map((entry) => entry.personId);
    const [meeting, dissenters, versions, circumstances] = await Promise.all([
      decision.meetingId ? manager.findOneBy(Meeting, { id: decision.meetingId }) : null,
      ids.length ? manager.find(Person, { where: { id: In(ids) }, relations: { unit: true } }) : [],
      manager.find(Decision, { select: { id: true, version: true, number: true }, where: { caseId: decision.caseId } }),
      decision.signedAt ? { rounds: [], attendance: [], quorum: { met: true, missing: [] } } : this.circumstances.gather(manager, found, decision.meetingId),
    ]);
    return toDecisionDto({
      decision,
      case: found,
      meetingAt: meeting?.startsAt ?? null,
      dissenters,
      signedBy: decision.record?.signedBy ?? null,
      circumstances,
      replacesNumber: versions.find((other) => other.version === decision.version - 1)?.number ?? null,
      replacedByNumber: versions.find((other) => other.version === decision.version + 1)?.number ?? null,
    });
  }

  private async runningMeeting(manager: EntityManager, caseId: string): Promise<string> {
    const item = await manager.findOneBy(AgendaItem, { caseId, state: 'listed', meeting: { state: 'running' } });
    if (!item) throw wrongStage('The decision is written at the meeting: start the meeting first.');
    return item.meetingId;
  }

  private async refuseUnfit(manager: EntityManager, found: Case, meetingId: string | null, body: WriteDecisionDto): Promise<void> {
    const options = found.content.options.options ?? [];
    if (body.chosenOptionId && !options.some((option) => option.id === body.chosenOptionId))
      throw invalid('chosenOptionId', 'unknown-option', 'Choose one of the options of the case.');
    const ids = body.dissent.map((entry) => entry.personId);
    if (new Set(ids).size !== ids.length) throw invalid('dissent', 'twice', 'One dissent for each person.');
    const present = ids.length && meetingId ? await manager.countBy(Attendance, { meetingId, personId: In(ids), state: In(['present', 'remote']) }) : 0;
    if (present !== ids.length) throw invalid('dissent', 'not-present', 'A dissent is of somebody who was at the meeting.');
  }

  private async saveDraft(manager: EntityManager, draft: Decision, baseRevision: number | undefined, content: DecisionContent): Promise<Decision> {
    if (baseRevision !== draft.revision)
      throw staleVersion('The draft was changed meanwhile. Your text is kept here; compare it with the newer one.', {
        currentRevision: draft.revision,
        current: draft.content,
      });
    draft.content = content;
    draft.revision += 1;
    await manager.update(Decision, { id: draft.id }, { content, revision: draft.revision });
    return draft;
  }

  private async begin(
    manager: EntityManager,
    actor: Actor,
    found: Case,
    meetingId: string | null,
    content: DecisionContent,
    baseRevision: number | undefined,
  ): Promise<Decision> {
    if (baseRevision !== undefined) throw staleVersion('There is no draft any more.', { currentRevision: null });
    const { rounds } = await this.circumstances.gather(manager, found, meetingId);
    const rated = rounds.filter((round) => round.figures.some((one) => one.n > 0));
    const figures = rated.at(-1)?.figures ?? [];
    const best = [...figures].sort((a, b) => (b.median ?? 0) - (a.median ?? 0))[0];
    return manager.save(
      manager.create(Decision, {
        conferenceId: found.conferenceId,
        caseId: found.id,
        meetingId,
        version: 1,
        content: { ...content, chosenOptionId: content.chosenOptionId ?? (best?.median ? best.optionId : null) },
        draftedById: actor.personId,
      }),
    );
  }
}
