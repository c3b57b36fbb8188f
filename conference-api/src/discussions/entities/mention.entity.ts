import { Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import { Person } from '../../people/entities/person.entity.js';
import { Remark } from './remark.entity.js';

@Entity('mentions')
export class Mention {
  @PrimaryColumn('uuid')
  remarkId: string;

  @Index()
  @PrimaryColumn('uuid')
  personId: string;

  @ManyToOne(() => Remark, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'remarkId' })
  remark: Relation<Remark>;

  @ManyToOne(() => Person, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'personId' })
  person: Relation<Person>;
}
