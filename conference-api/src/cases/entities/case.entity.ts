import { Column, CreateDateColumn, Entity, Index, JoinColumn, ManyToOne, PrimaryGeneratedColumn, type Relation } from 'typeorm';
import type { CaseContent } from '../../calc/vocabulary/case-content.js';
import type { Joint, Side, Stage, Urgency } from '../../calc/vocabulary/case.js';
import { Conference } from '../../conferences/entities/conference.entity.js';
import { Person } from '../../people/entities/person.entity.js';

@Entity('cases')
@Index(['conferenceId', 'stage', 'updatedAt'])
@Index(['presenterId', 'updatedAt'])
export class Case {
  @PrimaryGeneratedColumn('uuid')
  id: string;

  @Column('uuid')
  conferenceId: string;

  @ManyToOne(() => Conference, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'conferenceId' })
  conference: Relation<Conference>;

  /** Conference code and running number, for example HIP-0042. */
  @Column({ type: 'varchar', length: 16, unique: true })
  code: string;

  @Column('uuid')
  presenterId: string;

  @ManyToOne(() => Person, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'presenterId' })
  presenter: Relation<Person>;

  @Column('uuid')
  treatingSurgeonId: string;

  @ManyToOne(() => Person, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'treatingSurgeonId' })
  treatingSurgeon: Relation<Person>;

  @Column({ type: 'varchar', length: 12, default: 'draft' })
  stage: Stage;

  @Column({ type: 'varchar', length: 160, default: '' })
  title: string;

  @Column({ type: 'varchar', length: 8, nullable: true })
  side: Side | null;

  @Column({ type: 'varchar', length: 8, default: 'hip' })
  joint: Joint;

  @Column({ type: 'varchar', length: 8, default: 'routine' })
  urgency: Urgency;

  /** All sections as structured fields. */
  @Column('json')
  content: CaseContent;

  /** All text of the content, for the search. */
  @Index({ fulltext: true })
  @Column('mediumtext')
  searchText: string;

  /** Raised by one at each saved edit. */
  @Column('int', { default: 1 })
  version: number;

  /** The coordinator's remark when the case came back. */
  @Column({ type: 'text', nullable: true })
  returnRemark: string | null;

  @Column({ type: 'text', nullable: true })
  withdrawnReason: string | null;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  withdrawnAt: Date | null;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  postedAt: Date | null;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  releasedAt: Date | null;

  @Column({ type: 'uuid', nullable: true })
  releasedById: string | null;

  @CreateDateColumn({ precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  createdAt: Date;

  @Column({ type: 'datetime', precision: 3 })
  updatedAt: Date;
}
