import { Injectable } from '@nestjs/common';
import { randomUUID } from 'node:crypto';
import { Brackets, DataSource, In, Not } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { decodeCursor, pageOf } from '../common/paging/cursor.js';
import { invalid, notFound, Problem, staleVersion } from '../common/problems/problem.js';
import { Conference } from '../conferences/entities/conference.entity.js';
import { type Transaction, UnitOfWork } from '../database/unit-of-work.js';
import { AgendaMailsService } from './agenda-mails.service.js';
import { moveCases } from './case-moves.js';
import type { CancelMeetingDto, CreateMeetingDto, ListMeetingsDto, MeetingDto, MeetingListDto, UpdateMeetingDto } from './dto/meeting.dto.js';
import { AgendaItem } from './entities/agenda-item.entity.js';
import { Meeting } from './entities/meeting.entity.js';
import { MeetingAccessService } from './meeting-access.service.js';
import { agendaDueAt } from './meeting-times.js';
import { MeetingViewService, toSummary } from './meeting-view.service.js';

/** A meeting is listed as coming until this long after its start, so that a late start does not hide it. */
const GRACE_MS = 12 * 3_600_000;
const FURTHEST_MS = 2 * 366 * 24 * 3_600_000;

@Injectable()
export class MeetingsService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly work: UnitOfWork,
    private readonly access: AccessService,
    private readonly meetings: MeetingAccessService,
    private readonly view: MeetingViewService,
    private readonly mails: AgendaMailsService,
  ) {}

  async findForMember(actor: Actor, query: ListMeetingsDto): Promise<MeetingListDto> {
    return this.find([...actor.roles.keys()], query);
  }

  async findOfConference(actor: Actor, conferenceId: string, query: ListMeetingsDto): Promise<MeetingListDto> {
    this.access.conference(actor, Permission.AgendaRead, conferenceId);
    return this.find([conferenceId], query);
  }

  async findOne(actor: Actor, id: string): Promise<MeetingDto> {
    return this.view.show(actor, await this.meetings.meeting(actor, Permission.AgendaRead, id));
  }

  /** Outside the slot. */
  async create(actor: Actor, conferenceId: string, body: CreateMeetingDto): Promise<MeetingDto> {
    this.access.conference(actor, Permission.AgendaWrite, conferenceId);
    return this.work.run(actor, async (tx) => {
      // the conference's row is held, so that two meetings at one time can not come in together
      const conference = await tx.manager.findOne(Conference, { where: { id: conferenceId }, lock: { mode: 'pessimistic_write' } });
      if (!conference) throw notFound('conference');
      const startsAt = await this.freeTime(tx, conferenceId, body.startsAt);
      const meeting = tx.manager.create(Meeting, {
        id: randomUUID(),
        conferenceId,
        // it stands for no date of the slot: the moment it was made is no slot's either
        slotAt: tx.now,
        ofSlot: false,
        startsAt,
        minutes: body.minutes,
        state: 'planned',
        agendaDueAt: agendaDueAt(startsAt, conference.agendaHoursBefore, tx.now),
      });
      await tx.manager.insert(Meeting, meeting);
      await tx.audit({ action: 'meeting.create', recordKind: 'meeting', recordId: meeting.id, conferenceId });
      await tx.event({ kind: 'meeting-changed', conferenceId, meetingId: meeting.id });
      const made = await tx.manager.findOneOrFail(Meeting, { where: { id: meeting.id }, relations: { conference: true } });
      return this.view.show(actor, made, tx.manager);
    });
  }

  /** Where the agenda had been sent, every member gets the new time at once. */
  async move(actor: Actor, id: string, body: UpdateMeetingDto): Promise<MeetingDto> {
    return this.work.run(actor, async (tx) => {
      const meeting = await this.meetings.meeting(actor, Permission.AgendaWrite, id, { states: ['planned'], manager: tx.manager, lock: true });
      if (meeting.version !== body.baseVersion)
        throw staleVersion('The meeting was changed meanwhile. Look at what is there now, and make your change again.', {
          currentVersion: meeting.version,
          current: await this.view.show(actor, meeting, tx.manager),
        });
      const isMoved = new Date(body.startsAt).getTime() !== meeting.startsAt.getTime();
      if (!isMoved && body.minutes === meeting.minutes) return this.view.show(actor, meeting, tx.manager);
      const startsAt = isMoved ? await this.freeTime(tx, meeting.conferenceId, body.startsAt, id) : meeting.startsAt;
      const changes = {
        startsAt,
        minutes: body.minutes,
        agendaDueAt: isMoved ? agendaDueAt(startsAt, meeting.conference.agendaHoursBefore, tx.now) : meeting.agendaDueAt,
        version: meeting.version + 1,
      };
      await tx.manager.update(Meeting, { id }, changes);
      Object.assign(meeting, changes);
      await tx.audit({ action: 'meeting.move', recordKind: 'meeting', recordId: id, conferenceId: meeting.conferenceId, details: { startsAt: startsAt.toISOString(), minutes: body.minutes } });
      await tx.event({ kind: 'meeting-changed', conferenceId: meeting.conferenceId, meetingId: id });
      if (meeting.agendaSendings > 0) await this.mails.send(tx, meeting);
      return this.view.show(actor, meeting, tx.manager);
    });
  }

  /** Its cases are open again; where the agenda had been sent, every member's calendar is told. */
  async cancel(actor: Actor, id: string, body: CancelMeetingDto): Promise<MeetingDto> {
    return this.work.run(actor, async (tx) => {
      const meeting = await this.meetings.meeting(actor, Permission.AgendaWrite, id, { states: ['planned'], manager: tx.manager, lock: true });
      const items = await tx.manager.find(AgendaItem, { where: { meetingId: id, state: 'listed' } });
      await tx.manager.update(AgendaItem, { meetingId: id, state: 'listed' }, { state: 'deferred', deferredReason: 'The meeting was cancelled.' });
      await moveCases(tx, items.map((item) => item.caseId), 'open', { meetingId: id, conferenceId: meeting.conferenceId });
      const changes = { state: 'cancelled' as const, cancelledReason: body.reason, version: meeting.version + 1 };
      await tx.manager.update(Meeting, { id }, changes);
      Object.assign(meeting, changes);
      await tx.audit({ action: 'meeting.cancel', recordKind: 'meeting', recordId: id, conferenceId: meeting.conferenceId, details: { cases: items.length } });
      await tx.event({ kind: 'meeting-changed', conferenceId: meeting.conferenceId, meetingId: id });
      if (meeting.agendaSendings > 0) await this.mails.send(tx, meeting, true);
      return this.view.show(actor, meeting, tx.manager);
    });
  }

  /** Coming ones, cancelled ones among them, by time ascending; past ones descending. */
  private async find(conferenceIds: string[], { when = 'upcoming', cursor, limit = 25 }: ListMeetingsDto): Promise<MeetingListDto> {
    if (!conferenceIds.length) return { items: [], nextCursor: null };
    const isUpcoming = when === 'upcoming';
    const from = new Date(Date.now() - GRACE_MS);
    const rows = this.dataSource.manager
      .createQueryBuilder(Meeting, 'meeting')
      .innerJoinAndSelect('meeting.conference', 'conference')
      .where('meeting.conferenceId IN (:...conferenceIds)', { conferenceIds })
      .andWhere(
        isUpcoming
          ? "(meeting.state = 'running' OR (meeting.state IN ('planned', 'cancelled') AND meeting.startsAt >= :from))"
          : "(meeting.state = 'closed' OR (meeting.state IN ('planned', 'cancelled') AND meeting.startsAt < :from))",
        { from },
      );
    if (cursor) {
      const [at, id] = decodeCursor(cursor, 2);
      const beyond = isUpcoming ? '>' : '<';
      rows.andWhere(new Brackets((or) => or.where(`meeting.startsAt ${beyond} :at`).orWhere(`(meeting.startsAt = :at AND meeting.id ${beyond} :id)`)), {
        at: new Date(String(at)),
        id,
      });
    }
    const order = isUpcoming ? 'ASC' : 'DESC';
    const found = await rows.orderBy('meeting.startsAt', order).addOrderBy('meeting.id', order).limit(limit + 1).getMany();
    const page = pageOf(found, limit, (meeting) => [meeting.startsAt.toISOString(), meeting.id]);
    const figures = await this.view.findFigures(page.items.map((meeting) => meeting.id));
    return { items: page.items.map((meeting) => toSummary(meeting, figures.get(meeting.id))), nextCursor: page.nextCursor };
  }

  private async freeTime(tx: Transaction, conferenceId: string, text: string, exceptId?: string): Promise<Date> {
    const startsAt = new Date(text);
    const ahead = startsAt.getTime() - tx.now.getTime();
    if (!(ahead > 0)) throw invalid('startsAt', 'past', 'The meeting must begin in the future.');
    if (ahead > FURTHEST_MS) throw invalid('startsAt', 'too-far', 'The meeting must begin within two years.');
    const taken = await tx.manager.existsBy(Meeting, { conferenceId, startsAt, state: In(['planned', 'running']), ...(exceptId ? { id: Not(exceptId) } : {}) });
    if (taken) throw new Problem('conflict', 'The conference has a meeting at this time already.');
    return startsAt;
  }
}
