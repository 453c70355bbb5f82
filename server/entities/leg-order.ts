import { Check, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { Leg } from './leg.ts';

/** A leg waits for another one to be finished. */
@Entity('leg_order')
@Check('leg_order_not_itself', '"leg_id" <> "after_leg_id"')
export class LegOrder {
  @ForeignKey(() => Leg)
  @PrimaryColumn({ type: 'uuid' })
  legId!: string;

  @Index('leg_order_after_idx')
  @ForeignKey(() => Leg)
  @PrimaryColumn({ type: 'uuid' })
  afterLegId!: string;
}
