import { Check, Column, CreateDateColumn, Entity, Index, PrimaryGeneratedColumn } from 'typeorm';
import { COMMISSION_STATES, type CommissionState, type Currency } from '../../shared/contracts/vocabulary.ts';
import { oneOf } from './one-of.ts';

@Entity('commission')
@Index('commission_latest_idx', ['updatedAt', 'id'])
@Check('commission_state_known', oneOf('state', COMMISSION_STATES))
export class Commission {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  /** Crockford base 32 with its check character, without spaces. */
  @Index('commission_code_key', { unique: true })
  @Column({ type: 'text' })
  code!: string;

  @Column({ type: 'text' })
  title!: string;

  @Column({ type: 'text', default: '' })
  brief!: string;

  @Column({ type: 'text', default: 'in-brief' })
  state!: CommissionState;

  @Column({ type: 'date', nullable: true })
  dateWanted!: string | null;

  @Column({ type: 'int', nullable: true })
  budgetMinor!: number | null;

  @Column({ type: 'text', default: 'EUR' })
  currency!: Currency;

  @Column({ type: 'uuid', nullable: true })
  coverFileId!: string | null;

  /** Kept beside the parties so that a list needs one index look-up: account and shop ids of all but guests. */
  @Index('commission_member_keys_idx', { type: 'gin' })
  @Column({ type: 'uuid', array: true, default: '{}' })
  memberKeys!: string[];

  /** Names printed in lists, kept beside the parties for the same reason. */
  @Column({ type: 'text', default: '' })
  leadName!: string;

  @Column({ type: 'text', nullable: true })
  clientName!: string | null;

  /** The expected delivery last told, to say how it moved. */
  @Column({ type: 'date', nullable: true })
  toldFromDay!: string | null;

  @Column({ type: 'date', nullable: true })
  toldToDay!: string | null;

  @Column({ type: 'date', nullable: true })
  deliveredOn!: string | null;

  @Column({ type: 'int', default: 1 })
  revision!: number;

  @CreateDateColumn({ type: 'timestamptz' })
  createdAt!: Date;

  @Column({ type: 'timestamptz', default: () => 'now()' })
  updatedAt!: Date;
}
