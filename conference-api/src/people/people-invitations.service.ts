import { Injectable } from '@nestjs/common';
import { randomUUID } from 'node:crypto';
import { In } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { InvitationsService } from '../auth/invitations.service.js';
import { normaliseEmail } from '../auth/secrets.js';
import { type FieldError, invalid, Problem } from '../common/problems/problem.js';
import { Conference } from '../conferences/entities/conference.entity.js';
import { Membership } from '../conferences/entities/membership.entity.js';
import { isDuplicate } from '../database/database-errors.js';
import { type Transaction, UnitOfWork } from '../database/unit-of-work.js';
import type { InvitePersonDto, PersonDto } from './dto/people.dto.js';
import { Person } from './entities/person.entity.js';
import { Unit } from './entities/unit.entity.js';
import { PeopleService } from './people.service.js';
import { toPersonDto } from './person-dto.js';

const taken = () => invalid('email', 'taken', 'There is a person with this e-mail address already. Add the memberships there.');

@Injectable()
export class PeopleInvitationsService {
  constructor(
    private readonly work: UnitOfWork,
    private readonly access: AccessService,
    private readonly people: PeopleService,
    private readonly invitations: InvitationsService,
  ) {}

  async invite(actor: Actor, body: InvitePersonDto): Promise<PersonDto> {
    this.access.site(actor, Permission.PeopleManage);
    requireEachOnce(body);
    const id = randomUUID();
    await this.work.run(actor, async (tx) => {
      const email = normaliseEmail(body.email);
      if (await tx.manager.existsBy(Person, { email })) throw taken();
      const { unit, conferences } = await requireKnown(tx, body);
      const person = { id, email, name: body.name, discipline: body.discipline, unitId: unit.id, passwordHash: null, isActive: true, isAdministrator: false };
      await tx.manager.insert(Person, person).catch((error: unknown) => {
        throw isDuplicate(error) ? taken() : error;
      });
      if (body.memberships.length)
        await tx.manager.insert(Membership, body.memberships.map(({ conferenceId, role }) => ({ conferenceId, personId: id, role })));
      await this.invitations.issue(tx, person, unit.name, conferences);
      const roles = body.memberships.map(({ conferenceId, role }) => `${conferenceId}:${role}`);
      await tx.audit({ action: 'person.invite', recordKind: 'person', recordId: id, details: { roles } });
    });
    return toPersonDto(await this.people.require(id));
  }

  async inviteAgain(actor: Actor, id: string): Promise<void> {
    this.access.site(actor, Permission.PeopleManage);
    await this.work.run(actor, async (tx) => {
      await tx.manager.findOne(Person, { where: { id }, lock: { mode: 'pessimistic_write' } });
      const person = await this.people.require(id, tx.manager);
      if (person.passwordHash !== null) throw new Problem('conflict', 'This person has accepted already, and can set a new password from the sign-in page.');
      if (!person.isActive) throw new Problem('conflict', 'This person is not active. Make the person active first.');
      await this.invitations.issue(tx, person, person.unit.name, person.memberships.map(({ conference }) => conference.name).sort());
      await tx.audit({ action: 'person.invite-again', recordKind: 'person', recordId: id });
    });
  }
}

function requireEachOnce({ memberships }: InvitePersonDto): void {
  const ids = memberships.map(({ conferenceId }) => conferenceId);
  const again = ids.findIndex((id, index) => ids.indexOf(id) !== index);
  if (again >= 0) throw invalid(`memberships[${again}].conferenceId`, 'twice', 'Name each conference once.');
}

async function requireKnown(tx: Transaction, { unitId, memberships }: InvitePersonDto): Promise<{ unit: Unit; conferences: string[] }> {
  const errors: FieldError[] = [];
  const unit = await tx.manager.findOneBy(Unit, { id: unitId });
  if (!unit) errors.push({ field: 'unitId', code: 'unknown', message: 'There is no such unit. Choose one of the list.' });
  const ids = memberships.map(({ conferenceId }) => conferenceId);
  const conferences = ids.length ? await tx.manager.find(Conference, { where: { id: In(ids) }, select: { id: true, name: true } }) : [];
  ids.forEach((id, index) => {
    if (!conferences.some((conference) => conference.id === id))
      errors.push({ field: `memberships[${index}].conferenceId`, code: 'unknown', message: 'There is no such conference. Choose one of the list.' });
  });
  if (!unit || errors.length) throw new Problem('invalid', errors[0]!.message, errors);
  return { unit, conferences: conferences.map(({ name }) => name).sort() };
}
