import { Column, CreateDateColumn, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm';
import type { ReportState } from '../../shared/contracts/vocabulary.ts';
import { Account } from './account.ts';
import { FitReport } from './fit-report.ts';

/** History of a report; lines are added and never changed. */
@Entity('report_event')
@Index('report_event_report_idx', ['reportId', 'at'])
export class ReportEvent {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  @ForeignKey(() => FitReport)
  @Column({ type: 'uuid' })
  reportId!: string;

  @Column({ type: 'text' })
  act!: string;

  @Column({ type: 'text', nullable: true })
  fromState!: ReportState | null;

  @Column({ type: 'text' })
  toState!: ReportState;

  @ForeignKey(() => Account)
  @Column({ type: 'uuid' })
  accountId!: string;

  @Column({ type: 'text', default: '' })
  words!: string;

  @CreateDateColumn({ type: 'timestamptz' })
  at!: Date;
}
