import { Injectable } from '@nestjs/common';
import { DataSource } from 'typeorm';
import { mayInConference } from '../access/access.policy.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { pageOf } from '../common/paging/cursor.js';
import { toPersonRef } from '../common/people/person-ref.js';
import { CaseFiguresService } from './case-figures.service.js';
import { cursorOf, filterCases, pagingOf, sortAndPage } from './case-list-query.js';
import type { CaseListDto, CaseListItemDto } from './dto/case.dto.js';
import type { ListCasesDto } from './dto/list-cases.dto.js';
import { Case } from './entities/case.entity.js';
import { visibleCases } from './visible-cases.js';

const PAGE = 25;
const COLUMNS = ['id', 'code', 'title', 'conferenceId', 'presenterId', 'stage', 'side', 'joint', 'urgency', 'updatedAt', 'releasedAt'];

type Figures = Awaited<ReturnType<CaseFiguresService['findOf']>>;

@Injectable()
export class CaseListService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly figures: CaseFiguresService,
  ) {}

  /** One page of the cases that a person may see: five queries, however long it is. */
  async findVisible(actor: Actor, query: ListCasesDto): Promise<CaseListDto> {
    const visible = visibleCases(actor, 'c');
    const limit = query.limit ?? PAGE;
    const builder = this.dataSource.manager
      .createQueryBuilder(Case, 'c')
      .select(COLUMNS.map((column) => `c.${column}`))
      .innerJoin('c.presenter', 'person')
      .innerJoin('person.unit', 'unit')
      .addSelect(['person.id', 'person.name', 'person.discipline', 'unit.id', 'unit.name'])
      .where(visible.sql, visible.parameters);
    filterCases(builder, actor, query);
    const paging = sortAndPage(builder, pagingOf(query, new Date()), query.cursor);
    const rows = await builder.limit(limit + 1).getMany();
    const page = pageOf(rows, limit, (row) => cursorOf(paging, row));
    const figures = await this.figures.findOf(
      actor.personId,
      page.items.map(({ id }) => id),
    );
    return { items: page.items.map((row) => toListItem(actor, row, figures)), nextCursor: page.nextCursor };
  }
}

function toListItem(actor: Actor, row: Case, figures: Figures): CaseListItemDto {
  const round = figures.rounds.get(row.id);
  const isOpenForRating = row.stage === 'open' || row.stage === 'listed';
  return {
    id: row.id,
    code: row.code,
    title: row.title,
    conferenceId: row.conferenceId,
    stage: row.stage,
    side: row.side,
    joint: row.joint,
    urgency: row.urgency,
    presenter: toPersonRef(row.presenter),
    updatedAt: row.updatedAt.toISOString(),
    releasedAt: row.releasedAt?.toISOString() ?? null,
    unread: figures.unread.get(row.id) ?? 0,
    openQuestions: figures.openQuestions.get(row.id) ?? 0,
    ratings: round?.given ?? null,
    awaitingMyRating: isOpenForRating && !!round && !round.isMineIn && mayInConference(actor, Permission.Rate, row.conferenceId),
    isMine: row.presenterId === actor.personId,
    meetingAt: figures.meetings.get(row.id)?.startsAt.toISOString() ?? null,
  };
}
