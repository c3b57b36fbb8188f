import { Injectable } from '@nestjs/common';
import { DataSource, LessThan, LessThanOrEqual } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { changedSections, contentDifferences } from '../calc/cases/differences.js';
import { emptyContent } from '../calc/vocabulary/case-content.js';
import { decodeCursor, pageOf } from '../common/paging/cursor.js';
import type { PageQueryDto } from '../common/paging/page-query.dto.js';
import { toPersonRef } from '../common/people/person-ref.js';
import { invalid, notFound } from '../common/problems/problem.js';
import { RatingRound } from '../ratings/entities/rating-round.entity.js';
import type { CaseVersionListDto, DifferencesDto } from './dto/case.dto.js';
import type { Case } from './entities/case.entity.js';
import { CaseVersion } from './entities/case-version.entity.js';

const PAGE = 20;

/** Which version said what. */
@Injectable()
export class CaseHistoryService {
  constructor(
    private readonly access: AccessService,
    private readonly dataSource: DataSource,
  ) {}

  /** The saved versions, newest first, each with the sections that it changed. */
  async versions(actor: Actor, id: string, query: PageQueryDto): Promise<CaseVersionListDto> {
    const found = await this.access.case(actor, Permission.CaseRead, id);
    const first = await this.firstReadable(actor, found);
    const limit = query.limit ?? PAGE;
    const before = query.cursor ? Number(decodeCursor(query.cursor, 1)[0]) : found.version + 1;
    if (!Number.isInteger(before)) throw invalid('cursor', 'cursor', 'cursor must be one that this list gave: leave it out to start again.');
    const rows = await this.dataSource.manager.find(CaseVersion, {
      where: { caseId: id, version: LessThan(before) },
      relations: { author: { unit: true } },
      order: { version: 'DESC' },
      take: limit + 1,
    });
    const readable = rows.filter((row) => row.version >= first);
    const page = pageOf(readable, limit, (row) => [row.version]);
    return {
      items: page.items.map((row, index) => ({
        version: row.version,
        at: row.at.toISOString(),
        author: toPersonRef(row.author),
        sections: changedSections(readable[index + 1]?.content ?? emptyContent(), row.content),
      })),
      nextCursor: page.nextCursor,
    };
  }

  /** What `version` says otherwise than `since`; than the version before where that is left out. */
  async differences(actor: Actor, id: string, version: number, since: number | undefined): Promise<DifferencesDto> {
    const found = await this.access.case(actor, Permission.CaseRead, id);
    const first = await this.firstReadable(actor, found);
    const to = await this.findVersion(id, version, first);
    const from = since === undefined ? await this.findBefore(id, version, first) : await this.findVersion(id, since, first);
    return { from: from?.version ?? 0, to: version, differences: contentDifferences(from?.content ?? emptyContent(), to.content) };
  }

  /**
   * Versions from before the release may hold what the check took out: they are the presenter's, and the
   * coordinator's who checks. The others read from the version on that was released, kept with the first round.
   */
  private async firstReadable(actor: Actor, found: Case): Promise<number> {
    if (found.presenterId === actor.personId || actor.roles.get(found.conferenceId) === 'coordinator') return 1;
    const round = await this.dataSource.manager.findOneBy(RatingRound, { caseId: found.id, number: 1 });
    return round?.caseVersion ?? found.version;
  }

  private async findVersion(caseId: string, version: number, first: number): Promise<CaseVersion> {
    const row = version >= first ? await this.dataSource.manager.findOneBy(CaseVersion, { caseId, version }) : null;
    if (!row) throw notFound('version');
    return row;
  }

  private async findBefore(caseId: string, version: number, first: number): Promise<CaseVersion | null> {
    const row = await this.dataSource.manager.findOne(CaseVersion, { where: { caseId, version: LessThanOrEqual(version - 1) }, order: { version: 'DESC' } });
    return row && row.version >= first ? row : null;
  }
}
