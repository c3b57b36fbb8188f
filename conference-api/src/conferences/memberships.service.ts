import { Injectable } from '@nestjs/common';
import { DataSource, type EntityManager } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import type { Role } from '../calc/vocabulary/people.js';
import { toPersonRef } from '../common/people/person-ref.js';
import { notFound, Problem } from '../common/problems/problem.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { Person } from '../people/entities/person.entity.js';
import { ConferenceAccessService } from './conference-access.service.js';
import type { MemberListDto } from './dto/conference.dto.js';
import { Conference } from './entities/conference.entity.js';
import { Membership } from './entities/membership.entity.js';

@Injectable()
export class MembershipsService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly work: UnitOfWork,
    private readonly access: AccessService,
    private readonly conferenceAccess: ConferenceAccessService,
  ) {}

  /** Those who can sign in, or will once they accept. */
  async findOfConference(actor: Actor, conferenceId: string): Promise<MemberListDto> {
    this.conferenceAccess.require(actor, Permission.ConferenceRead, conferenceId);
    await requireConference(this.dataSource.manager, conferenceId);
    const members = await this.dataSource.manager.find(Membership, {
      where: { conferenceId, person: { isActive: true } },
      relations: { person: { unit: true } },
      order: { person: { name: 'ASC', id: 'ASC' } },
    });
    return { items: members.map(({ person, role }) => ({ person: toPersonRef(person), role })) };
  }

  /** Counts at once: roles are read anew at each request. */
  async set(actor: Actor, conferenceId: string, personId: string, role: Role): Promise<void> {
    this.access.site(actor, Permission.ConferencesManage);
    await this.work.run(actor, async (tx) => {
      await requireConference(tx.manager, conferenceId);
      // the person's row is held, so that two who set a role come one after the other
      const person = await tx.manager.findOne(Person, { where: { id: personId }, lock: { mode: 'pessimistic_write' } });
      if (!person) throw new Problem('not-found', 'There is no such person.');
      const before = await tx.manager.findOneBy(Membership, { conferenceId, personId });
      if (before?.role === role) return;
      if (before) await tx.manager.update(Membership, { conferenceId, personId }, { role });
      else await tx.manager.insert(Membership, { conferenceId, personId, role });
      await tx.audit({ action: 'membership.set', recordKind: 'person', recordId: personId, conferenceId, details: { role, before: before?.role ?? null } });
      await tx.event({ kind: 'membership-changed', conferenceId, personId });
    });
  }

  async remove(actor: Actor, conferenceId: string, personId: string): Promise<void> {
    this.access.site(actor, Permission.ConferencesManage);
    await this.work.run(actor, async (tx) => {
      await requireConference(tx.manager, conferenceId);
      const before = await tx.manager.findOne(Membership, { where: { conferenceId, personId }, lock: { mode: 'pessimistic_write' } });
      if (!before) throw new Problem('not-found', 'This person is not a member of the conference.');
      await tx.manager.delete(Membership, { conferenceId, personId });
      await tx.audit({ action: 'membership.remove', recordKind: 'person', recordId: personId, conferenceId, details: { before: before.role } });
      await tx.event({ kind: 'membership-changed', conferenceId, personId });
    });
  }
}

async function requireConference(manager: EntityManager, id: string): Promise<void> {
  if (!(await manager.existsBy(Conference, { id }))) throw notFound('conference');
}
