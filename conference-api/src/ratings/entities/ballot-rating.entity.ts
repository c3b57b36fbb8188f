import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import { Ballot } from './ballot.entity.js';

@Entity('ballot_ratings')
export class BallotRating {
  @PrimaryColumn('uuid')
  ballotId: string;

  @PrimaryColumn({ length: 64 })
  optionId: string;

  @ManyToOne(() => Ballot, (ballot) => ballot.ratings, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'ballotId' })
  ballot: Relation<Ballot>;

  /** 1 (inappropriate) to 9 (appropriate). */
  @Column('tinyint')
  value: number;
}
