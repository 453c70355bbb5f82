import { Check, Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm';
import { Commission } from './commission.ts';
import { Leg } from './leg.ts';
import { Party } from './party.ts';

/** One transfer of parts from one party to another. */
@Entity('handoff')
@Check('handoff_between_two_parties', '"from_party_id" <> "to_party_id"')
export class Handoff {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  @Index('handoff_commission_idx')
  @ForeignKey(() => Commission)
  @Column({ type: 'uuid' })
  commissionId!: string;

  @Index('handoff_from_idx')
  @ForeignKey(() => Party)
  @Column({ type: 'uuid' })
  fromPartyId!: string;

  @Index('handoff_to_idx')
  @ForeignKey(() => Party)
  @Column({ type: 'uuid' })
  toPartyId!: string;

  @Column({ type: 'uuid', array: true })
  partIds!: string[];

  @ForeignKey(() => Leg)
  @Column({ type: 'uuid', nullable: true })
  fromLegId!: string | null;

  @ForeignKey(() => Leg)
  @Column({ type: 'uuid', nullable: true })
  toLegId!: string | null;

  /** Working days on the way. */
  @Column({ type: 'double precision', default: 1 })
  transitDays!: number;

  @Column({ type: 'text', default: '' })
  carriage!: string;

  /** The day both sides agreed; it changes only by another agreement. */
  @Column({ type: 'date', nullable: true })
  agreedOn!: string | null;

  @Column({ type: 'date', nullable: true })
  doneOn!: string | null;

  /** Set when it will not come about; it is then in no plan and no list. */
  @Column({ type: 'timestamptz', nullable: true })
  droppedAt!: Date | null;

  @Column({ type: 'text', default: '' })
  droppedWords!: string;

  @Column({ type: 'int', default: 1 })
  revision!: number;
}
