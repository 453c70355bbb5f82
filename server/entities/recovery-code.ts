import { Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm';
import { Account } from './account.ts';

/** One-time code that stands in for the authenticator; only its SHA-256 is kept. */
@Entity('recovery_code')
export class RecoveryCode {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  @Index('recovery_code_account_idx')
  @ForeignKey(() => Account)
  @Column({ type: 'uuid' })
  accountId!: string;

  @Column({ type: 'text', select: false })
  codeHash!: string;

  @Column({ type: 'timestamptz', nullable: true })
  usedAt!: Date | null;
}
