import { Check, Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm';
import type { JointKind } from '../../shared/contracts/vocabulary.ts';
import { Commission } from './commission.ts';
import { Part } from './part.ts';
import { Party } from './party.ts';

/** A mating pair of features of two parts, and the two parties that answer for them. */
@Entity('joint')
@Check('joint_range_in_order', '"clearance_min_um" <= "clearance_max_um"')
@Check('joint_between_two_parts', '"hole_part_id" <> "shaft_part_id"')
export class Joint {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  @Index('joint_commission_idx')
  @ForeignKey(() => Commission)
  @Column({ type: 'uuid' })
  commissionId!: string;

  @Column({ type: 'text' })
  name!: string;

  @Column({ type: 'text' })
  kind!: JointKind;

  @ForeignKey(() => Part)
  @Column({ type: 'uuid' })
  holePartId!: string;

  @ForeignKey(() => Part)
  @Column({ type: 'uuid' })
  shaftPartId!: string;

  @ForeignKey(() => Party)
  @Column({ type: 'uuid' })
  holePartyId!: string;

  @ForeignKey(() => Party)
  @Column({ type: 'uuid' })
  shaftPartyId!: string;

  @Column({ type: 'double precision' })
  nominalMm!: number;

  @Column({ type: 'double precision' })
  clearanceMinUm!: number;

  @Column({ type: 'double precision' })
  clearanceMaxUm!: number;

  @Column({ type: 'text', nullable: true })
  holeClass!: string | null;

  @Column({ type: 'text', nullable: true })
  shaftClass!: string | null;

  @Column({ type: 'text', nullable: true })
  handFit!: string | null;

  @Column({ type: 'double precision', nullable: true })
  engagementMm!: number | null;

  @Column({ type: 'double precision', nullable: true })
  hiddenLengthMm!: number | null;

  @Column({ type: 'text', default: '' })
  note!: string;

  @Column({ type: 'int', default: 1 })
  revision!: number;
}
