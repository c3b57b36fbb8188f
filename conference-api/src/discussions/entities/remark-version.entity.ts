import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import type { RichText } from '../../calc/vocabulary/discussions.js';
import { Remark } from './remark.entity.js';

/** What a remark said before it was edited. */
@Entity('remark_versions')
export class RemarkVersion {
  @PrimaryColumn('uuid')
  remarkId: string;

  @PrimaryColumn('int')
  version: number;

  @ManyToOne(() => Remark, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'remarkId' })
  remark: Relation<Remark>;

  @Column('json')
  content: RichText;

  @Column({ type: 'datetime', precision: 3 })
  at: Date;
}
