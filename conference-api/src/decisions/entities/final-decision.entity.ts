import { Column, Entity, JoinColumn, ManyToOne, PrimaryGeneratedColumn, type Relation, Unique } from 'typeorm';
import type { FinalDecisionKind } from '../../calc/vocabulary/decisions.js';
import { Case } from '../../cases/entities/case.entity.js';
import { Person } from '../../people/entities/person.entity.js';

/** What the treating surgeon will do. */
@Entity('final_decisions')
@Unique(['caseId', 'version'])
export class FinalDecision {
  @PrimaryGeneratedColumn('uuid')
  id: string;

  @Column('uuid')
  caseId: string;

  @ManyToOne(() => Case, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'caseId' })
  case: Relation<Case>;

  @Column('int')
  version: number;

  @Column({ type: 'varchar', length: 16 })
  kind: FinalDecisionKind;

  @Column('text')
  reason: string;

  /** Week of the operation, for example 2026-W51; never a date. */
  @Column({ type: 'varchar', length: 8, nullable: true })
  plannedWeek: string | null;

  @Column({ type: 'boolean', nullable: true })
  patientInformed: boolean | null;

  @Column('uuid')
  byId: string;

  @ManyToOne(() => Person, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'byId' })
  by: Relation<Person>;

  @Column({ type: 'datetime', precision: 3 })
  at: Date;
}
