import { Injectable } from '@nestjs/common';
import { DataSource, In, LessThan } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { decodeCursor, pageOf } from '../common/paging/cursor.js';
import type { PageQueryDto } from '../common/paging/page-query.dto.js';
import { Person } from '../people/entities/person.entity.js';
import type { AuditListDto, ListAuditDto } from './dto/audit.dto.js';
import { AuditEntry } from './entities/audit-entry.entity.js';

/** Reads the trail, newest first. Nothing writes here but the unit of work, and nothing changes an entry. */
@Injectable()
export class AuditService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly access: AccessService,
  ) {}

  async find(actor: Actor, { personId, caseId, action, ...page }: ListAuditDto): Promise<AuditListDto> {
    this.access.site(actor, Permission.AuditRead);
    return this.list({ ...(personId ? { personId } : {}), ...(caseId ? { caseId } : {}), ...(action ? { action } : {}) }, page);
  }

  async findOfCase(actor: Actor, caseId: string, page: PageQueryDto): Promise<AuditListDto> {
    await this.access.case(actor, Permission.CaseAudit, caseId);
    return this.list({ caseId }, page);
  }

  private async list(filter: { personId?: string; caseId?: string; action?: string }, { cursor, limit = 50 }: PageQueryDto): Promise<AuditListDto> {
    const before = cursor ? String(decodeCursor(cursor, 1)[0]) : null;
    const entries = await this.dataSource.manager.find(AuditEntry, {
      where: { ...filter, ...(before ? { id: LessThan(before) } : {}) },
      order: { id: 'DESC' },
      take: limit + 1,
    });
    const { items, nextCursor } = pageOf(entries, limit, ({ id }) => [id]);
    const names = await this.namesOf(items.flatMap(({ personId }) => personId ?? []));
    return {
      items: items.map(({ id, at, personId, action, recordKind, recordId, caseId, address, details }) => ({
        ...{ id, personId, action, recordKind, recordId, caseId, address, details },
        at: at.toISOString(),
        personName: personId ? (names.get(personId) ?? null) : null,
      })),
      nextCursor,
    };
  }

  private async namesOf(ids: string[]): Promise<Map<string, string>> {
    if (!ids.length) return new Map();
    const people = await this.dataSource.manager.find(Person, { where: { id: In([...new Set(ids)]) }, select: { id: true, name: true } });
    return new Map(people.map(({ id, name }) => [id, name]));
  }
}
