import { Column, Entity, Index, PrimaryGeneratedColumn } from 'typeorm';
import type { LiveEventKind } from '../../calc/vocabulary/events.js';

/** Tells open pages that something changed; carries ids only, the page asks again. */
@Entity('live_events')
@Index(['at'])
export class LiveEvent {
  @PrimaryGeneratedColumn({ type: 'bigint' })
  id: string;

  @Column({ type: 'datetime', precision: 3 })
  at: Date;

  @Column({ type: 'varchar', length: 30 })
  kind: LiveEventKind;

  @Column({ type: 'uuid', nullable: true })
  conferenceId: string | null;

  @Column({ type: 'uuid', nullable: true })
  caseId: string | null;

  @Column({ type: 'uuid', nullable: true })
  meetingId: string | null;

  /** Only for this person, where set. */
  @Column({ type: 'uuid', nullable: true })
  personId: string | null;

  /** Who did it: their own pages know already. */
  @Column({ type: 'uuid', nullable: true })
  actorId: string | null;
}
