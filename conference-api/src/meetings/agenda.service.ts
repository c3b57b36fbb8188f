import { Injectable } from '@nestjs/common';
import { type EntityManager, In } from 'typeorm';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { Case } from '../cases/entities/case.entity.js';
import { type FieldError, invalid, Problem, staleVersion } from '../common/problems/problem.js';
import { type Transaction, UnitOfWork } from '../database/unit-of-work.js';
import { AgendaMailsService } from './agenda-mails.service.js';
import { moveCases } from './case-moves.js';
import type { AgendaEntryDto, AgendaSentDto, MeetingDto, SendAgendaDto, SetAgendaDto } from './dto/meeting.dto.js';
import { AgendaItem } from './entities/agenda-item.entity.js';
import { Meeting } from './entities/meeting.entity.js';
import { ListableCasesService } from './listable-cases.service.js';
import { MeetingAccessService } from './meeting-access.service.js';
import { MeetingViewService } from './meeting-view.service.js';

/** The agenda of a meeting that has not begun. */
@Injectable()
export class AgendaService {
  constructor(
    private readonly meetings: MeetingAccessService,
    private readonly work: UnitOfWork,
    private readonly view: MeetingViewService,
    private readonly mails: AgendaMailsService,
    private readonly listable: ListableCasesService,
  ) {}

  /** The whole agenda at once. More minutes than the meeting has are no error: what does not fit stands below its end. */
  async set(actor: Actor, id: string, body: SetAgendaDto): Promise<MeetingDto> {
    return this.work.run(actor, async (tx) => {
      const meeting = await this.ofVersion(tx, actor, id, body.baseVersion);
      refuseTwice(body.items);
      const before = await tx.manager.find(AgendaItem, { where: { meetingId: id, state: 'listed' }, order: { position: 'ASC' } });
      if (!isSame(before, body.items)) await this.write(tx, meeting, before, body.items);
      return this.view.show(actor, meeting, tx.manager);
    });
  }

  /** To every member; one in which nothing changed since it was sent is not sent again. */
  async send(actor: Actor, id: string, body: SendAgendaDto): Promise<AgendaSentDto> {
    return this.work.run(actor, async (tx) => {
      const meeting = await this.ofVersion(tx, actor, id, body.baseVersion);
      if (meeting.agendaSentVersion === meeting.version)
        throw new Problem('conflict', 'This agenda was sent already, and nothing has changed since.', [], { sentAt: meeting.agendaSentAt?.toISOString() ?? null });
      const mails = await this.mails.send(tx, meeting);
      return { mails, meeting: await this.view.show(actor, meeting, tx.manager) };
    });
  }

  /** The locked meeting, if it is planned and as the person saw it. */
  private async ofVersion(tx: Transaction, actor: Actor, id: string, baseVersion: number): Promise<Meeting> {
    const meeting = await this.meetings.meeting(actor, Permission.AgendaWrite, id, { states: ['planned'], manager: tx.manager, lock: true });
    if (meeting.version !== baseVersion)
      throw staleVersion('The agenda was changed meanwhile. Look at what is there now, and make your change again.', {
        currentVersion: meeting.version,
        current: await this.view.show(actor, meeting, tx.manager),
      });
    return meeting;
  }

  private async write(tx: Transaction, meeting: Meeting, before: AgendaItem[], entries: AgendaEntryDto[]): Promise<void> {
    const wanted = new Set(entries.map((entry) => entry.caseId));
    const removed = before.filter((item) => !wanted.has(item.caseId));
    const cases = await this.lockCases(tx.manager, [...wanted, ...removed.map((item) => item.caseId)]);
    const there = new Set(before.map((item) => item.caseId));
    const added = entries.filter((entry) => !there.has(entry.caseId)).map((entry) => entry.caseId);
    await this.refuseUnlistable(tx.manager, meeting, entries, new Set(added), cases);

    if (removed.length) await tx.manager.delete(AgendaItem, { id: In(removed.map((item) => item.id)) });
    for (const [position, { caseId, minutes }] of entries.entries()) {
      const item = before.find((other) => other.caseId === caseId);
      if (!item) await tx.manager.insert(AgendaItem, { meetingId: meeting.id, caseId, position, minutes, state: 'listed', deferredReason: null });
      else if (item.position !== position || item.minutes !== minutes) await tx.manager.update(AgendaItem, { id: item.id }, { position, minutes });
    }
    const of = { meetingId: meeting.id, conferenceId: meeting.conferenceId };
    await moveCases(tx, added, 'listed', of);
    await moveCases(tx, removed.map((item) => item.caseId).filter((caseId) => cases.get(caseId)?.stage === 'listed'), 'open', of);
    meeting.version += 1;
    await tx.manager.update(Meeting, { id: meeting.id }, { version: meeting.version });
    const details = { cases: entries.length, added: added.length, removed: removed.length };
    await tx.audit({ action: 'agenda.set', recordKind: 'meeting', recordId: meeting.id, conferenceId: meeting.conferenceId, details });
    await tx.event({ kind: 'meeting-changed', ...of });
  }

  // in the order of their ids, so that two agendas with the same cases do not wait for each other
  private async lockCases(manager: EntityManager, ids: string[]): Promise<ReadonlyMap<string, Case>> {
    if (!ids.length) return new Map();
    const rows = await manager.find(Case, { where: { id: In(ids) }, order: { id: 'ASC' }, lock: { mode: 'pessimistic_write' } });
    return new Map(rows.map((row) => [row.id, row]));
  }

  private async refuseUnlistable(
    manager: EntityManager,
    meeting: Meeting,
    entries: AgendaEntryDto[],
    added: ReadonlySet<string>,
    cases: ReadonlyMap<string, Case>,
  ): Promise<void> {
    const errors: FieldError[] = [];
    const fresh: { field: string; found: Case }[] = [];
    entries.forEach(({ caseId }, index) => {
      if (!added.has(caseId)) return;
      const field = `items[${index}].caseId`;
      const found = cases.get(caseId);
      // a case of another conference, or one that members may not see yet, does not exist here
      if (!found || found.conferenceId !== meeting.conferenceId || ['draft', 'checking', 'withdrawn'].includes(found.stage))
        errors.push({ field, code: 'unknown-case', message: 'There is no such case in this conference.' });
      else fresh.push({ field, found });
    });
    if (errors.length) throw new Problem('invalid', errors[0]!.message, errors);
    for (const { field, found } of fresh)
      if (found.stage !== 'open')
        throw new Problem('conflict', found.stage === 'listed' ? `${found.code} stands on another meeting’s agenda. Take it off there first.` : `${found.code} is decided already.`, [
          { field, code: found.stage === 'listed' ? 'listed-elsewhere' : 'decided', message: `${found.code} can not be listed.` },
        ]);
    const readiness = await this.listable.readinessOf(manager, fresh.map(({ found }) => found));
    for (const { field, found } of fresh) {
      const { canBeListed, missing } = readiness.get(found.id)!;
      if (!canBeListed) errors.push({ field, code: 'not-ready', message: `${found.code} is not ready to be listed. Missing: ${missing.join('; ')}.` });
    }
    if (errors.length) throw new Problem('invalid', errors[0]!.message, errors);
  }
}

function refuseTwice(entries: AgendaEntryDto[]): void {
  const seen = new Set<string>();
  entries.forEach(({ caseId }, index) => {
    if (seen.has(caseId)) throw invalid(`items[${index}].caseId`, 'twice', 'A case stands on an agenda once.');
    seen.add(caseId);
  });
}

const isSame = (items: AgendaItem[], entries: AgendaEntryDto[]) =>
  items.length === entries.length && items.every((item, index) => item.caseId === entries[index]!.caseId && item.minutes === entries[index]!.minutes);
