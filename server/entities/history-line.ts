import { Column, CreateDateColumn, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm';
import { Account } from './account.ts';
import { Commission } from './commission.ts';

/** What happened in a commission, for "what moved"; lines are added and never changed. */
@Entity('history_line')
@Index('history_line_commission_idx', ['commissionId', 'id'])
export class HistoryLine {
  @PrimaryGeneratedColumn({ type: 'bigint' })
  id!: string;

  @ForeignKey(() => Commission)
  @Column({ type: 'uuid' })
  commissionId!: string;

  @ForeignKey(() => Account)
  @Column({ type: 'uuid', nullable: true })
  accountId!: string | null;

  @Column({ type: 'text' })
  subject!: string;

  @Column({ type: 'uuid' })
  subjectId!: string;

  @Column({ type: 'text' })
  words!: string;

  /** Parties that may read the line; null: every shop of the commission. */
  @Column({ type: 'uuid', array: true, nullable: true })
  partyIds!: string[] | null;

  /** The client (and no guest) may read it too. */
  @Column({ type: 'boolean', default: false })
  clientMayRead!: boolean;

  @CreateDateColumn({ type: 'timestamptz' })
  at!: Date;
}
