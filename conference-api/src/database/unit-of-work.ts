import { Injectable } from '@nestjs/common';
import { randomUUID } from 'node:crypto';
import { DataSource, type EntityManager } from 'typeorm';
import { AuditEntry } from '../audit/entities/audit-entry.entity.js';
import type { LiveEventKind } from '../calc/vocabulary/events.js';
import { LiveEvent } from '../events/entities/live-event.entity.js';
import { OutboxMail } from '../mail/entities/outbox-mail.entity.js';
import { isDeadlock } from './database-errors.js';

/** Who acts, and from where; nobody yet where someone is about to sign in. An `Actor` is one. */
export interface ActingPerson {
  personId: string | null;
  address: string;
}

export interface AuditFacts {
  action: string;
  recordKind: string;
  recordId: string;
  caseId?: string | null;
  conferenceId?: string | null;
  details?: AuditEntry['details'];
}

export interface EventFacts {
  kind: LiveEventKind;
  conferenceId?: string | null;
  caseId?: string | null;
  meetingId?: string | null;
  personId?: string | null;
}

export interface MailFacts {
  /** One purpose is written, and so sent, once. */
  purpose: string;
  personId: string | null;
  recipient: string;
  template: string;
  data: Record<string, unknown>;
  priority?: number;
  notBefore?: Date;
}

/** One use case: its change, its audit entry, its mails and its live event stand or fall together. */
export class Transaction {
  constructor(
    readonly manager: EntityManager,
    private readonly actor: ActingPerson | null,
    readonly now: Date,
  ) {}

  async audit(facts: AuditFacts): Promise<void> {
    await this.manager.insert(AuditEntry, {
      at: this.now,
      personId: this.actor?.personId ?? null,
      address: this.actor?.address ?? '',
      action: facts.action,
      recordKind: facts.recordKind,
      recordId: facts.recordId,
      caseId: facts.caseId ?? null,
      conferenceId: facts.conferenceId ?? null,
      details: facts.details ?? {},
    });
  }

  async event(facts: EventFacts): Promise<void> {
    await this.manager.insert(LiveEvent, {
      at: this.now,
      kind: facts.kind,
      conferenceId: facts.conferenceId ?? null,
      caseId: facts.caseId ?? null,
      meetingId: facts.meetingId ?? null,
      personId: facts.personId ?? null,
      actorId: this.actor?.personId ?? null,
    });
  }

  /** Puts mails in the outbox; a purpose that is there already is left alone. */
  async mail(mails: MailFacts[]): Promise<void> {
    if (!mails.length) return;
    await this.manager
      .createQueryBuilder()
      .insert()
      .orIgnore()
      .into(OutboxMail)
      .values(
        mails.map((mail) => ({
          purpose: mail.purpose,
          personId: mail.personId,
          recipient: mail.recipient,
          template: mail.template,
          data: mail.data as object,
          priority: mail.priority ?? 5,
          state: 'queued' as const,
          nextAttemptAt: mail.notBefore ?? this.now,
          messageId: `<${randomUUID()}@kerfside.example>`,
        })),
      )
      .updateEntity(false)
      .execute();
  }
}

@Injectable()
export class UnitOfWork {
  /** The time at which use cases happen; the demo tells its past with another one. */
  clock = () => new Date();

  constructor(private readonly dataSource: DataSource) {}

  /** Runs a use case in one transaction, again from the start where it met another one. */
  async run<T>(actor: ActingPerson | null, work: (transaction: Transaction) => Promise<T>): Promise<T> {
    for (let attempt = 1; ; attempt++) {
      try {
        return await this.dataSource.transaction('READ COMMITTED', (manager) => work(new Transaction(manager, actor, this.clock())));
      } catch (error) {
        if (!isDeadlock(error) || attempt >= 5) throw error;
      }
    }
  }
}
