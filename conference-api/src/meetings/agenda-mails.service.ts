import { Injectable } from '@nestjs/common';
import { Settings } from '../config/settings.js';
import { Membership } from '../conferences/entities/membership.entity.js';
import type { Transaction } from '../database/unit-of-work.js';
import type { AgendaData } from '../mail/templates/agenda-mail.js';
import { AgendaItem } from './entities/agenda-item.entity.js';
import { Meeting } from './entities/meeting.entity.js';

const PRIORITY = 4;

/** Puts the agenda of a meeting into the outbox, for every member who can sign in, and counts the sending. */
@Injectable()
export class AgendaMailsService {
  constructor(private readonly settings: Settings) {}

  /**
   * The meeting's row must be locked and its conference loaded. Each sending has its number in the purpose
   * and in the calendar part's SEQUENCE, so that one is never sent twice and a later one replaces it.
   */
  async send(tx: Transaction, meeting: Meeting, cancelled = false): Promise<number> {
    const sequence = meeting.agendaSendings;
    const items = cancelled ? [] : await this.findItems(tx, meeting.id);
    const members = await tx.manager.find(Membership, {
      where: { conferenceId: meeting.conferenceId, person: { isActive: true } },
      relations: { person: true },
    });
    const data: AgendaData = {
      conference: meeting.conference.name,
      meetingId: meeting.id,
      sequence,
      startsAt: meeting.startsAt.toISOString(),
      minutes: meeting.minutes,
      timeZone: meeting.conference.timeZone,
      items,
      url: `${this.settings.publicUrl}/meetings/${meeting.id}`,
      ...(cancelled ? { cancelled } : {}),
    };
    await tx.mail(
      members.map(({ person }) => ({
        purpose: `agenda:${meeting.id}:${sequence}:${person.id}`,
        personId: person.id,
        recipient: person.email,
        template: 'agenda',
        data: { ...data, name: person.name },
        priority: PRIORITY,
      })),
    );
    const sent = { agendaSendings: sequence + 1, agendaSentAt: tx.now, agendaSentVersion: meeting.version };
    await tx.manager.update(Meeting, { id: meeting.id }, sent);
    Object.assign(meeting, sent);
    const { conferenceId, id } = meeting;
    await tx.audit({ action: 'agenda.send', recordKind: 'meeting', recordId: id, conferenceId, details: { sequence, cases: items.length, mails: members.length, cancelled } });
    await tx.event({ kind: 'meeting-changed', conferenceId, meetingId: id });
    return members.length;
  }

  private async findItems(tx: Transaction, meetingId: string): Promise<AgendaData['items']> {
    const items = await tx.manager
      .createQueryBuilder(AgendaItem, 'item')
      .innerJoin('item.case', 'case')
      .innerJoin('case.presenter', 'presenter')
      .select(['item', 'case.id', 'case.code', 'presenter.id', 'presenter.name'])
      .where("item.meetingId = :meetingId AND item.state = 'listed'", { meetingId })
      .orderBy('item.position', 'ASC')
      .addOrderBy('item.id', 'ASC')
      .getMany();
    return items.map((item) => ({ code: item.case.code, minutes: item.minutes, presenter: item.case.presenter.name }));
  }
}
