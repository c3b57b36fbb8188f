import { Injectable } from '@nestjs/common';
import type { Request } from 'express';
import { setTimeout as pause } from 'node:timers/promises';
import type { Actor } from '../access/actor.js';
import { invalid, Problem } from '../common/problems/problem.js';
import { Settings } from '../config/settings.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { Person } from '../people/entities/person.entity.js';
import { AccountsService } from './accounts.service.js';
import { AttemptsService } from './attempts.service.js';
import type { ChangePasswordDto, RequestPasswordResetDto, SetPasswordDto } from './dto/auth.dto.js';
import { OneTimeTokensService } from './one-time-tokens.service.js';
import { PasswordHasher } from './password-hasher.js';
import { requireGoodPassword } from './password-rules.js';
import { normaliseEmail } from './secrets.js';
import { SessionsService } from './sessions.service.js';

/** Every request for a reset takes this long, so that the time does not tell whether the address is known. */
const RESET_ANSWER_MS = 150;

@Injectable()
export class PasswordsService {
  constructor(
    private readonly work: UnitOfWork,
    private readonly settings: Settings,
    private readonly accounts: AccountsService,
    private readonly attempts: AttemptsService,
    private readonly hasher: PasswordHasher,
    private readonly links: OneTimeTokensService,
    private readonly sessions: SessionsService,
  ) {}

  async requestReset(body: RequestPasswordResetDto, request: Request): Promise<void> {
    const address = request.ip ?? '';
    await this.attempts.begin('password-reset', body.email, address);
    await Promise.all([this.mailReset(normaliseEmail(body.email), address), pause(RESET_ANSWER_MS)]);
  }

  async confirmReset(body: SetPasswordDto, request: Request): Promise<void> {
    const { person } = await this.links.require('password-reset', body.token);
    requireGoodPassword('password', body.password, person);
    const passwordHash = await this.hasher.hash(body.password);
    await this.work.run({ personId: person.id, address: request.ip ?? '' }, async (tx) => {
      await this.links.require('password-reset', body.token, tx.manager);
      await this.links.useUp(tx, person.id);
      await tx.manager.update(Person, { id: person.id }, { passwordHash });
      const sessions = await this.sessions.endAllOf(tx, person.id, 'password-reset');
      await tx.audit({ action: 'auth.password-reset', recordKind: 'person', recordId: person.id, details: { sessions } });
    });
    await this.attempts.forgive(person.email);
  }

  async change(actor: Actor, body: ChangePasswordDto): Promise<void> {
    const person = await this.accounts.findById(actor.personId);
    if (!person || !(await this.verifyOwn(actor.personId, body.current)))
      throw invalid('current', 'wrong', 'This is not your present password.');
    requireGoodPassword('next', body.next, person);
    const passwordHash = await this.hasher.hash(body.next);
    await this.work.run(actor, async (tx) => {
      const now = await this.accounts.lock(tx.manager, actor.personId);
      if (now?.passwordHash !== person.passwordHash) throw new Problem('conflict', 'Your password was changed elsewhere meanwhile. Nothing was changed here.');
      await tx.manager.update(Person, { id: actor.personId }, { passwordHash });
      await this.links.useUp(tx, actor.personId, 'password-reset');
      const sessions = await this.sessions.endAllOf(tx, actor.personId, 'password-changed', actor.sessionId);
      await tx.audit({ action: 'auth.password-change', recordKind: 'person', recordId: actor.personId, details: { sessions } });
    });
  }

  /**
   * True where this is the person's password: asked again before a signature. Slowed like a sign-in
   * (429 after too many), and counted with those.
   */
  async verifyOwn(personId: string, password: string): Promise<boolean> {
    const person = await this.accounts.findById(personId);
    if (!person?.isActive) return false;
    const attempt = await this.attempts.begin('sign-in', person.email, null);
    const isRight = await this.hasher.verify(person.passwordHash, password);
    if (isRight) await this.attempts.succeeded(attempt);
    return isRight;
  }

  private async mailReset(email: string, address: string): Promise<void> {
    const person = await this.accounts.findByEmail(email);
    // who has not accepted the invitation has no password to replace
    if (!person?.isActive || !person.passwordHash) return;
    await this.work.run({ personId: null, address }, async (tx) => {
      const { token, hash, expiresAt } = await this.links.issue(tx, 'password-reset', person.id);
      await tx.mail([
        {
          purpose: `password-reset:${hash.slice(0, 32)}:${person.id}`,
          personId: person.id,
          recipient: person.email,
          template: 'password-reset',
          data: { name: person.name, url: `${this.settings.publicUrl}/reset-password/${token}`, expires: expiresAt.toISOString() },
          priority: 1,
        },
      ]);
      await tx.audit({ action: 'auth.request-reset', recordKind: 'person', recordId: person.id });
    });
  }
}
