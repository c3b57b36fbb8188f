import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import type { AttendanceState } from '../../calc/vocabulary/meetings.js';
import { Person } from '../../people/entities/person.entity.js';
import { Meeting } from './meeting.entity.js';

@Entity('attendances')
export class Attendance {
  @PrimaryColumn('uuid')
  meetingId: string;

  @PrimaryColumn('uuid')
  personId: string;

  @ManyToOne(() => Meeting, { nullable: false, onDelete: 'CASCADE' })
  @JoinColumn({ name: 'meetingId' })
  meeting: Relation<Meeting>;

  @ManyToOne(() => Person, { nullable: false, onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'personId' })
  person: Relation<Person>;

  @Column({ type: 'varchar', length: 10 })
  state: AttendanceState;

  @Column({ type: 'datetime', precision: 3 })
  at: Date;
}
