import { Column, CreateDateColumn, Entity, Index, PrimaryGeneratedColumn } from 'typeorm';
import type { OutboxState } from '../../calc/vocabulary/mail.js';

/** One mail to one person, written in the transaction of what it tells of. */
@Entity('outbox_mails')
@Index(['state', 'nextAttemptAt', 'priority'])
export class OutboxMail {
  @PrimaryGeneratedColumn({ type: 'bigint' })
  id: string;

  /** What it is for, to whom: one purpose is never sent twice. */
  @Column({ type: 'varchar', length: 160, unique: true })
  purpose: string;

  @Column({ type: 'uuid', nullable: true })
  personId: string | null;

  @Column({ type: 'varchar', length: 254 })
  recipient: string;

  @Column({ type: 'varchar', length: 40 })
  template: string;

  /** Codes, names and links; never clinical text. Emptied of secrets once sent. */
  @Column('json')
  data: Record<string, unknown>;

  /** Lower goes first. */
  @Column('tinyint', { default: 5 })
  priority: number;

  @Column({ type: 'varchar', length: 12, default: 'queued' })
  state: OutboxState;

  @Column('int', { default: 0 })
  attempts: number;

  @Column({ type: 'datetime', precision: 3 })
  nextAttemptAt: Date;

  /** The process that holds it now, and until when. */
  @Column({ type: 'varchar', length: 64, nullable: true })
  claimedBy: string | null;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  claimedUntil: Date | null;

  @Column({ type: 'varchar', length: 120 })
  messageId: string;

  @Column({ type: 'varchar', length: 300, nullable: true })
  lastError: string | null;

  @CreateDateColumn({ precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  createdAt: Date;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  sentAt: Date | null;
}
