import { Injectable, Logger } from '@nestjs/common';
import { randomUUID } from 'node:crypto';
import { DataSource, In, IsNull, MoreThan } from 'typeorm';
import { CalcInputError } from '../calc/common/calc-input-error.js';
import { meetingDatesAfter } from '../calc/planning/meeting-dates.js';
import { Conference } from '../conferences/entities/conference.entity.js';
import { type Transaction, UnitOfWork } from '../database/unit-of-work.js';
import { AgendaItem } from './entities/agenda-item.entity.js';
import { Meeting } from './entities/meeting.entity.js';
import { agendaDueAt } from './meeting-times.js';

const AHEAD = 8;

/** Keeps the next meetings of every conference's slot made, whichever processes run it at once. */
@Injectable()
export class SlotMeetingsService {
  private readonly logger = new Logger(SlotMeetingsService.name);

  constructor(
    private readonly dataSource: DataSource,
    private readonly work: UnitOfWork,
  ) {}

  async makeAhead(now = new Date()): Promise<void> {
    for (const { id } of await this.dataSource.manager.find(Conference, { select: { id: true }, order: { id: 'ASC' } })) await this.makeFor(id, now);
  }

  private async makeFor(conferenceId: string, now: Date): Promise<void> {
    await this.work.run(null, async (tx) => {
      // the lock makes two processes come one after the other; the unique slot would stop the second anyway
      const conference = await tx.manager.findOne(Conference, { where: { id: conferenceId }, lock: { mode: 'pessimistic_write' } });
      if (!conference) return;
      const dates = this.datesOf(conference, now);
      const there = await tx.manager.find(Meeting, { where: [{ conferenceId, slotAt: MoreThan(now) }, { conferenceId, startsAt: MoreThan(now) }] });
      const removed = await this.removeUnused(tx, there, dates);
      const made = await this.insertMissing(tx, conference, there, dates, now);
      const retimed = await this.retime(tx, conference, there, now);
      if (made + removed + retimed === 0) return;
      await tx.audit({ action: 'meeting.plan', recordKind: 'conference', recordId: conferenceId, conferenceId, details: { made, removed, retimed } });
      await tx.event({ kind: 'meeting-changed', conferenceId });
    });
  }

  private datesOf(conference: Conference, now: Date): Date[] {
    const { timeZone, slotStart: start, slotRule: rrule } = conference;
    try {
      return meetingDatesAfter({ timeZone, start, rrule, count: AHEAD }, now);
    } catch (error) {
      if (!(error instanceof CalcInputError)) throw error;
      this.logger.warn(`the slot of conference ${conference.id} gives no date: ${error.code}`);
      return [];
    }
  }

  private async insertMissing(tx: Transaction, conference: Conference, there: Meeting[], dates: Date[], now: Date): Promise<number> {
    const taken = new Set(there.filter((meeting) => meeting.state !== 'cancelled').map((meeting) => meeting.startsAt.getTime()));
    const slots = new Set(there.filter((meeting) => meeting.ofSlot).map((meeting) => meeting.slotAt.getTime()));
    const missing = dates.filter((date) => !slots.has(date.getTime()) && !taken.has(date.getTime()));
    if (!missing.length) return 0;
    await tx.manager
      .createQueryBuilder()
      .insert()
      .orIgnore()
      .into(Meeting)
      .values(
        missing.map((date) => ({
          id: randomUUID(),
          conferenceId: conference.id,
          slotAt: date,
          startsAt: date,
          minutes: conference.slotMinutes,
          state: 'planned' as const,
          agendaDueAt: agendaDueAt(date, conference.agendaHoursBefore, now),
        })),
      )
      .updateEntity(false)
      .execute();
    return missing.length;
  }

  /** Where the slot was changed: meetings of the old one that nobody has touched. Others are left for a person to cancel. */
  private async removeUnused(tx: Transaction, there: Meeting[], dates: Date[]): Promise<number> {
    const last = dates.at(-1);
    if (!last) return 0;
    const times = new Set(dates.map((date) => date.getTime()));
    const stale = there.filter(
      (meeting) =>
        meeting.ofSlot &&
        meeting.state === 'planned' &&
        meeting.agendaSendings === 0 &&
        meeting.slotAt.getTime() === meeting.startsAt.getTime() &&
        meeting.slotAt <= last &&
        !times.has(meeting.slotAt.getTime()),
    );
    if (!stale.length) return 0;
    const used = await tx.manager.find(AgendaItem, { select: { id: true, meetingId: true }, where: { meetingId: In(stale.map((meeting) => meeting.id)) } });
    const unused = stale.filter((meeting) => !used.some((item) => item.meetingId === meeting.id));
    let removed = 0;
    for (const meeting of unused) {
      // asked again in the statement: somebody may have listed a case a moment ago
      const { affected } = await tx.manager.delete(Meeting, { id: meeting.id, version: meeting.version, state: 'planned', agendaSendings: 0 });
      removed += affected ?? 0;
      if (affected) there.splice(there.indexOf(meeting), 1);
    }
    return removed;
  }

  /** Where the conference has changed how long before the meeting its agenda is due. */
  private async retime(tx: Transaction, conference: Conference, there: Meeting[], now: Date): Promise<number> {
    let count = 0;
    for (const { id, startsAt, state, agendaSentAt, agendaDueAt: due } of there) {
      if (state !== 'planned' || agendaSentAt || due <= now) continue;
      const wanted = new Date(startsAt.getTime() - conference.agendaHoursBefore * 3_600_000);
      if (wanted <= now || wanted.getTime() === due.getTime()) continue;
      const { affected } = await tx.manager.update(Meeting, { id, state: 'planned', agendaSentAt: IsNull() }, { agendaDueAt: wanted });
      count += affected ?? 0;
    }
    return count;
  }
}
