import { Column, CreateDateColumn, Entity, Index, PrimaryGeneratedColumn } from 'typeorm';
import type { LengthUnit } from '../../shared/contracts/vocabulary.ts';

@Entity('account')
export class Account {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  /** Lower case; the contract folds it. */
  @Index('account_email_key', { unique: true })
  @Column({ type: 'text' })
  email!: string;

  @Column({ type: 'text' })
  displayName!: string;

  /** Argon2id in PHC string form. */
  @Column({ type: 'text', select: false })
  passwordHash!: string;

  /** Encrypted with the field key; null while no second factor is set up. */
  @Column({ type: 'text', nullable: true, select: false })
  totpSecret!: string | null;

  @Column({ type: 'timestamptz', nullable: true })
  totpConfirmedAt!: Date | null;

  /** RFC 6238 time step of the last code taken, so that none is taken twice. */
  @Column({ type: 'bigint', nullable: true, select: false })
  totpLastStep!: string | null;

  @Column({ type: 'boolean', default: false })
  isSteward!: boolean;

  @Column({ type: 'text', default: 'mm' })
  preferredUnit!: LengthUnit;

  @Column({ type: 'text', default: 'UTC' })
  timeZone!: string;

  @Column({ type: 'timestamptz', nullable: true })
  benchSeenAt!: Date | null;

  @CreateDateColumn({ type: 'timestamptz' })
  createdAt!: Date;
}
