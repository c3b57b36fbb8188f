import { Column, Entity, JoinColumn, ManyToOne, PrimaryGeneratedColumn, type Relation, Unique } from 'typeorm';
import type { OutcomeContent } from '../../calc/vocabulary/outcomes.js';
import { Case } from '../../cases/entities/case.entity.js';
import { Person } from '../../people/entities/person.entity.js';

/** What was found and done, against the plan; an amendment is a new version. */
@Entity('outcomes')
@Unique(['caseId', 'version'])
export class Outcome {
  @PrimaryGeneratedColumn('uuid')
  id: string;

  @Column('uuid')
  caseId: string;

  @ManyToOne(() => Case, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'caseId' })
  case: Relation<Case>;

  @Column('int')
  version: number;

  @Column('json')
  content: OutcomeContent;

  @Column({ type: 'text', nullable: true })
  amendmentReason: string | null;

  @Column('uuid')
  byId: string;

  @ManyToOne(() => Person, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'byId' })
  by: Relation<Person>;

  @Column({ type: 'datetime', precision: 3 })
  at: Date;
}
