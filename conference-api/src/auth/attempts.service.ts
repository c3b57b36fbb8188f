import { Injectable } from '@nestjs/common';
import { DataSource } from 'typeorm';
import { Problem } from '../common/problems/problem.js';
import { SignInFailure } from './entities/sign-in-failure.entity.js';
import { fingerprint, normaliseEmail } from './secrets.js';

const MINUTE = 60_000;

/** How many are borne within the window, for one account and from one address. Common practice, far below the 100 of NIST SP 800-63B-4. */
const LIMITS = {
  'sign-in': { account: 10, address: 60, window: 15 * MINUTE, remedy: 'or set a new password by e-mail' },
  'password-reset': { account: 5, address: 30, window: 60 * MINUTE, remedy: 'and look for the e-mail already sent' },
} as const;
export type AttemptKind = keyof typeof LIMITS;

export interface Attempt {
  id: string;
  account: string;
}

/**
 * Slows guessing, over all processes, through a table. An attempt counts as failed from before its answer
 * is known, so that many at once get no more guesses than one after the other.
 */
@Injectable()
export class AttemptsService {
  constructor(private readonly dataSource: DataSource) {}

  /** Throws 429 once there were too many; without an address only the account is counted. */
  async begin(kind: AttemptKind, email: string, address: string | null): Promise<Attempt> {
    const limits = LIMITS[kind];
    const account = fingerprint(`${kind}:${normaliseEmail(email)}`);
    // kinds are counted apart: asking for mails must not use up the sign-ins of an address
    const from = address === null ? '' : `${kind === 'sign-in' ? '' : `${kind}:`}${address}`.slice(0, 64);
    const at = new Date();
    const { identifiers } = await this.dataSource.manager.insert(SignInFailure, { account, address: from, at });
    const attempt = { id: String(identifiers[0]!['id']), account };
    const since = new Date(at.getTime() - limits.window);
    const [ofAccount, ofAddress] = await Promise.all([
      this.count('account', account, since),
      from === '' ? { count: 0, oldest: at } : this.count('address', from, since),
    ]);
    const full = ofAccount.count > limits.account ? ofAccount : ofAddress.count > limits.address ? ofAddress : null;
    if (!full) return attempt;
    await this.dataSource.manager.delete(SignInFailure, { id: attempt.id });
    const what = full === ofAccount ? 'for this account' : 'from this network address';
    throw tooMany(what, limits.remedy, full.oldest.getTime() + limits.window - at.getTime());
  }

  /** The right password makes earlier failures of the account forgotten. */
  async succeeded(attempt: Attempt): Promise<void> {
    await this.dataSource.manager.delete(SignInFailure, { account: attempt.account });
  }

  /** For whoever has just proved otherwise that the account is theirs. */
  async forgive(email: string): Promise<void> {
    await this.dataSource.manager.delete(SignInFailure, { account: fingerprint(`sign-in:${normaliseEmail(email)}`) });
  }

  private async count(column: 'account' | 'address', value: string, since: Date): Promise<{ count: number; oldest: Date }> {
    const row = await this.dataSource.manager
      .createQueryBuilder(SignInFailure, 'failure')
      .select('COUNT(*)', 'count')
      .addSelect('MIN(failure.at)', 'oldest')
      .where(`failure.${column} = :value AND failure.at > :since`, { value, since })
      .getRawOne<{ count: string; oldest: Date | null }>();
    return { count: Number(row?.count ?? 0), oldest: row?.oldest ?? new Date() };
  }
}

function tooMany(what: string, remedy: string, milliseconds: number): Problem {
  const seconds = Math.max(1, Math.ceil(milliseconds / 1000));
  const minutes = Math.ceil(seconds / 60);
  return new Problem(
    'too-many-attempts',
    `There were too many attempts ${what}. Try again in ${minutes === 1 ? 'a minute' : `${minutes} minutes`}, ${remedy}.`,
    [],
    { retryAfterSeconds: seconds },
    { 'Retry-After': String(seconds) },
  );
}
