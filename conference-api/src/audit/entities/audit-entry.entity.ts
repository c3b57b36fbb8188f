import { Column, Entity, Index, PrimaryGeneratedColumn } from 'typeorm';

/** Who did what to which record, when and from where. No clinical text. */
@Entity('audit_entries')
@Index(['caseId', 'id'])
@Index(['personId', 'id'])
export class AuditEntry {
  @PrimaryGeneratedColumn({ type: 'bigint' })
  id: string;

  @Column({ type: 'datetime', precision: 3 })
  at: Date;

  /** Null where the server acts by itself. */
  @Column({ type: 'uuid', nullable: true })
  personId: string | null;

  @Column({ type: 'varchar', length: 60 })
  action: string;

  @Column({ type: 'varchar', length: 40 })
  recordKind: string;

  @Column({ type: 'varchar', length: 64 })
  recordId: string;

  @Column({ type: 'uuid', nullable: true })
  caseId: string | null;

  @Column({ type: 'uuid', nullable: true })
  conferenceId: string | null;

  @Column({ type: 'varchar', length: 64, default: '' })
  address: string;

  /** Names of fields, stages, counts. */
  @Column('json')
  details: Record<string, string | number | boolean | string[] | null>;
}
