import { Column, CreateDateColumn, Entity, PrimaryGeneratedColumn } from 'typeorm';

/** A hospital, as an organisational unit that sends people and cases. */
@Entity('units')
export class Unit {
  @PrimaryGeneratedColumn('uuid')
  id: string;

  @Column({ type: 'varchar', length: 120, unique: true })
  name: string;

  /** Where letters about its cases go. */
  @Column({ type: 'varchar', length: 254, nullable: true })
  contactEmail: string | null;

  @CreateDateColumn({ precision: 3, default: () => 'CURRENT_TIMESTAMP(3)' })
  createdAt: Date;
}
