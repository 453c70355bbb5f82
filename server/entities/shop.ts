import { Column, CreateDateColumn, Entity, PrimaryGeneratedColumn } from 'typeorm';
import type { ShopTint } from '../../shared/contracts/vocabulary.ts';

@Entity('shop')
export class Shop {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  @Column({ type: 'text' })
  name!: string;

  @Column({ type: 'text', default: '' })
  craft!: string;

  /** ISO 3166-1 alpha-2. */
  @Column({ type: 'text' })
  country!: string;

  @Column({ type: 'text', default: 'UTC' })
  timeZone!: string;

  @Column({ type: 'text', default: 'verdigris' })
  tint!: ShopTint;

  @Column({ type: 'int', default: 1 })
  revision!: number;

  @CreateDateColumn({ type: 'timestamptz' })
  createdAt!: Date;
}
