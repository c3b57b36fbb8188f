import { Injectable } from '@nestjs/common';
import { randomUUID } from 'node:crypto';
import { DataSource, In, LessThan } from 'typeorm';
import { OutboxMail } from './entities/outbox-mail.entity.js';
import { withoutSecrets } from './templates/registry.js';

/** How long a claimed mail is left alone by the other processes. */
export const LEASE_MS = 60_000;

export interface Claim {
  /** Of this one claim; every later step asks for it, so that two who hold a mail can not both go on. */
  token: string;
  mails: OutboxMail[];
}

/** The steps of a mail through the outbox table. Each is one statement that says from which state it goes. */
@Injectable()
export class OutboxService {
  constructor(private readonly dataSource: DataSource) {}

  /** Takes up to `most` due mails, those of the lowest priority number first; what others hold is passed over. */
  async claim(most: number, now: Date): Promise<Claim> {
    const token = randomUUID();
    const mails = await this.dataSource.transaction('READ COMMITTED', async (manager) => {
      const due = await manager
        .createQueryBuilder(OutboxMail, 'mail')
        .where('mail.state = :state AND mail.nextAttemptAt <= :now', { state: 'queued', now })
        .orderBy('mail.priority', 'ASC')
        .addOrderBy('mail.nextAttemptAt', 'ASC')
        .addOrderBy('mail.id', 'ASC')
        .limit(most)
        .setLock('pessimistic_write')
        .setOnLocked('skip_locked')
        .getMany();
      if (due.length)
        await manager.update(
          OutboxMail,
          { id: In(due.map((mail) => mail.id)) },
          { state: 'sending', claimedBy: token, claimedUntil: new Date(now.getTime() + LEASE_MS), attempts: () => 'attempts + 1' },
        );
      return due;
    });
    for (const mail of mails) mail.attempts += 1;
    return { token, mails };
  }

  /**
   * Ends what a process has left behind. A mail that was not handed over is due again at once; one that may
   * have been is uncertain, and stays so until a person decides.
   */
  async recover(now: Date): Promise<void> {
    const { manager } = this.dataSource;
    const expired = { claimedUntil: LessThan(now) };
    await manager.update(OutboxMail, { state: 'sending', ...expired }, { state: 'queued', nextAttemptAt: now, claimedBy: null, claimedUntil: null });
    await manager.update(
      OutboxMail,
      { state: 'handing-over', ...expired },
      { state: 'uncertain', lastError: 'The server ended while it handed this over. It may have arrived.' },
    );
  }

  /** False where the lease ran out and another process has it. */
  async renew(id: string, token: string, now: Date): Promise<boolean> {
    return this.step(id, token, ['sending'], { claimedUntil: new Date(now.getTime() + LEASE_MS) });
  }

  async markHandingOver(id: string, token: string): Promise<boolean> {
    return this.step(id, token, ['sending'], { state: 'handing-over' });
  }

  async markSent(mail: OutboxMail, token: string, now: Date): Promise<boolean> {
    const data = withoutSecrets(mail.template, mail.data) as object;
    return this.step(mail.id, token, ['handing-over', 'uncertain'], { state: 'sent', sentAt: now, data, lastError: null, claimedBy: null, claimedUntil: null });
  }

  async putBack(id: string, token: string, nextAttemptAt: Date, lastError: string): Promise<boolean> {
    return this.step(id, token, ['sending', 'handing-over'], { state: 'queued', nextAttemptAt, lastError, claimedBy: null, claimedUntil: null });
  }

  async markFailed(id: string, token: string, lastError: string): Promise<boolean> {
    return this.step(id, token, ['sending', 'handing-over'], { state: 'failed', lastError, claimedBy: null, claimedUntil: null });
  }

  async markUncertain(id: string, token: string, lastError: string): Promise<boolean> {
    return this.step(id, token, ['handing-over'], { state: 'uncertain', lastError });
  }

  /** Gives back what was claimed and not begun. */
  async release(ids: string[], token: string): Promise<void> {
    if (!ids.length) return;
    await this.dataSource.manager.update(
      OutboxMail,
      { id: In(ids), state: 'sending', claimedBy: token },
      { state: 'queued', claimedBy: null, claimedUntil: null, attempts: () => 'attempts - 1' },
    );
  }

  private async step(id: string, token: string, from: OutboxMail['state'][], changes: object): Promise<boolean> {
    const { affected } = await this.dataSource.manager.update(OutboxMail, { id, claimedBy: token, state: In(from) }, changes);
    return affected === 1;
  }
}
