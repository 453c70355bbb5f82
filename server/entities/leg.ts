import { Check, Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm';
import { LEG_STATES, type LegKind, type LegState } from '../../shared/contracts/vocabulary.ts';
import { Commission } from './commission.ts';
import { oneOf } from './one-of.ts';
import { Part } from './part.ts';
import { Party } from './party.ts';

/** One shop's portion of the work. */
@Entity('leg')
@Check('leg_state_known', oneOf('state', LEG_STATES))
@Check(
  'leg_estimates_in_order',
  '"hopeful_days" <= "likely_days" AND "likely_days" <= "bad_days" AND "hopeful_days" >= 0',
)
@Check(
  'leg_days_follow_state',
  `("state" <> 'finished' OR "finished_on" IS NOT NULL) AND ("state" = 'planned' OR "state" = 'dropped' OR "started_on" IS NOT NULL)`,
)
export class Leg {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  @Index('leg_commission_idx')
  @ForeignKey(() => Commission)
  @Column({ type: 'uuid' })
  commissionId!: string;

  @Index('leg_party_idx')
  @ForeignKey(() => Party)
  @Column({ type: 'uuid' })
  partyId!: string;

  @ForeignKey(() => Part)
  @Column({ type: 'uuid' })
  partId!: string;

  @Column({ type: 'text' })
  kind!: LegKind;

  @Column({ type: 'text' })
  title!: string;

  @Column({ type: 'text', default: 'planned' })
  state!: LegState;

  /** Working days. */
  @Column({ type: 'double precision' })
  hopefulDays!: number;

  @Column({ type: 'double precision' })
  likelyDays!: number;

  @Column({ type: 'double precision' })
  badDays!: number;

  @Column({ type: 'date', nullable: true })
  plannedStartOn!: string | null;

  @Column({ type: 'date', nullable: true })
  startedOn!: string | null;

  @Column({ type: 'date', nullable: true })
  finishedOn!: string | null;

  @Column({ type: 'text', default: '' })
  privateNote!: string;

  @Column({ type: 'int', default: 0 })
  position!: number;

  @Column({ type: 'int', default: 1 })
  revision!: number;
}
