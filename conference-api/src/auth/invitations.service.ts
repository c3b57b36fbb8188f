import { Injectable } from '@nestjs/common';
import type { Request, Response } from 'express';
import { DataSource } from 'typeorm';
import { Problem } from '../common/problems/problem.js';
import { Settings } from '../config/settings.js';
import { type Transaction, UnitOfWork } from '../database/unit-of-work.js';
import { Person } from '../people/entities/person.entity.js';
import { AuthService } from './auth.service.js';
import type { AcceptInvitationDto, AccessTokenDto, InvitationDto } from './dto/auth.dto.js';
import { OneTimeTokensService } from './one-time-tokens.service.js';
import { PasswordHasher } from './password-hasher.js';
import { requireGoodPassword } from './password-rules.js';
import { SessionsService } from './sessions.service.js';

@Injectable()
export class InvitationsService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly work: UnitOfWork,
    private readonly settings: Settings,
    private readonly links: OneTimeTokensService,
    private readonly hasher: PasswordHasher,
    private readonly sessions: SessionsService,
    private readonly auth: AuthService,
  ) {}

  /** Mails the link; the one before no longer works. */
  async issue(tx: Transaction, person: Pick<Person, 'id' | 'email' | 'name'>, unit: string, conferences: string[]): Promise<void> {
    const { token, hash, expiresAt } = await this.links.issue(tx, 'invitation', person.id);
    await tx.mail([
      {
        purpose: `invitation:${hash.slice(0, 32)}:${person.id}`,
        personId: person.id,
        recipient: person.email,
        template: 'invitation',
        data: { name: person.name, unit, conferences, url: `${this.settings.publicUrl}/invitation/${token}`, expires: expiresAt.toISOString() },
        priority: 2,
      },
    ]);
  }

  async findOpen(token: string): Promise<InvitationDto> {
    const { personId } = await this.requireOpen(token);
    const person = await this.dataSource.manager.findOneOrFail(Person, {
      where: { id: personId },
      relations: { unit: true, memberships: { conference: true } },
    });
    return {
      email: person.email,
      name: person.name,
      unit: person.unit.name,
      conferences: person.memberships.map(({ conference }) => conference.name).sort(),
    };
  }

  async accept(token: string, body: AcceptInvitationDto, request: Request, response: Response): Promise<AccessTokenDto> {
    const { person } = await this.requireOpen(token);
    requireGoodPassword('password', body.password, { email: person.email, name: `${person.name} ${body.name}` });
    const passwordHash = await this.hasher.hash(body.password);
    const session = await this.work.run({ personId: person.id, address: request.ip ?? '' }, async (tx) => {
      await this.links.require('invitation', token, tx.manager);
      await this.links.useUp(tx, person.id);
      await tx.manager.update(Person, { id: person.id }, { name: body.name, passwordHash });
      await tx.audit({ action: 'auth.accept-invitation', recordKind: 'person', recordId: person.id });
      return this.sessions.open(tx, person.id, request);
    });
    return this.auth.admit(session, response);
  }

  private async requireOpen(token: string) {
    const found = await this.links.require('invitation', token);
    if (found.person.passwordHash) throw new Problem('gone', 'This invitation was accepted already. Sign in with your e-mail address and password.');
    return found;
  }
}
