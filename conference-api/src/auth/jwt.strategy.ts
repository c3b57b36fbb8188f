import { Injectable } from '@nestjs/common';
import { PassportStrategy } from '@nestjs/passport';
import type { Request } from 'express';
import { randomUUID } from 'node:crypto';
import passport from 'passport';
import { ExtractJwt, Strategy } from 'passport-jwt';
import { DataSource } from 'typeorm';
import type { Actor } from '../access/actor.js';
import { Problem } from '../common/problems/problem.js';
import { Settings } from '../config/settings.js';
import { TOKEN_AUDIENCE, TOKEN_ISSUER } from './access-tokens.service.js';
import { Session } from './entities/session.entity.js';

/** Turns an access token into the actor; roles are read at each request, so that a removal counts at once. */
@Injectable()
export class JwtStrategy extends PassportStrategy(Strategy) {
  /** Passport is one for the process: a second application in it must not answer for this one. */
  readonly strategyName = `jwt-${randomUUID()}`;

  constructor(
    settings: Settings,
    private readonly dataSource: DataSource,
  ) {
    super({
      jwtFromRequest: ExtractJwt.fromAuthHeaderAsBearerToken(),
      secretOrKey: settings.tokenSecret,
      algorithms: ['HS256'],
      issuer: TOKEN_ISSUER,
      audience: TOKEN_AUDIENCE,
      ignoreExpiration: false,
      passReqToCallback: true,
    });
    passport.use(this.strategyName, this);
  }

  async validate(request: Request, claims: Record<string, unknown>): Promise<Actor | false> {
    const { sub, sid, exp, jti } = claims;
    if (typeof sub !== 'string' || typeof sid !== 'string' || typeof exp !== 'number' || typeof jti !== 'string') return false;
    const session = await this.findLive(sid, sub);
    if (!session) throw new Problem('session-ended', 'This session was ended or has run out. Sign in again.');
    const { person } = session;
    return {
      personId: person.id,
      sessionId: session.id,
      name: person.name,
      isAdministrator: person.isAdministrator,
      roles: new Map(person.memberships.map(({ conferenceId, role }) => [conferenceId, role])),
      address: request.ip ?? '',
    };
  }

  // session, person and roles in one query: it runs before every request
  private findLive(sessionId: string, personId: string): Promise<Session | null> {
    return this.dataSource.manager
      .createQueryBuilder(Session, 'session')
      .innerJoin('session.person', 'person')
      .leftJoin('person.memberships', 'membership')
      .select(['session.id', 'person.id', 'person.name', 'person.isAdministrator', 'membership.conferenceId', 'membership.personId', 'membership.role'])
      .where('session.id = :sessionId AND session.personId = :personId', { sessionId, personId })
      .andWhere('session.endedAt IS NULL AND session.expiresAt > :now AND person.isActive = TRUE', { now: new Date() })
      .getOne();
  }
}
