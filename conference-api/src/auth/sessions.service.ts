import { Injectable } from '@nestjs/common';
import type { Request } from 'express';
import { randomUUID } from 'node:crypto';
import { DataSource, type EntityManager, IsNull, MoreThan, Not } from 'typeorm';
import type { Actor } from '../access/actor.js';
import { Problem } from '../common/problems/problem.js';
import { Settings } from '../config/settings.js';
import { type Transaction, UnitOfWork } from '../database/unit-of-work.js';
import type { SessionListDto } from './dto/auth.dto.js';
import { RefreshToken } from './entities/refresh-token.entity.js';
import { Session } from './entities/session.entity.js';
import { fingerprint, newSecret } from './secrets.js';

const DAY = 24 * 60 * 60 * 1000;

export type SessionEnd = 'signed-out' | 'replaced' | 'ended-elsewhere' | 'refresh-reuse' | 'password-changed' | 'password-reset' | 'deactivated';

export interface OpenSession {
  id: string;
  personId: string;
  refreshToken: string;
  expiresAt: Date;
}

/** Sessions: one for each sign-in, with the family of its refresh tokens. */
@Injectable()
export class SessionsService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly work: UnitOfWork,
    private readonly settings: Settings,
  ) {}

  async open(tx: Transaction, personId: string, request: Request): Promise<OpenSession> {
    const id = randomUUID();
    const expiresAt = new Date(tx.now.getTime() + this.settings.sessionDays * DAY);
    await tx.manager.insert(Session, { id, personId, ...whence(request), createdAt: tx.now, lastUsedAt: tx.now, expiresAt, endedAt: null, endedWhy: null });
    return { id, personId, expiresAt, refreshToken: await this.addToken(tx, id) };
  }

  /** A new refresh token for this one; one that was used already ends its session, for there are two who hold it. */
  renew(token: string, request: Request): Promise<OpenSession | null> {
    return this.work.run({ personId: null, address: request.ip ?? '' }, async (tx) => {
      const found = await tx.manager
        .createQueryBuilder(RefreshToken, 'token')
        .innerJoinAndSelect('token.session', 'session')
        .where('token.hash = :hash', { hash: fingerprint(token) })
        .setLock('pessimistic_write')
        .getOne();
      if (!found || found.session.endedAt || found.session.expiresAt <= tx.now) return null;
      const { session } = found;
      if (found.usedAt) {
        await this.end(tx.manager, { id: session.id }, 'refresh-reuse', tx.now);
        await tx.audit({ action: 'auth.refresh-reuse', recordKind: 'session', recordId: session.id, details: { personId: session.personId } });
        return null;
      }
      await tx.manager.update(RefreshToken, { hash: found.hash }, { usedAt: tx.now });
      await tx.manager.update(Session, { id: session.id }, { lastUsedAt: tx.now, ...whence(request) });
      return { id: session.id, personId: session.personId, expiresAt: session.expiresAt, refreshToken: await this.addToken(tx, session.id) };
    });
  }

  /** Ends the session that the token belongs to, if it still runs. */
  endOfToken(token: string, why: SessionEnd, request: Request): Promise<void> {
    return this.work.run({ personId: null, address: request.ip ?? '' }, async (tx) => {
      const found = await tx.manager.findOne(RefreshToken, { where: { hash: fingerprint(token) }, relations: { session: true } });
      if (!found || found.session.endedAt) return;
      const { id, personId } = found.session;
      await this.end(tx.manager, { id }, why, tx.now);
      await tx.audit({ action: 'auth.sign-out', recordKind: 'session', recordId: id, details: { personId, why } });
    });
  }

  /** Ends all sessions of a person, save the one given; says how many. */
  endAllOf(tx: Transaction, personId: string, why: SessionEnd, exceptId?: string): Promise<number> {
    return this.end(tx.manager, { personId, ...(exceptId ? { id: Not(exceptId) } : {}) }, why, tx.now);
  }

  async findOwn(actor: Actor): Promise<SessionListDto> {
    const sessions = await this.dataSource.manager.find(Session, {
      where: { personId: actor.personId, endedAt: IsNull(), expiresAt: MoreThan(new Date()) },
      order: { lastUsedAt: 'DESC', id: 'ASC' },
      take: 100,
    });
    return {
      items: sessions.map((session) => ({
        id: session.id,
        device: session.device,
        address: session.address,
        createdAt: session.createdAt.toISOString(),
        lastUsedAt: session.lastUsedAt.toISOString(),
        isCurrent: session.id === actor.sessionId,
      })),
    };
  }

  endOthers(actor: Actor): Promise<void> {
    return this.work.run(actor, async (tx) => {
      const sessions = await this.endAllOf(tx, actor.personId, 'ended-elsewhere', actor.sessionId);
      await tx.audit({ action: 'auth.end-sessions', recordKind: 'person', recordId: actor.personId, details: { sessions } });
    });
  }

  endOwn(actor: Actor, id: string): Promise<void> {
    return this.work.run(actor, async (tx) => {
      const ended = await this.end(tx.manager, { id, personId: actor.personId }, 'ended-elsewhere', tx.now);
      if (!ended) throw new Problem('not-found', 'You have no such session, or it has ended already.');
      await tx.audit({ action: 'auth.end-session', recordKind: 'session', recordId: id });
    });
  }

  private async end(manager: EntityManager, which: Record<string, unknown>, why: SessionEnd, now: Date): Promise<number> {
    const { affected } = await manager.update(Session, { ...which, endedAt: IsNull() }, { endedAt: now, endedWhy: why });
    return affected ?? 0;
  }

  private async addToken(tx: Transaction, sessionId: string): Promise<string> {
    const token = newSecret();
    await tx.manager.insert(RefreshToken, { hash: fingerprint(token), sessionId, createdAt: tx.now, usedAt: null });
    return token;
  }
}

const whence = (request: Request) => ({
  device: (request.get('user-agent') ?? '').replace(/[^\x20-\x7e]/g, '').slice(0, 255) || 'Unknown device',
  address: (request.ip ?? '').slice(0, 64),
});
