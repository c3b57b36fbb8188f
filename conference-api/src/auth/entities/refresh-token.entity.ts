import { Column, CreateDateColumn, Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import { Session } from './session.entity.js';

/** One refresh token; only its SHA-256 is kept. A used one that comes again ends its session. */
@Entity('refresh_tokens')
export class RefreshToken {
  @PrimaryColumn({ type: 'char', length: 64 })
  hash: string;

  @Column('uuid')
  sessionId: string;

  @ManyToOne(() => Session, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'sessionId' })
  session: Relation<Session>;

  @CreateDateColumn({ precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  createdAt: Date;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  usedAt: Date | null;
}
