import { Column, CreateDateColumn, Entity, Index, JoinColumn, ManyToOne, PrimaryGeneratedColumn, type Relation } from 'typeorm';
import type { RichText } from '../../calc/vocabulary/discussions.js';
import { Person } from '../../people/entities/person.entity.js';
import { Thread } from './thread.entity.js';

@Entity('remarks')
@Index(['threadId', 'createdAt'])
@Index(['caseId', 'createdAt'])
export class Remark {
  @PrimaryGeneratedColumn('uuid')
  id: string;

  @Column('uuid')
  threadId: string;

  @ManyToOne(() => Thread, (thread) => thread.remarks, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'threadId' })
  thread: Relation<Thread>;

  /** Kept here too: unread counts ask by case. */
  @Column('uuid')
  caseId: string;

  @Column('uuid')
  authorId: string;

  @ManyToOne(() => Person, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'authorId' })
  author: Relation<Person>;

  @Column({ type: 'uuid', nullable: true })
  replyToId: string | null;

  /** TipTap JSON, checked against the editor's schema; null once deleted. */
  @Column({ type: 'json', nullable: true })
  content: RichText | null;

  /** Its plain text, for the search. */
  @Index({ fulltext: true })
  @Column('mediumtext')
  plainText: string;

  @Column('int', { default: 1 })
  version: number;

  @CreateDateColumn({ precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  createdAt: Date;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  editedAt: Date | null;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  deletedAt: Date | null;
}
