import { Check, Column, CreateDateColumn, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm';
import { JOINT_SIDES, type JointSide, type LengthUnit } from '../../shared/contracts/vocabulary.ts';
import { Account } from './account.ts';
import { FitReport } from './fit-report.ts';
import { Joint } from './joint.ts';
import { oneOf } from './one-of.ts';
import { Party } from './party.ts';

/** One measured diameter, kept as it was typed beside its value in mm. Readings are never changed. */
@Entity('reading')
@Index('reading_joint_set_idx', ['jointId', 'side', 'setNumber'])
@Check('reading_side_known', oneOf('side', JOINT_SIDES))
@Check('reading_positive', '"value_mm" > 0 AND "resolution_um" > 0')
export class Reading {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  @ForeignKey(() => Joint)
  @Column({ type: 'uuid' })
  jointId!: string;

  @ForeignKey(() => FitReport)
  @Column({ type: 'uuid', nullable: true })
  reportId!: string | null;

  @Column({ type: 'text' })
  side!: JointSide;

  /** Readings entered together share a number; a verdict uses the newest set of each side. */
  @Column({ type: 'int' })
  setNumber!: number;

  /** Place within the set, as entered. */
  @Column({ type: 'int' })
  position!: number;

  @Column({ type: 'double precision' })
  valueMm!: number;

  @Column({ type: 'text' })
  enteredText!: string;

  @Column({ type: 'text' })
  enteredUnit!: LengthUnit;

  @Column({ type: 'double precision' })
  resolutionUm!: number;

  @Column({ type: 'double precision', nullable: true })
  stationMm!: number | null;

  @Column({ type: 'double precision', nullable: true })
  angleDeg!: number | null;

  @Column({ type: 'double precision', nullable: true })
  temperatureC!: number | null;

  @Column({ type: 'double precision', nullable: true })
  humidityPct!: number | null;

  @Column({ type: 'text', nullable: true })
  gauge!: string | null;

  @ForeignKey(() => Party)
  @Column({ type: 'uuid' })
  partyId!: string;

  @ForeignKey(() => Account)
  @Column({ type: 'uuid' })
  accountId!: string;

  @CreateDateColumn({ type: 'timestamptz' })
  takenAt!: Date;
}
