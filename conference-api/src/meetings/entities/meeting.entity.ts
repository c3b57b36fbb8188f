import { Column, CreateDateColumn, Entity, Index, JoinColumn, ManyToOne, OneToMany, PrimaryGeneratedColumn, type Relation, Unique } from 'typeorm';
import type { MeetingState } from '../../calc/vocabulary/meetings.js';
import { Conference } from '../../conferences/entities/conference.entity.js';
import { AgendaItem } from './agenda-item.entity.js';

@Entity('meetings')
@Unique(['conferenceId', 'slotAt'])
@Index(['conferenceId', 'startsAt'])
@Index(['state', 'agendaDueAt'])
export class Meeting {
  @PrimaryGeneratedColumn('uuid')
  id: string;

  @Column('uuid')
  conferenceId: string;

  @ManyToOne(() => Conference, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'conferenceId' })
  conference: Relation<Conference>;

  /** The date of the slot this meeting stands for, also where it was moved. */
  @Column({ type: 'datetime', precision: 3 })
  slotAt: Date;

  /** False where it was put in by hand, outside the slot's rule. */
  @Column({ default: true })
  ofSlot: boolean;

  @Column({ type: 'datetime', precision: 3 })
  startsAt: Date;

  @Column('int')
  minutes: number;

  @Column({ type: 'varchar', length: 10, default: 'planned' })
  state: MeetingState;

  /** When the server sends the agenda by itself. */
  @Column({ type: 'datetime', precision: 3 })
  agendaDueAt: Date;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  agendaSentAt: Date | null;

  /** How often an agenda went out; the iCalendar SEQUENCE is one less. */
  @Column('int', { default: 0 })
  agendaSendings: number;

  /** The `version` that was last sent, so that an unchanged agenda is not sent twice. */
  @Column({ type: 'int', nullable: true })
  agendaSentVersion: number | null;

  @Column({ type: 'text', nullable: true })
  cancelledReason: string | null;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  startedAt: Date | null;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  closedAt: Date | null;

  /** Raised by one at each change of the agenda. */
  @Column('int', { default: 1 })
  version: number;

  @CreateDateColumn({ precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  createdAt: Date;

  @OneToMany(() => AgendaItem, (item) => item.meeting)
  items: Relation<AgendaItem>[];
}
