import { Check, Column, CreateDateColumn, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm';
import { OFFER_STATES, type OfferState } from '../../shared/contracts/vocabulary.ts';
import { Account } from './account.ts';
import { Handoff } from './handoff.ts';
import { oneOf } from './one-of.ts';
import { Party } from './party.ts';

/** A day one side offers. At most one offer of a handoff stands, which the database holds to. */
@Entity('handoff_offer')
@Index('handoff_offer_handoff_idx', ['handoffId', 'createdAt'])
@Index('handoff_offer_one_standing_key', ['handoffId'], { unique: true, where: `"state" = 'standing'` })
@Check('handoff_offer_state_known', oneOf('state', OFFER_STATES))
export class HandoffOffer {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  @ForeignKey(() => Handoff)
  @Column({ type: 'uuid' })
  handoffId!: string;

  @ForeignKey(() => Party)
  @Column({ type: 'uuid' })
  byPartyId!: string;

  @ForeignKey(() => Account)
  @Column({ type: 'uuid' })
  byAccountId!: string;

  @Column({ type: 'date' })
  onDay!: string;

  @Column({ type: 'text', default: '' })
  words!: string;

  @Column({ type: 'text', default: 'standing' })
  state!: OfferState;

  @ForeignKey(() => Account)
  @Column({ type: 'uuid', nullable: true })
  answeredByAccountId!: string | null;

  @Column({ type: 'timestamptz', nullable: true })
  answeredAt!: Date | null;

  @Column({ type: 'text', default: '' })
  reason!: string;

  @CreateDateColumn({ type: 'timestamptz' })
  createdAt!: Date;
}
