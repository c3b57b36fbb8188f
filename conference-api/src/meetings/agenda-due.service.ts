import { Injectable } from '@nestjs/common';
import { UnitOfWork } from '../database/unit-of-work.js';
import { Conference } from '../conferences/entities/conference.entity.js';
import { AgendaMailsService } from './agenda-mails.service.js';
import { Meeting } from './entities/meeting.entity.js';

/**
 * Sends agendas whose time has come. A meeting without cases has its agenda sent too, saying so: silence
 * could not be told from a mail that went astray. An agenda that was sent early by hand and changed since
 * goes out again at the set time; one that is changed after the set time is sent by hand.
 */
@Injectable()
export class AgendaDueService {
  constructor(
    private readonly work: UnitOfWork,
    private readonly mails: AgendaMailsService,
  ) {}

  /** How many meetings' agendas it sent. */
  async sendDue(now = new Date()): Promise<number> {
    let count = 0;
    while (await this.sendOne(now)) count += 1;
    return count;
  }

  // one meeting, one transaction; what another process has locked is passed over
  private sendOne(now: Date): Promise<boolean> {
    return this.work.run(null, async (tx) => {
      const meeting = await tx.manager
        .createQueryBuilder(Meeting, 'meeting')
        .where("meeting.state = 'planned' AND meeting.agendaDueAt <= :now AND meeting.startsAt > :now", { now })
        .andWhere('(meeting.agendaSentVersion IS NULL OR (meeting.agendaSentVersion <> meeting.version AND meeting.agendaSentAt < meeting.agendaDueAt))')
        .orderBy('meeting.agendaDueAt', 'ASC')
        .limit(1)
        .setLock('pessimistic_write')
        .setOnLocked('skip_locked')
        .getOne();
      if (!meeting) return false;
      meeting.conference = await tx.manager.findOneByOrFail(Conference, { id: meeting.conferenceId });
      await this.mails.send(tx, meeting);
      return true;
    });
  }
}
