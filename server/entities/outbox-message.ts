import { Column, CreateDateColumn, Entity, Index, PrimaryGeneratedColumn } from 'typeorm';

/** An effect that leaves only after its transaction is committed. */
@Entity('outbox_message')
@Index('outbox_message_unsent_idx', ['id'], { where: '"sent_at" IS NULL' })
export class OutboxMessage {
  @PrimaryGeneratedColumn({ type: 'bigint' })
  id!: string;

  /** `event:<realtime name>` or `mail:<letter name>`. */
  @Column({ type: 'text' })
  topic!: string;

  @Column({ type: 'jsonb' })
  payload!: object;

  @CreateDateColumn({ type: 'timestamptz' })
  createdAt!: Date;

  @Column({ type: 'timestamptz', nullable: true })
  leasedUntil!: Date | null;

  @Column({ type: 'timestamptz', nullable: true })
  sentAt!: Date | null;

  @Column({ type: 'int', default: 0 })
  attempts!: number;
}
