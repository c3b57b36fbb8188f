import { Injectable } from '@nestjs/common';
import { DataSource, type EntityManager, IsNull } from 'typeorm';
import { Problem } from '../common/problems/problem.js';
import type { Transaction } from '../database/unit-of-work.js';
import { OneTimeToken } from './entities/one-time-token.entity.js';
import { fingerprint, newSecret } from './secrets.js';

const HOUR = 60 * 60 * 1000;

type Purpose = OneTimeToken['purpose'];

const LIFETIMES: Record<Purpose, number> = { invitation: 7 * 24 * HOUR, 'password-reset': HOUR };
const REMEDIES: Record<Purpose, string> = {
  invitation: 'Ask the administrator for a new invitation, or sign in if you have accepted it already.',
  'password-reset': 'Ask for a new e-mail on the sign-in page.',
};

/** The links in invitations and password resets: good once, for a while, and only the last one sent. */
@Injectable()
export class OneTimeTokensService {
  constructor(private readonly dataSource: DataSource) {}

  async issue(tx: Transaction, purpose: Purpose, personId: string): Promise<{ token: string; hash: string; expiresAt: Date }> {
    await this.useUp(tx, personId, purpose);
    const token = newSecret();
    const hash = fingerprint(token);
    const expiresAt = new Date(tx.now.getTime() + LIFETIMES[purpose]);
    await tx.manager.insert(OneTimeToken, { hash, purpose, personId, createdAt: tx.now, expiresAt, usedAt: null });
    return { token, hash, expiresAt };
  }

  /** The token with its person and hash of the password; 404 for none of ours, 410 for one used or too old. Give a manager to lock it. */
  async require(purpose: Purpose, token: string, manager?: EntityManager): Promise<OneTimeToken> {
    const query = (manager ?? this.dataSource.manager)
      .createQueryBuilder(OneTimeToken, 'token')
      .innerJoinAndSelect('token.person', 'person')
      .addSelect('person.passwordHash')
      .where('token.hash = :hash AND token.purpose = :purpose', { hash: fingerprint(token), purpose });
    const found = await (manager ? query.setLock('pessimistic_write') : query).getOne();
    if (!found) throw new Problem('not-found', `This link is not complete, or not one of ours. ${REMEDIES[purpose]}`);
    if (found.usedAt || found.expiresAt <= new Date() || !found.person.isActive)
      throw new Problem('gone', `This link was used already, replaced by a later one, or has run out. ${REMEDIES[purpose]}`);
    return found;
  }

  /** Makes the open links of a person worthless: all, or those of one purpose. */
  async useUp(tx: Transaction, personId: string, purpose?: Purpose): Promise<void> {
    await tx.manager.update(OneTimeToken, { personId, usedAt: IsNull(), ...(purpose ? { purpose } : {}) }, { usedAt: tx.now });
  }
}
