import { Column, Entity, JoinColumn, ManyToOne, PrimaryGeneratedColumn, type Relation, Unique } from 'typeorm';
import type { CaseOption } from '../../calc/vocabulary/case-content.js';
import { Case } from '../../cases/entities/case.entity.js';

@Entity('rating_rounds')
@Unique(['caseId', 'number'])
export class RatingRound {
  @PrimaryGeneratedColumn('uuid')
  id: string;

  @Column('uuid')
  caseId: string;

  @ManyToOne(() => Case, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'caseId' })
  case: Relation<Case>;

  /** 1 before the meeting, 2 at it. */
  @Column('int')
  number: number;

  /** The options as they stood when the round opened. */
  @Column('json')
  options: CaseOption[];

  /** Version of the case that is rated. */
  @Column('int')
  caseVersion: number;

  @Column({ type: 'datetime', precision: 3 })
  openedAt: Date;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  closedAt: Date | null;
}
