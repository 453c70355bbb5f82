import { Check, Column, CreateDateColumn, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm';
import type { GuestSight, PartyRole } from '../../shared/contracts/vocabulary.ts';
import { Account } from './account.ts';
import { Commission } from './commission.ts';
import { Shop } from './shop.ts';

/** A shop or a person in one commission, with what they are there. */
@Entity('party')
@Index('party_commission_shop_key', ['commissionId', 'shopId'], {
  unique: true,
  where: '"left_at" IS NULL AND "shop_id" IS NOT NULL',
})
@Index('party_commission_account_key', ['commissionId', 'accountId'], {
  unique: true,
  where: '"left_at" IS NULL AND "account_id" IS NOT NULL',
})
@Index('party_shop_guest_idx', ['shopId'], { where: `'guest' = ANY("roles")` })
@Check('party_is_shop_or_person', '("shop_id" IS NULL) <> ("account_id" IS NULL)')
export class Party {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  @Index('party_commission_idx')
  @ForeignKey(() => Commission)
  @Column({ type: 'uuid' })
  commissionId!: string;

  @Column({ type: 'text', array: true })
  roles!: PartyRole[];

  @Index('party_shop_idx')
  @ForeignKey(() => Shop)
  @Column({ type: 'uuid', nullable: true })
  shopId!: string | null;

  @Index('party_account_idx')
  @ForeignKey(() => Account)
  @Column({ type: 'uuid', nullable: true })
  accountId!: string | null;

  @Column({ type: 'text', array: true, default: '{}' })
  guestSees!: GuestSight[];

  @Column({ type: 'date', nullable: true })
  seesUntil!: string | null;

  @CreateDateColumn({ type: 'timestamptz' })
  joinedAt!: Date;

  @Column({ type: 'timestamptz', nullable: true })
  leftAt!: Date | null;
}
