import { Column, CreateDateColumn, Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import type { Role } from '../../calc/vocabulary/people.js';
import { Person } from '../../people/entities/person.entity.js';
import { Conference } from './conference.entity.js';

@Entity('memberships')
export class Membership {
  @PrimaryColumn('uuid')
  conferenceId: string;

  @PrimaryColumn('uuid')
  personId: string;

  @ManyToOne(() => Conference, (conference) => conference.memberships, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'conferenceId' })
  conference: Relation<Conference>;

  @ManyToOne(() => Person, (person) => person.memberships, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'personId' })
  person: Relation<Person>;

  @Column({ type: 'varchar', length: 20 })
  role: Role;

  @CreateDateColumn({ precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  createdAt: Date;
}
