import { Injectable } from '@nestjs/common';
import { Brackets, DataSource, type EntityManager, type SelectQueryBuilder } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { OneTimeTokensService } from '../auth/one-time-tokens.service.js';
import { SessionsService } from '../auth/sessions.service.js';
import { decodeCursor, pageOf } from '../common/paging/cursor.js';
import { invalid, Problem } from '../common/problems/problem.js';
import { type Transaction, UnitOfWork } from '../database/unit-of-work.js';
import type { ListPeopleDto, PersonDto, PersonListDto, UpdatePersonDto } from './dto/people.dto.js';
import { Person } from './entities/person.entity.js';
import { Unit } from './entities/unit.entity.js';
import { toPersonDto } from './person-dto.js';

@Injectable()
export class PeopleService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly work: UnitOfWork,
    private readonly access: AccessService,
    private readonly sessions: SessionsService,
    private readonly links: OneTimeTokensService,
  ) {}

  async find(actor: Actor, { query, cursor, limit = 50 }: ListPeopleDto): Promise<PersonListDto> {
    this.access.site(actor, Permission.PeopleManage);
    const rows = this.dataSource.manager.createQueryBuilder(Person, 'person').select(['person.id', 'person.name']);
    if (query?.trim()) {
      const part = `%${query.trim().replace(/[\\%_]/g, '\\$&')}%`;
      rows.andWhere(new Brackets((either) => either.where('person.name LIKE :part').orWhere('person.email LIKE :part')), { part });
    }
    if (cursor) {
      const [name, id] = decodeCursor(cursor, 2);
      rows.andWhere('(person.name > :name OR (person.name = :name AND person.id > :id))', { name, id });
    }
    const found = await rows.orderBy('person.name').addOrderBy('person.id').limit(limit + 1).getMany();
    const page = pageOf(found, limit, (person) => [person.name, person.id]);
    const ids = page.items.map(({ id }) => id);
    if (!ids.length) return { items: [], nextCursor: null };
    const people = new Map((await this.whole(this.dataSource.manager).where('person.id IN (:...ids)', { ids }).getMany()).map((person) => [person.id, person]));
    return { items: ids.flatMap((id) => people.get(id) ?? []).map(toPersonDto), nextCursor: page.nextCursor };
  }

  async findOne(actor: Actor, id: string): Promise<PersonDto> {
    this.access.site(actor, Permission.PeopleManage);
    return toPersonDto(await this.require(id));
  }

  async update(actor: Actor, id: string, body: UpdatePersonDto): Promise<PersonDto> {
    this.access.site(actor, Permission.PeopleManage);
    const changes = readChanges(body);
    await this.work.run(actor, async (tx) => {
      if (changes.isActive === false || changes.isAdministrator === false) await requireAnotherAdministrator(tx, id);
      const person = await tx.manager.findOne(Person, { where: { id }, lock: { mode: 'pessimistic_write' } });
      if (!person) throw noSuchPerson();
      if (changes.unitId && !(await tx.manager.existsBy(Unit, { id: changes.unitId }))) throw invalid('unitId', 'unknown', 'There is no such unit. Choose one of the list.');
      const fields = (Object.keys(changes) as (keyof UpdatePersonDto)[]).filter((field) => changes[field] !== person[field]);
      if (!fields.length) return;
      await tx.manager.update(Person, { id }, changes);
      if (fields.includes('isActive') && changes.isActive === false) await this.shutOut(tx, id);
      if (fields.includes('isActive') || fields.includes('isAdministrator')) await tx.event({ kind: 'membership-changed', personId: id });
      await tx.audit({ action: 'person.update', recordKind: 'person', recordId: id, details: { fields, ...flagsOf(changes) } });
    });
    return toPersonDto(await this.require(id));
  }

  async require(id: string, manager: EntityManager = this.dataSource.manager): Promise<Person> {
    const person = await this.whole(manager).where('person.id = :id', { id }).getOne();
    if (!person) throw noSuchPerson();
    return person;
  }

  private async shutOut(tx: Transaction, personId: string): Promise<void> {
    await this.sessions.endAllOf(tx, personId, 'deactivated');
    await this.links.useUp(tx, personId);
  }

  private whole(manager: EntityManager): SelectQueryBuilder<Person> {
    return manager
      .createQueryBuilder(Person, 'person')
      .addSelect('person.passwordHash')
      .innerJoinAndSelect('person.unit', 'unit')
      .leftJoinAndSelect('person.memberships', 'membership')
      .leftJoinAndSelect('membership.conference', 'conference');
  }
}

/** What was sent, without what was left out; null is no value here. */
function readChanges(body: UpdatePersonDto): UpdatePersonDto {
  const changes = Object.fromEntries(Object.entries(body).filter(([, value]) => value !== undefined)) as UpdatePersonDto;
  for (const [field, value] of Object.entries(changes))
    if (value === null) throw invalid(field, 'missing', `${field} can not be emptied. Leave it out to keep it.`);
  if (changes.name !== undefined) {
    changes.name = changes.name.trim();
    if (changes.name === '') throw invalid('name', 'missing', 'A person needs a name.');
  }
  return changes;
}

const flagsOf = ({ isActive, isAdministrator }: UpdatePersonDto) => ({
  ...(isActive === undefined ? {} : { isActive }),
  ...(isAdministrator === undefined ? {} : { isAdministrator }),
});

const noSuchPerson = () => new Problem('not-found', 'There is no such person.');

/** Holds all administrators until the transaction ends, so that two can not put each other out at once. */
async function requireAnotherAdministrator(tx: Transaction, personId: string): Promise<void> {
  const administrators = await tx.manager
    .createQueryBuilder(Person, 'person')
    .addSelect('person.passwordHash')
    .where('person.isAdministrator = TRUE AND person.isActive = TRUE')
    .orderBy('person.id')
    .setLock('pessimistic_write')
    .getMany();
  const able = administrators.filter(({ passwordHash }) => passwordHash !== null);
  if (able.some(({ id }) => id === personId) && able.length === 1)
    throw new Problem('conflict', 'This is the last active administrator. Make another person administrator first.');
}
