import { Injectable } from '@nestjs/common';
import { DataSource, In, LessThan } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { OUTBOX_STATE_WORDS, type OutboxState } from '../calc/vocabulary/mail.js';
import { decodeCursor, pageOf } from '../common/paging/cursor.js';
import { Problem, wrongStage } from '../common/problems/problem.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import type { ListMailDto, MailQueueDto, QueuedMailDto } from './dto/mail-queue.dto.js';
import { OutboxMail } from './entities/outbox-mail.entity.js';
import { withoutSecrets } from './templates/registry.js';

const WAITING: OutboxState[] = ['queued', 'sending', 'handing-over'];
const RETRIED: readonly OutboxState[] = ['failed', 'uncertain'];
const DROPPED: readonly OutboxState[] = ['queued', 'failed', 'uncertain'];

/** The administrator's page of mails: what waits, what failed, and what a person has to decide. */
@Injectable()
export class MailQueueService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly access: AccessService,
    private readonly work: UnitOfWork,
  ) {}

  async find(actor: Actor, { state, cursor, limit = 50 }: ListMailDto): Promise<MailQueueDto> {
    this.access.site(actor, Permission.MailQueue);
    const before = cursor ? String(decodeCursor(cursor, 1)[0]) : null;
    const rows = await this.dataSource.manager.find(OutboxMail, {
      where: { ...(state ? { state } : {}), ...(before ? { id: LessThan(before) } : {}) },
      order: { id: 'DESC' },
      take: limit + 1,
    });
    const page = pageOf(rows, limit, (mail) => [mail.id]);
    return { items: page.items.map(toDto), nextCursor: page.nextCursor, ...(await this.findWaiting()) };
  }

  /** For the health figure too. */
  async findWaiting(now = new Date()): Promise<{ waiting: number; oldestUnsentSeconds: number | null }> {
    const row = await this.dataSource.manager
      .createQueryBuilder(OutboxMail, 'mail')
      .select('COUNT(*)', 'waiting')
      .addSelect('MIN(mail.createdAt)', 'oldest')
      .where({ state: In(WAITING) })
      .getRawOne<{ waiting: string; oldest: Date | null }>();
    const oldest = row?.oldest ? new Date(row.oldest).getTime() : null;
    return { waiting: Number(row?.waiting ?? 0), oldestUnsentSeconds: oldest === null ? null : Math.max(0, Math.round((now.getTime() - oldest) / 1000)) };
  }

  /** For an uncertain one this can give two mails: that is the person's choice, and stands in the audit trail. */
  retry(actor: Actor, id: string): Promise<QueuedMailDto> {
    return this.change(actor, id, 'mail.retry', RETRIED, (now) => ({ state: 'queued', nextAttemptAt: now, attempts: 0, claimedBy: null, claimedUntil: null }));
  }

  drop(actor: Actor, id: string, reason: string): Promise<QueuedMailDto> {
    return this.change(actor, id, 'mail.drop', DROPPED, (_, mail) => ({
      state: 'dropped',
      lastError: `Dropped: ${reason}`.slice(0, 300),
      data: withoutSecrets(mail.template, mail.data),
      claimedBy: null,
      claimedUntil: null,
    }));
  }

  private change(
    actor: Actor,
    id: string,
    action: string,
    from: readonly OutboxState[],
    changesOf: (now: Date, mail: OutboxMail) => Partial<OutboxMail>,
  ): Promise<QueuedMailDto> {
    this.access.site(actor, Permission.MailQueue);
    return this.work.run(actor, async (tx) => {
      const mail = await tx.manager.findOne(OutboxMail, { where: { id }, lock: { mode: 'pessimistic_write' } });
      if (!mail) throw new Problem('not-found', 'There is no such mail.');
      if (!from.includes(mail.state))
        throw wrongStage(`The mail is '${OUTBOX_STATE_WORDS[mail.state]}'; this is possible for: ${from.map((state) => OUTBOX_STATE_WORDS[state]).join(', ')}.`);
      const changes = changesOf(tx.now, mail);
      await tx.manager.update(OutboxMail, { id }, changes as object);
      await tx.audit({ action, recordKind: 'mail', recordId: id, details: { from: mail.state, template: mail.template } });
      return toDto(Object.assign(mail, changes));
    });
  }
}

const toDto = (mail: OutboxMail): QueuedMailDto => ({
  id: String(mail.id),
  purpose: mail.purpose,
  recipient: mail.recipient,
  template: mail.template,
  state: mail.state,
  attempts: mail.attempts,
  nextAttemptAt: mail.nextAttemptAt.toISOString(),
  createdAt: mail.createdAt.toISOString(),
  sentAt: mail.sentAt?.toISOString() ?? null,
  lastError: mail.lastError,
});
