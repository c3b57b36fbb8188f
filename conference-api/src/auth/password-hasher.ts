import { Injectable } from '@nestjs/common';
import argon2 from 'argon2';
import { randomBytes } from 'node:crypto';

// OWASP Password Storage Cheat Sheet: argon2id with at least 19 MiB, 2 passes, 1 lane
const COST = { type: argon2.argon2id, memoryCost: 19456, timeCost: 2, parallelism: 1 } as const;

/** argon2id over the password's NFKC form, so that it is the same from every keyboard. */
@Injectable()
export class PasswordHasher {
  private nobody: Promise<string> | undefined;

  hash(password: string): Promise<string> {
    return argon2.hash(password.normalize('NFKC'), COST);
  }

  /** With no hash at hand the work is done all the same, so that the time taken tells nothing. */
  async verify(hash: string | null, password: string): Promise<boolean> {
    this.nobody ??= this.hash(randomBytes(32).toString('hex'));
    const matches = await argon2.verify(hash ?? (await this.nobody), password.normalize('NFKC'));
    return hash !== null && matches;
  }

  /** True where the hash was made at another cost than today's. */
  isOutdated(hash: string): boolean {
    return argon2.needsRehash(hash, COST);
  }
}
