import { Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm';
import type { PartKind } from '../../shared/contracts/vocabulary.ts';
import { Commission } from './commission.ts';
import { Party } from './party.ts';

/** A physical thing; it always has exactly one holder. */
@Entity('part')
export class Part {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  @Index('part_commission_idx')
  @ForeignKey(() => Commission)
  @Column({ type: 'uuid' })
  commissionId!: string;

  @Column({ type: 'text' })
  name!: string;

  @Column({ type: 'text' })
  kind!: PartKind;

  @ForeignKey(() => Party)
  @Column({ type: 'uuid' })
  holderPartyId!: string;

  @Column({ type: 'date', default: () => 'CURRENT_DATE' })
  holderSince!: string;

  @Column({ type: 'int', default: 0 })
  position!: number;

  @Column({ type: 'int', default: 1 })
  revision!: number;
}
