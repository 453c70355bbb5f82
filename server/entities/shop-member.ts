import { Check, Column, CreateDateColumn, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { SHOP_ROLES, type ShopRole } from '../../shared/contracts/vocabulary.ts';
import { Account } from './account.ts';
import { oneOf } from './one-of.ts';
import { Shop } from './shop.ts';

@Entity('shop_member')
@Check('shop_member_role_known', oneOf('role', SHOP_ROLES))
export class ShopMember {
  @ForeignKey(() => Shop)
  @PrimaryColumn({ type: 'uuid' })
  shopId!: string;

  @Index('shop_member_account_idx')
  @ForeignKey(() => Account)
  @PrimaryColumn({ type: 'uuid' })
  accountId!: string;

  @Column({ type: 'text' })
  role!: ShopRole;

  @CreateDateColumn({ type: 'timestamptz' })
  joinedAt!: Date;
}
