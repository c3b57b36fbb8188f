import { Injectable } from '@nestjs/common';
import { randomUUID } from 'node:crypto';
import { DataSource } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { invalid, Problem } from '../common/problems/problem.js';
import { isDuplicate } from '../database/database-errors.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import type { UnitDto, UnitListDto, WriteUnitDto } from './dto/people.dto.js';
import { Unit } from './entities/unit.entity.js';

const toUnitDto = ({ id, name, contactEmail }: Unit): UnitDto => ({ id, name, contactEmail });

const refuseTwice = (error: unknown): never => {
  throw isDuplicate(error) ? invalid('name', 'taken', 'There is a unit of this name already.') : error;
};

@Injectable()
export class UnitsService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly work: UnitOfWork,
    private readonly access: AccessService,
  ) {}

  /** For everyone signed in: units are chosen from in forms, and hold nothing of a case. */
  async findAll(): Promise<UnitListDto> {
    const units = await this.dataSource.manager.find(Unit, { order: { name: 'ASC' } });
    return { items: units.map(toUnitDto) };
  }

  create(actor: Actor, body: WriteUnitDto): Promise<UnitDto> {
    this.access.site(actor, Permission.UnitsManage);
    return this.work.run(actor, async (tx) => {
      const unit = { id: randomUUID(), name: body.name, contactEmail: body.contactEmail ?? null, createdAt: tx.now };
      await tx.manager.insert(Unit, unit).catch(refuseTwice);
      await tx.audit({ action: 'unit.create', recordKind: 'unit', recordId: unit.id });
      return toUnitDto(unit);
    });
  }

  update(actor: Actor, id: string, body: WriteUnitDto): Promise<UnitDto> {
    this.access.site(actor, Permission.UnitsManage);
    return this.work.run(actor, async (tx) => {
      const unit = await tx.manager.findOne(Unit, { where: { id }, lock: { mode: 'pessimistic_write' } });
      if (!unit) throw new Problem('not-found', 'There is no such unit.');
      const next = { name: body.name, contactEmail: body.contactEmail === undefined ? unit.contactEmail : body.contactEmail };
      const fields = (['name', 'contactEmail'] as const).filter((field) => next[field] !== unit[field]);
      if (fields.length) {
        await tx.manager.update(Unit, { id }, next).catch(refuseTwice);
        await tx.audit({ action: 'unit.update', recordKind: 'unit', recordId: id, details: { fields } });
      }
      return { id, ...next };
    });
  }
}
