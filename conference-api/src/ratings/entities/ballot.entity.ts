import { Column, Entity, Index, JoinColumn, ManyToOne, OneToMany, PrimaryGeneratedColumn, type Relation, Unique } from 'typeorm';
import { Person } from '../../people/entities/person.entity.js';
import { BallotRating } from './ballot-rating.entity.js';
import { RatingRound } from './rating-round.entity.js';

/** One person's ratings of all options, as given once; a change is a new revision. */
@Entity('ballots')
@Unique(['roundId', 'personId', 'revision'])
@Index(['roundId', 'supersededAt'])
export class Ballot {
  @PrimaryGeneratedColumn('uuid')
  id: string;

  @Column('uuid')
  roundId: string;

  @ManyToOne(() => RatingRound, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'roundId' })
  round: Relation<RatingRound>;

  @Column('uuid')
  personId: string;

  @ManyToOne(() => Person, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'personId' })
  person: Relation<Person>;

  @Column('int')
  revision: number;

  @Column({ type: 'varchar', length: 64, nullable: true })
  preferredOptionId: string | null;

  @Column('text')
  reason: string;

  @Column({ type: 'datetime', precision: 3 })
  at: Date;

  /** When the person changed it; null on the one that counts. */
  @Column({ type: 'datetime', precision: 3, nullable: true })
  supersededAt: Date | null;

  @OneToMany(() => BallotRating, (rating) => rating.ballot)
  ratings: Relation<BallotRating>[];
}
