import { Injectable } from '@nestjs/common';
import { DataSource, In } from 'typeorm';
import type { Actor } from '../access/actor.js';
import { toPersonRef } from '../common/people/person-ref.js';
import { Conference } from '../conferences/entities/conference.entity.js';
import { ReadingService } from '../discussions/reading.service.js';
import { ImagesService } from '../images/images.service.js';
import { Person } from '../people/entities/person.entity.js';
import { RatingRound } from '../ratings/entities/rating-round.entity.js';
import { caseActions } from './case-actions.js';
import { CaseFiguresService } from './case-figures.service.js';
import type { CaseDto } from './dto/case.dto.js';
import type { Case } from './entities/case.entity.js';

/** The case page's document; for use cases that have asked for access. */
@Injectable()
export class CaseViewService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly images: ImagesService,
    private readonly reading: ReadingService,
    private readonly figures: CaseFiguresService,
  ) {}

  /** Six queries, side by side, whatever the case holds. */
  async show(actor: Actor, found: Case): Promise<CaseDto> {
    const { manager } = this.dataSource;
    const [people, conference, images, rounds, meetings, unread] = await Promise.all([
      manager.find(Person, { where: { id: In([found.presenterId, found.treatingSurgeonId]) }, relations: { unit: true } }),
      manager.findOneOrFail(Conference, { where: { id: found.conferenceId }, select: { id: true, name: true } }),
      this.images.findForCase(found.id),
      manager.find(RatingRound, { where: { caseId: found.id }, select: { id: true, closedAt: true } }),
      this.figures.findMeetings([found.id]),
      this.reading.findUnreadOf(actor.personId, [found.id]),
    ]);
    const personOf = (id: string) => toPersonRef(people.find((person) => person.id === id)!);
    const meeting = meetings.get(found.id);
    return {
      id: found.id,
      code: found.code,
      conferenceId: found.conferenceId,
      conferenceName: conference.name,
      stage: found.stage,
      presenter: personOf(found.presenterId),
      treatingSurgeon: personOf(found.treatingSurgeonId),
      content: found.content as CaseDto['content'],
      images,
      version: found.version,
      createdAt: found.createdAt.toISOString(),
      updatedAt: found.updatedAt.toISOString(),
      postedAt: found.postedAt?.toISOString() ?? null,
      releasedAt: found.releasedAt?.toISOString() ?? null,
      returnRemark: found.returnRemark,
      withdrawnReason: found.withdrawnReason,
      meeting: meeting ? { id: meeting.id, startsAt: meeting.startsAt.toISOString() } : null,
      unread: unread.get(found.id) ?? 0,
      actions: caseActions(actor, found, rounds),
    };
  }
}
