import { Column, CreateDateColumn, Entity, Index, JoinColumn, ManyToOne, OneToMany, PrimaryGeneratedColumn, type Relation } from 'typeorm';
import type { AnchorKind, ThreadKind } from '../../calc/vocabulary/discussions.js';
import { Case } from '../../cases/entities/case.entity.js';
import { Remark } from './remark.entity.js';

/** A conversation beside the thing it is about. */
@Entity('threads')
@Index(['caseId', 'createdAt'])
export class Thread {
  @PrimaryGeneratedColumn('uuid')
  id: string;

  @Column('uuid')
  caseId: string;

  @ManyToOne(() => Case, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'caseId' })
  case: Relation<Case>;

  @Column({ type: 'varchar', length: 10 })
  anchorKind: AnchorKind;

  /** Section name, plan step id or image id; empty for the whole case. */
  @Column({ type: 'varchar', length: 64, default: '' })
  anchorRef: string;

  @Column({ type: 'varchar', length: 10 })
  kind: ThreadKind;

  @Column('uuid')
  startedById: string;

  /** A question to the presenter stays open until this is set. */
  @Column({ type: 'datetime', precision: 3, nullable: true })
  answeredAt: Date | null;

  @CreateDateColumn({ precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  createdAt: Date;

  @OneToMany(() => Remark, (remark) => remark.thread)
  remarks: Relation<Remark>[];
}
