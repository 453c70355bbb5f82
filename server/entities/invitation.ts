import { Check, Column, CreateDateColumn, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm';
import type { GuestSight, PartyRole, ShopRole } from '../../shared/contracts/vocabulary.ts';
import { Account } from './account.ts';
import { Commission } from './commission.ts';
import { Shop } from './shop.ts';

/** A link sent by e-mail: into a commission (as a shop, the client or a guest) or into a shop. */
@Entity('invitation')
@Check('invitation_has_one_target', '("commission_id" IS NULL) <> ("shop_id" IS NULL)')
export class Invitation {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  @Column({ type: 'text' })
  email!: string;

  @Index('invitation_token_key', { unique: true })
  @Column({ type: 'text', select: false })
  tokenHash!: string;

  @Index('invitation_commission_idx')
  @ForeignKey(() => Commission)
  @Column({ type: 'uuid', nullable: true })
  commissionId!: string | null;

  @Column({ type: 'text', array: true, default: '{}' })
  roles!: PartyRole[];

  @Column({ type: 'text', array: true, default: '{}' })
  guestSees!: GuestSight[];

  @Column({ type: 'date', nullable: true })
  seesUntil!: string | null;

  @Index('invitation_shop_idx')
  @ForeignKey(() => Shop)
  @Column({ type: 'uuid', nullable: true })
  shopId!: string | null;

  @Column({ type: 'text', nullable: true })
  shopRole!: ShopRole | null;

  @ForeignKey(() => Account)
  @Column({ type: 'uuid' })
  invitedByAccountId!: string;

  @CreateDateColumn({ type: 'timestamptz' })
  createdAt!: Date;

  @Column({ type: 'timestamptz' })
  expiresAt!: Date;

  @Column({ type: 'timestamptz', nullable: true })
  acceptedAt!: Date | null;

  @Column({ type: 'timestamptz', nullable: true })
  withdrawnAt!: Date | null;
}
