import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import { Case } from '../../cases/entities/case.entity.js';
import { Person } from '../../people/entities/person.entity.js';

/** Up to when a person has read the remarks of a case. */
@Entity('case_readings')
export class CaseReading {
  @PrimaryColumn('uuid')
  personId: string;

  @PrimaryColumn('uuid')
  caseId: string;

  @ManyToOne(() => Person, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'personId' })
  person: Relation<Person>;

  @ManyToOne(() => Case, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'caseId' })
  case: Relation<Case>;

  @Column({ type: 'datetime', precision: 3 })
  readUpTo: Date;
}
