import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryGeneratedColumn, type Relation, Unique } from 'typeorm';
import type { AgendaItemState } from '../../calc/vocabulary/meetings.js';
import { Case } from '../../cases/entities/case.entity.js';
import { Meeting } from './meeting.entity.js';

@Entity('agenda_items')
@Unique(['meetingId', 'caseId'])
export class AgendaItem {
  @PrimaryGeneratedColumn('uuid')
  id: string;

  @Column('uuid')
  meetingId: string;

  @ManyToOne(() => Meeting, (meeting) => meeting.items, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'meetingId' })
  meeting: Relation<Meeting>;

  @Index()
  @Column('uuid')
  caseId: string;

  @ManyToOne(() => Case, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'caseId' })
  case: Relation<Case>;

  @Column('int')
  position: number;

  @Column('int')
  minutes: number;

  @Column({ type: 'varchar', length: 10, default: 'listed' })
  state: AgendaItemState;

  @Column({ type: 'text', nullable: true })
  deferredReason: string | null;
}
