import { Column, CreateDateColumn, Entity, OneToMany, PrimaryGeneratedColumn, type Relation, VersionColumn } from 'typeorm';
import type { ConsensusRule, NamesShown, QuorumRule } from '../../calc/vocabulary/conference.js';
import { Membership } from './membership.entity.js';

@Entity('conferences')
export class Conference {
  @PrimaryGeneratedColumn('uuid')
  id: string;

  @Column({ type: 'varchar', length: 120, unique: true })
  name: string;

  /** Begins the case codes, for example HIP. */
  @Column({ type: 'varchar', length: 6, unique: true })
  code: string;

  /** IANA name, for example Europe/London. */
  @Column({ type: 'varchar', length: 64 })
  timeZone: string;

  /** First meeting, local to the time zone: YYYY-MM-DDTHH:mm. */
  @Column({ type: 'varchar', length: 16 })
  slotStart: string;

  /** RFC 5545, without the prefix. */
  @Column({ type: 'varchar', length: 200, default: 'FREQ=WEEKLY' })
  slotRule: string;

  @Column('int', { default: 60 })
  slotMinutes: number;

  /** How long before the meeting the agenda is sent by itself. */
  @Column('int', { default: 48 })
  agendaHoursBefore: number;

  @Column('json')
  quorumRule: QuorumRule;

  @Column({ type: 'varchar', length: 20, default: 'rand' })
  consensusRule: ConsensusRule;

  @Column({ type: 'varchar', length: 20, default: 'nobody' })
  namesShown: NamesShown;

  /** Last case number given. */
  @Column('int', { default: 0 })
  lastCaseNumber: number;

  /** Last decision number given. */
  @Column('int', { default: 0 })
  lastDecisionNumber: number;

  @VersionColumn()
  version: number;

  @CreateDateColumn({ precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  createdAt: Date;

  @OneToMany(() => Membership, (membership) => membership.conference)
  memberships: Relation<Membership>[];
}
