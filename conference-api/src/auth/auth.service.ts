import { Injectable } from '@nestjs/common';
import type { Request, Response } from 'express';
import { DataSource } from 'typeorm';
import type { Actor } from '../access/actor.js';
import { Problem } from '../common/problems/problem.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { Person } from '../people/entities/person.entity.js';
import { AccessTokensService } from './access-tokens.service.js';
import { AccountsService } from './accounts.service.js';
import { AttemptsService } from './attempts.service.js';
import type { AccessTokenDto, MeDto, SignInDto } from './dto/auth.dto.js';
import { PasswordHasher } from './password-hasher.js';
import { RefreshCookie } from './refresh-cookie.js';
import { fingerprint, normaliseEmail } from './secrets.js';
import { type OpenSession, SessionsService } from './sessions.service.js';

@Injectable()
export class AuthService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly work: UnitOfWork,
    private readonly accounts: AccountsService,
    private readonly attempts: AttemptsService,
    private readonly hasher: PasswordHasher,
    private readonly sessions: SessionsService,
    private readonly tokens: AccessTokensService,
    private readonly cookie: RefreshCookie,
  ) {}

  async signIn(body: SignInDto, request: Request, response: Response): Promise<AccessTokenDto> {
    const address = request.ip ?? '';
    const attempt = await this.attempts.begin('sign-in', body.email, address);
    const person = await this.accounts.findByEmail(body.email);
    const isRight = await this.hasher.verify(person?.passwordHash ?? null, body.password);
    const session = person && isRight && person.isActive ? await this.openFor(person, body.password, request) : null;
    if (!session) {
      await this.recordFailure(person?.id ?? fingerprint(normaliseEmail(body.email)), address);
      throw new Problem('sign-in-failed', 'The e-mail address or the password is not right. Check both, or set a new password by e-mail.');
    }
    await this.attempts.succeeded(attempt);
    const earlier = this.cookie.read(request);
    // the browser is about to forget that session's cookie
    if (earlier) await this.sessions.endOfToken(earlier, 'replaced', request);
    return this.admit(session, response);
  }

  async refresh(request: Request, response: Response): Promise<AccessTokenDto> {
    const token = this.cookie.read(request);
    const session = token ? await this.sessions.renew(token, request) : null;
    if (session) return this.admit(session, response);
    this.cookie.clear(response);
    throw new Problem('session-ended', 'There is no session to go on with, or it has ended. Sign in again.');
  }

  async signOut(request: Request, response: Response): Promise<void> {
    const token = this.cookie.read(request);
    if (token) await this.sessions.endOfToken(token, 'signed-out', request);
    this.cookie.clear(response);
  }

  /** The tokens of a session just opened or renewed. */
  admit(session: OpenSession, response: Response): Promise<AccessTokenDto> {
    this.cookie.set(response, session.refreshToken, session.expiresAt);
    return this.tokens.issue(session.personId, session.id);
  }

  async me(actor: Actor): Promise<MeDto> {
    const person = await this.dataSource.manager.findOneOrFail(Person, {
      where: { id: actor.personId },
      relations: { unit: true, memberships: { conference: true } },
    });
    return {
      id: person.id,
      name: person.name,
      email: person.email,
      discipline: person.discipline,
      unit: person.unit.name,
      isAdministrator: person.isAdministrator,
      memberships: person.memberships
        .map(({ conference, role }) => ({ conferenceId: conference.id, conferenceName: conference.name, role }))
        .sort((a, b) => a.conferenceName.localeCompare(b.conferenceName)),
    };
  }

  private async openFor(person: Person, password: string, request: Request): Promise<OpenSession | null> {
    const rehashed = this.hasher.isOutdated(person.passwordHash!) ? await this.hasher.hash(password) : null;
    return this.work.run({ personId: person.id, address: request.ip ?? '' }, async (tx) => {
      // a password set or an account closed since the check must not be outrun by this session
      const now = await this.accounts.lock(tx.manager, person.id);
      if (!now?.isActive || now.passwordHash !== person.passwordHash) return null;
      if (rehashed) await tx.manager.update(Person, { id: person.id }, { passwordHash: rehashed });
      const session = await this.sessions.open(tx, person.id, request);
      await tx.audit({ action: 'auth.sign-in', recordKind: 'session', recordId: session.id });
      return session;
    });
  }

  private recordFailure(account: string, address: string): Promise<void> {
    return this.work.run({ personId: null, address }, (tx) => tx.audit({ action: 'auth.sign-in-failed', recordKind: 'person', recordId: account }));
  }
}
