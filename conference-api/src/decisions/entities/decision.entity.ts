import { Column, CreateDateColumn, Entity, Index, JoinColumn, ManyToOne, PrimaryGeneratedColumn, type Relation, Unique } from 'typeorm';
import type { DecisionContent, DecisionRecord } from '../../calc/vocabulary/decisions.js';
import { Case } from '../../cases/entities/case.entity.js';
import { Conference } from '../../conferences/entities/conference.entity.js';

/** A consensus decision: a draft until signed, then unchangeable; an amendment is a new version. */
@Entity('decisions')
@Unique(['caseId', 'version'])
@Unique(['conferenceId', 'number'])
@Index(['conferenceId', 'signedAt'])
export class Decision {
  @PrimaryGeneratedColumn('uuid')
  id: string;

  @Column('uuid')
  conferenceId: string;

  @ManyToOne(() => Conference, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'conferenceId' })
  conference: Relation<Conference>;

  @Column('uuid')
  caseId: string;

  @ManyToOne(() => Case, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'caseId' })
  case: Relation<Case>;

  @Column({ type: 'uuid', nullable: true })
  meetingId: string | null;

  /** 1 for the first, more for amendments. */
  @Column('int')
  version: number;

  /** Running number in the conference's chain, given when it is signed. */
  @Column({ type: 'int', nullable: true })
  number: number | null;

  /** What the chair edits. */
  @Column('json')
  content: DecisionContent;

  /** Raised by one at each saved edit of the draft. */
  @Column('int', { default: 1 })
  revision: number;

  @Column({ type: 'text', nullable: true })
  amendmentReason: string | null;

  @Column('uuid')
  draftedById: string;

  @Column({ type: 'uuid', nullable: true })
  signedById: string | null;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  signedAt: Date | null;

  /** Everything that was signed, as it was hashed. */
  @Column({ type: 'json', nullable: true })
  record: DecisionRecord | null;

  /** SHA-256 of the canonical form (RFC 8785) of the record. */
  @Column({ type: 'char', length: 64, nullable: true })
  hash: string | null;

  @Column({ type: 'char', length: 64, nullable: true })
  previousHash: string | null;

  @CreateDateColumn({ precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  createdAt: Date;
}
