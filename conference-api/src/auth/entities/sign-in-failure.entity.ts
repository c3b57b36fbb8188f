import { Column, Entity, Index, PrimaryGeneratedColumn } from 'typeorm';

/** A failed sign-in, kept a while so that guessing is slowed for the account and for the address. */
@Entity('sign_in_failures')
@Index(['account', 'at'])
@Index(['address', 'at'])
export class SignInFailure {
  @PrimaryGeneratedColumn({ type: 'bigint' })
  id: string;

  /** SHA-256 of the address typed: it may be of nobody here. */
  @Column({ type: 'char', length: 64 })
  account: string;

  @Column({ type: 'varchar', length: 64 })
  address: string;

  @Column({ type: 'datetime', precision: 3 })
  at: Date;
}
