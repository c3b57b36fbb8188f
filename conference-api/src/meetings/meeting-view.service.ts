import { Injectable } from '@nestjs/common';
import { DataSource, type EntityManager, In } from 'typeorm';
import { mayInConference, maySeeCase } from '../access/access.policy.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { quorum } from '../calc/panel/quorum.js';
import { toPersonRef } from '../common/people/person-ref.js';
import { Membership } from '../conferences/entities/membership.entity.js';
import { Ballot } from '../ratings/entities/ballot.entity.js';
import type { AgendaItemDto, AttendanceDto, MeetingActionsDto, MeetingDto, MeetingSummaryDto, QuorumDto } from './dto/meeting.dto.js';
import { AgendaItem } from './entities/agenda-item.entity.js';
import { Attendance } from './entities/attendance.entity.js';
import type { Meeting } from './entities/meeting.entity.js';

export interface AgendaFigures {
  caseCount: number;
  plannedMinutes: number;
}

/** What a page shows of a meeting, by a number of queries that does not hang on the number of cases or members. */
@Injectable()
export class MeetingViewService {
  constructor(private readonly dataSource: DataSource) {}

  /** For a use case that has asked for access; the conference must have been loaded. */
  async show(actor: Actor, meeting: Meeting, manager: EntityManager = this.dataSource.manager): Promise<MeetingDto> {
    const { items, isInfected } = await this.findItems(manager, meeting.id);
    const [ratings, members, attendances] = await Promise.all([
      this.countRatings(manager, items.map((item) => item.caseId)),
      manager.find(Membership, { where: { conferenceId: meeting.conferenceId }, relations: { person: { unit: true } } }),
      manager.find(Attendance, { where: { meetingId: meeting.id }, relations: { person: { unit: true } } }),
    ]);
    const visible = items.filter((item) => maySeeCase(actor, item.case));
    const counted = visible.filter((item) => item.state !== 'deferred');
    return {
      ...toSummary(meeting, { caseCount: counted.length, plannedMinutes: counted.reduce((sum, item) => sum + item.minutes, 0) }),
      startedAt: meeting.startedAt?.toISOString() ?? null,
      closedAt: meeting.closedAt?.toISOString() ?? null,
      cancelledReason: meeting.cancelledReason,
      version: meeting.version,
      items: visible.map((item) => toItemDto(item, ratings.get(item.caseId) ?? 0)),
      attendance: toAttendance(members, attendances),
      quorum: toQuorum(meeting, members, attendances, isInfected),
      actions: toActions(actor, meeting),
    };
  }

  /** For lists: one query for all of them. */
  async findFigures(meetingIds: string[]): Promise<ReadonlyMap<string, AgendaFigures>> {
    if (!meetingIds.length) return new Map();
    const rows = await this.dataSource.manager
      .createQueryBuilder(AgendaItem, 'item')
      .select('item.meetingId', 'meetingId')
      .addSelect('COUNT(*)', 'caseCount')
      .addSelect('SUM(item.minutes)', 'plannedMinutes')
      .where("item.meetingId IN (:...meetingIds) AND item.state <> 'deferred'", { meetingIds })
      .groupBy('item.meetingId')
      .getRawMany<{ meetingId: string; caseCount: string; plannedMinutes: string }>();
    return new Map(rows.map((row) => [row.meetingId, { caseCount: Number(row.caseCount), plannedMinutes: Number(row.plannedMinutes) }]));
  }

  // the long columns of a case stay in the database
  private async findItems(manager: EntityManager, meetingId: string): Promise<{ items: AgendaItem[]; isInfected: boolean }> {
    const { entities, raw } = await manager
      .createQueryBuilder(AgendaItem, 'item')
      .innerJoin('item.case', 'case')
      .innerJoin('case.presenter', 'presenter')
      .innerJoin('presenter.unit', 'unit')
      .select(['item', 'presenter', 'unit'])
      .addSelect(['case.id', 'case.conferenceId', 'case.presenterId', 'case.treatingSurgeonId', 'case.code', 'case.title', 'case.side', 'case.urgency', 'case.stage'])
      .addSelect("JSON_VALUE(case.content, '$.infection.suspicion')", 'suspicion')
      .where('item.meetingId = :meetingId', { meetingId })
      .orderBy('item.position', 'ASC')
      .addOrderBy('item.id', 'ASC')
      .getRawAndEntities<{ suspicion: string | null }>();
    const isInfected = entities.some((item, index) => item.state !== 'deferred' && ['confirmed', 'possible'].includes(raw[index]?.suspicion ?? ''));
    return { items: entities, isInfected };
  }

  /** Members who have rated, in any round. */
  async countRatings(manager: EntityManager, caseIds: string[]): Promise<ReadonlyMap<string, number>> {
    if (!caseIds.length) return new Map();
    const rows = await manager
      .createQueryBuilder(Ballot, 'ballot')
      .innerJoin('ballot.round', 'round')
      .select('round.caseId', 'caseId')
      .addSelect('COUNT(DISTINCT ballot.personId)', 'count')
      .where({ round: { caseId: In(caseIds) } })
      .groupBy('round.caseId')
      .getRawMany<{ caseId: string; count: string }>();
    return new Map(rows.map((row) => [row.caseId, Number(row.count)]));
  }
}

export const toSummary = (meeting: Meeting, figures: AgendaFigures = { caseCount: 0, plannedMinutes: 0 }): MeetingSummaryDto => ({
  id: meeting.id,
  conferenceId: meeting.conferenceId,
  conferenceName: meeting.conference.name,
  startsAt: meeting.startsAt.toISOString(),
  minutes: meeting.minutes,
  timeZone: meeting.conference.timeZone,
  state: meeting.state,
  agendaDueAt: meeting.agendaDueAt.toISOString(),
  agendaSentAt: meeting.agendaSentAt?.toISOString() ?? null,
  ...figures,
});

const toItemDto = (item: AgendaItem, ratings: number): AgendaItemDto => ({
  id: item.id,
  caseId: item.caseId,
  code: item.case.code,
  title: item.case.title,
  side: item.case.side,
  urgency: item.case.urgency,
  stage: item.case.stage,
  presenter: toPersonRef(item.case.presenter),
  position: item.position,
  minutes: item.minutes,
  state: item.state,
  deferredReason: item.deferredReason,
  ratings,
});

/** All members, and whoever was noted at the time and has left since. */
function toAttendance(members: Membership[], attendances: Attendance[]): AttendanceDto[] {
  const stateOf = new Map(attendances.map((attendance) => [attendance.personId, attendance.state]));
  const current = members
    .filter(({ person, personId }) => person.isActive || stateOf.has(personId))
    .map(({ person, personId, role }) => ({ person: toPersonRef(person), role: role as string, state: stateOf.get(personId) ?? null }));
  const memberIds = new Set(members.map((member) => member.personId));
  const former = attendances
    .filter(({ personId }) => !memberIds.has(personId))
    .map(({ person, state }) => ({ person: toPersonRef(person), role: 'former', state }));
  return [...current, ...former].sort(
    (a, b) => a.person.discipline.localeCompare(b.person.discipline) || a.person.name.localeCompare(b.person.name) || a.person.id.localeCompare(b.person.id),
  );
}

function toQuorum(meeting: Meeting, members: Membership[], attendances: Attendance[], isInfected: boolean): QuorumDto {
  const roleOf = new Map(members.map((member) => [member.personId, member.role]));
  const attendees = attendances.flatMap(({ personId, person, state }) => {
    const role = roleOf.get(personId);
    return role ? [{ discipline: person.discipline, role, state }] : [];
  });
  return quorum(meeting.conference.quorumRule, attendees, isInfected);
}

function toActions(actor: Actor, meeting: Meeting): MeetingActionsDto {
  const may = (permission: Permission) => mayInConference(actor, permission, meeting.conferenceId);
  const isPlanned = meeting.state === 'planned';
  const isUnderWay = isPlanned || meeting.state === 'running';
  return {
    editAgenda: isPlanned && may(Permission.AgendaWrite),
    sendAgenda: isPlanned && meeting.agendaSentVersion !== meeting.version && may(Permission.AgendaWrite),
    run: isUnderWay && may(Permission.MeetingRun),
    writeAttendance: isUnderWay && may(Permission.AttendanceWrite),
  };
}
