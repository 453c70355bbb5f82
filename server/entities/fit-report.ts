import { Check, Column, CreateDateColumn, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm';
import { OPEN_REPORT_STATES, REPORT_STATES, type ReportState } from '../../shared/contracts/vocabulary.ts';
import { Account } from './account.ts';
import { Commission } from './commission.ts';
import { Joint } from './joint.ts';
import { Leg } from './leg.ts';
import { oneOf } from './one-of.ts';
import { Party } from './party.ts';

/** A joint that does not go together as agreed. */
@Entity('fit_report')
@Index('fit_report_open_on_joint_key', ['jointId'], { unique: true, where: oneOf('state', OPEN_REPORT_STATES) })
@Check('fit_report_state_known', oneOf('state', REPORT_STATES))
export class FitReport {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  @Index('fit_report_commission_idx')
  @ForeignKey(() => Commission)
  @Column({ type: 'uuid' })
  commissionId!: string;

  @ForeignKey(() => Joint)
  @Column({ type: 'uuid' })
  jointId!: string;

  @Column({ type: 'text' })
  title!: string;

  @Column({ type: 'text', default: '' })
  plainWords!: string;

  @Column({ type: 'text', default: 'raised' })
  state!: ReportState;

  @Column({ type: 'boolean' })
  blocking!: boolean;

  @Index('fit_report_held_leg_idx')
  @ForeignKey(() => Leg)
  @Column({ type: 'uuid', nullable: true })
  heldLegId!: string | null;

  @ForeignKey(() => Party)
  @Column({ type: 'uuid' })
  raisedByPartyId!: string;

  @ForeignKey(() => Account)
  @Column({ type: 'uuid' })
  raisedByAccountId!: string;

  @ForeignKey(() => Party)
  @Column({ type: 'uuid' })
  answerPartyId!: string;

  @Column({ type: 'text', default: '' })
  clientWords!: string;

  @Column({ type: 'int', default: 0 })
  reopenedCount!: number;

  @CreateDateColumn({ type: 'timestamptz' })
  raisedAt!: Date;

  @Column({ type: 'int', default: 1 })
  revision!: number;
}
