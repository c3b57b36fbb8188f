import { Column, CreateDateColumn, Entity, JoinColumn, ManyToOne, OneToMany, PrimaryGeneratedColumn, type Relation } from 'typeorm';
import type { Discipline } from '../../calc/vocabulary/people.js';
import { Membership } from '../../conferences/entities/membership.entity.js';
import { Unit } from './unit.entity.js';

@Entity('people')
export class Person {
  @PrimaryGeneratedColumn('uuid')
  id: string;

  @Column({ type: 'varchar', length: 254, unique: true })
  email: string;

  @Column({ type: 'varchar', length: 120 })
  name: string;

  @Column({ type: 'varchar', length: 40 })
  discipline: Discipline;

  @Column('uuid')
  unitId: string;

  @ManyToOne(() => Unit, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'unitId' })
  unit: Relation<Unit>;

  /** argon2id; null until the invitation is accepted. */
  @Column({ type: 'varchar', length: 255, nullable: true, select: false })
  passwordHash: string | null;

  @Column({ default: false })
  isAdministrator: boolean;

  @Column({ default: true })
  isActive: boolean;

  @CreateDateColumn({ precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  createdAt: Date;

  @OneToMany(() => Membership, (membership) => membership.person)
  memberships: Relation<Membership>[];
}
