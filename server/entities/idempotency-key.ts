import { Column, CreateDateColumn, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { Account } from './account.ts';

/** The first answer to a keyed request, kept for 72 hours. */
@Entity('idempotency_key')
export class IdempotencyKey {
  @ForeignKey(() => Account)
  @PrimaryColumn({ type: 'uuid' })
  accountId!: string;

  @PrimaryColumn({ type: 'text' })
  key!: string;

  /** SHA-256 over method, path and body: the same key with another request is refused. */
  @Column({ type: 'text' })
  requestHash!: string;

  /** Null while the first request is still being worked on. */
  @Column({ type: 'int', nullable: true })
  status!: number | null;

  @Column({ type: 'jsonb', nullable: true })
  response!: unknown;

  @Index('idempotency_key_age_idx')
  @CreateDateColumn({ type: 'timestamptz' })
  createdAt!: Date;
}
