import { Column, CreateDateColumn, Entity, Index, JoinColumn, ManyToOne, PrimaryGeneratedColumn, type Relation } from 'typeorm';
import type { ImageState, Projection } from '../../calc/vocabulary/images.js';
import { Case } from '../../cases/entities/case.entity.js';

@Entity('case_images')
@Index(['caseId', 'position'])
@Index(['state', 'createdAt'])
export class CaseImage {
  @PrimaryGeneratedColumn('uuid')
  id: string;

  @Column('uuid')
  caseId: string;

  @ManyToOne(() => Case, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'caseId' })
  case: Relation<Case>;

  /** storing → ready → removed; a row that stays in storing is swept. */
  @Column({ type: 'varchar', length: 10 })
  state: ImageState;

  @Column({ type: 'varchar', length: 20, default: 'other' })
  projection: Projection;

  /** When it was made, as an interval: 'before revision', '3 months after'. */
  @Column({ type: 'varchar', length: 120, default: '' })
  interval: string;

  @Column({ type: 'varchar', length: 300, default: '' })
  caption: string;

  @Column('int', { default: 0 })
  position: number;

  @Column('int', { default: 0 })
  width: number;

  @Column('int', { default: 0 })
  height: number;

  /** Bytes in the store, all sizes together. */
  @Column('int', { default: 0 })
  bytes: number;

  /** What the file was by its content. */
  @Column({ type: 'varchar', length: 20 })
  sourceKind: 'jpeg' | 'png' | 'webp' | 'tiff' | 'dicom';

  /** SHA-256 of the uploaded bytes: the same file twice is noticed. */
  @Column({ type: 'char', length: 64 })
  sourceHash: string;

  /** mm per pixel of the full picture, where the file told it. */
  @Column({ type: 'double', nullable: true })
  pixelSpacingMm: number | null;

  @Column('uuid')
  uploadedById: string;

  @CreateDateColumn({ precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  createdAt: Date;
}
