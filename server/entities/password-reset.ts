import { Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm';
import { Account } from './account.ts';

@Entity('password_reset')
export class PasswordReset {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  @Index('password_reset_account_idx')
  @ForeignKey(() => Account)
  @Column({ type: 'uuid' })
  accountId!: string;

  /** SHA-256 of the token in the link. */
  @Index('password_reset_token_key', { unique: true })
  @Column({ type: 'text', select: false })
  tokenHash!: string;

  @Column({ type: 'timestamptz' })
  expiresAt!: Date;

  @Column({ type: 'timestamptz', nullable: true })
  usedAt!: Date | null;
}
