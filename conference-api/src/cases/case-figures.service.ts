import { Injectable } from '@nestjs/common';
import { DataSource } from 'typeorm';
import { ReadingService } from '../discussions/reading.service.js';
import { AgendaItem } from '../meetings/entities/agenda-item.entity.js';
import { RatingRound } from '../ratings/entities/rating-round.entity.js';

export interface CaseMeeting {
  id: string;
  startsAt: Date;
}

export interface OpenRound {
  given: number;
  isMineIn: boolean;
}

/** What a list tells of each of its cases; one query for all of them each. */
@Injectable()
export class CaseFiguresService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly reading: ReadingService,
  ) {}

  async findOf(personId: string, caseIds: string[]) {
    const [unread, openQuestions, rounds, meetings] = await Promise.all([
      this.reading.findUnreadOf(personId, caseIds),
      this.reading.findOpenQuestionsOf(caseIds),
      this.findOpenRounds(personId, caseIds),
      this.findMeetings(caseIds),
    ]);
    return { unread, openQuestions, rounds, meetings };
  }

  /** The meeting on whose agenda a case stands, or stood last. */
  async findMeetings(caseIds: string[]): Promise<ReadonlyMap<string, CaseMeeting>> {
    if (!caseIds.length) return new Map();
    const rows = await this.dataSource.manager
      .createQueryBuilder(AgendaItem, 'item')
      .innerJoin('item.meeting', 'meeting')
      .select('item.caseId', 'caseId')
      .addSelect('meeting.id', 'id')
      .addSelect('meeting.startsAt', 'startsAt')
      .where("item.caseId IN (:...caseIds) AND meeting.state <> 'cancelled'", { caseIds })
      .orderBy('meeting.startsAt', 'ASC')
      .getRawMany<CaseMeeting & { caseId: string }>();
    // the latest comes last and stays in the map
    return new Map(rows.map(({ caseId, id, startsAt }) => [caseId, { id, startsAt: new Date(startsAt) }]));
  }

  private async findOpenRounds(personId: string, caseIds: string[]): Promise<ReadonlyMap<string, OpenRound>> {
    if (!caseIds.length) return new Map();
    const rows = await this.dataSource.manager
      .createQueryBuilder(RatingRound, 'round')
      .leftJoin('ballots', 'ballot', 'ballot.roundId = round.id AND ballot.supersededAt IS NULL')
      .select('round.caseId', 'caseId')
      .addSelect('COUNT(ballot.id)', 'given')
      .addSelect('COALESCE(SUM(ballot.personId = :personId), 0)', 'mine')
      .setParameters({ personId })
      .where('round.caseId IN (:...caseIds) AND round.closedAt IS NULL', { caseIds })
      .groupBy('round.caseId')
      .getRawMany<{ caseId: string; given: string; mine: string }>();
    return new Map(rows.map((row) => [row.caseId, { given: Number(row.given), isMineIn: Number(row.mine) > 0 }]));
  }
}
