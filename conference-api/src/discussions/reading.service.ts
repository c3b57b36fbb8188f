import { Injectable } from '@nestjs/common';
import { DataSource } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { Case } from '../cases/entities/case.entity.js';
import { visibleCases } from '../cases/visible-cases.js';
import type { UnreadListDto } from './dto/discussion.dto.js';
import { CaseReading } from './entities/case-reading.entity.js';
import { Remark } from './entities/remark.entity.js';
import { Thread } from './entities/thread.entity.js';

type Counts = ReadonlyMap<string, number>;
type CountRow = { caseId: string; count: string | number };

const asMap = (rows: CountRow[]): Counts => new Map(rows.map((row) => [row.caseId, Number(row.count)]));

/** What a person has read, and how much is new to them. */
@Injectable()
export class ReadingService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly access: AccessService,
  ) {}

  /** Everything said so far counts as read, and nothing that is written meanwhile. */
  async markRead(actor: Actor, caseId: string): Promise<void> {
    await this.access.case(actor, Permission.CaseRead, caseId);
    await this.dataSource.query(
      `INSERT INTO case_readings (personId, caseId, readUpTo)
       SELECT ?, ?, MAX(createdAt) FROM remarks WHERE caseId = ? HAVING MAX(createdAt) IS NOT NULL
       ON DUPLICATE KEY UPDATE readUpTo = GREATEST(readUpTo, VALUES(readUpTo))`,
      [actor.personId, caseId, caseId],
    );
  }

  /** New remarks by case, over all cases that the person may see. */
  async unread(actor: Actor): Promise<UnreadListDto> {
    const visible = visibleCases(actor, 'c');
    const rows = await this.unreadQuery(actor.personId)
      .innerJoin(Case, 'c', 'c.id = r.caseId')
      .andWhere(visible.sql, visible.parameters)
      .getRawMany<CountRow>();
    const items = rows.map((row) => ({ caseId: row.caseId, count: Number(row.count) }));
    return { items, total: items.reduce((sum, item) => sum + item.count, 0) };
  }

  /** New remarks of these cases; no access is asked for. */
  async findUnreadOf(personId: string, caseIds: string[]): Promise<Counts> {
    if (!caseIds.length) return new Map();
    return asMap(await this.unreadQuery(personId).andWhere('r.caseId IN (:...caseIds)', { caseIds }).getRawMany<CountRow>());
  }

  /** Questions to the presenter that are still open; no access is asked for. */
  async findOpenQuestionsOf(caseIds: string[]): Promise<Counts> {
    if (!caseIds.length) return new Map();
    const rows = await this.dataSource.manager
      .createQueryBuilder(Thread, 't')
      .select('t.caseId', 'caseId')
      .addSelect('COUNT(*)', 'count')
      .where("t.caseId IN (:...caseIds) AND t.kind = 'question' AND t.answeredAt IS NULL", { caseIds })
      .groupBy('t.caseId')
      .getRawMany<CountRow>();
    return asMap(rows);
  }

  /** Up to when the person has read the case; null where never. */
  async findReadUpTo(personId: string, caseId: string): Promise<Date | null> {
    return (await this.dataSource.manager.findOneBy(CaseReading, { personId, caseId }))?.readUpTo ?? null;
  }

  private unreadQuery(personId: string) {
    return this.dataSource.manager
      .createQueryBuilder(Remark, 'r')
      .select('r.caseId', 'caseId')
      .addSelect('COUNT(*)', 'count')
      .leftJoin(CaseReading, 'seen', 'seen.caseId = r.caseId AND seen.personId = :personId', { personId })
      .where('r.deletedAt IS NULL AND r.authorId <> :personId')
      .andWhere('(seen.readUpTo IS NULL OR r.createdAt > seen.readUpTo)')
      .groupBy('r.caseId');
  }
}
