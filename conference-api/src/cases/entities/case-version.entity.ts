import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import type { CaseContent } from '../../calc/vocabulary/case-content.js';
import { Person } from '../../people/entities/person.entity.js';
import { Case } from './case.entity.js';

/** The whole content as it was saved once, so that a later edit can say what changed. */
@Entity('case_versions')
export class CaseVersion {
  @PrimaryColumn('uuid')
  caseId: string;

  @PrimaryColumn('int')
  version: number;

  @ManyToOne(() => Case, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'caseId' })
  case: Relation<Case>;

  @Column('json')
  content: CaseContent;

  @Column('uuid')
  authorId: string;

  @ManyToOne(() => Person, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'authorId' })
  author: Relation<Person>;

  @Column({ type: 'datetime', precision: 3 })
  at: Date;
}
