import { Column, CreateDateColumn, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import { Person } from '../../people/entities/person.entity.js';

/** A link in a mail: an invitation or a password reset. Only its SHA-256 is kept. */
@Entity('one_time_tokens')
export class OneTimeToken {
  @PrimaryColumn({ type: 'char', length: 64 })
  hash: string;

  @Column({ type: 'varchar', length: 20 })
  purpose: 'invitation' | 'password-reset';

  @Index()
  @Column('uuid')
  personId: string;

  @ManyToOne(() => Person, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'personId' })
  person: Relation<Person>;

  @CreateDateColumn({ precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  createdAt: Date;

  @Column({ type: 'datetime', precision: 3 })
  expiresAt: Date;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  usedAt: Date | null;
}
