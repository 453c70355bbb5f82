import { Check, Column, CreateDateColumn, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm';
import {
  CONSENT_STATES,
  NOTE_STATES,
  type ConsentState,
  type Currency,
  type JointSide,
  type NoteState,
} from '../../shared/contracts/vocabulary.ts';
import { Account } from './account.ts';
import { FitReport } from './fit-report.ts';
import { oneOf } from './one-of.ts';
import { Party } from './party.ts';

/** The answer to a fit report: what will be, or was, done about it. */
@Entity('rework_note')
@Index('rework_note_report_idx', ['reportId', 'createdAt'])
@Check('rework_note_state_known', oneOf('state', NOTE_STATES))
@Check('rework_note_consent_known', `"consent_state" IS NULL OR ${oneOf('consent_state', CONSENT_STATES)}`)
@Check('rework_note_showing_asks_consent', `"shows" OR "consent_state" IS NULL`)
export class ReworkNote {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  @ForeignKey(() => FitReport)
  @Column({ type: 'uuid' })
  reportId!: string;

  @ForeignKey(() => Party)
  @Column({ type: 'uuid' })
  partyId!: string;

  @ForeignKey(() => Account)
  @Column({ type: 'uuid' })
  accountId!: string;

  @Column({ type: 'text', default: 'offered' })
  state!: NoteState;

  @Column({ type: 'text' })
  method!: string;

  @Column({ type: 'text' })
  cutSide!: JointSide;

  @Column({ type: 'double precision' })
  removeOnDiameterUm!: number;

  @Column({ type: 'double precision', nullable: true })
  overLengthMm!: number | null;

  @Column({ type: 'text', default: '' })
  risk!: string;

  @Column({ type: 'boolean' })
  shows!: boolean;

  @Column({ type: 'text', default: '' })
  whereItShows!: string;

  @Column({ type: 'int', default: 0 })
  costMinor!: number;

  @Column({ type: 'text', default: 'EUR' })
  currency!: Currency;

  @ForeignKey(() => Party)
  @Column({ type: 'uuid', nullable: true })
  costBorneByPartyId!: string | null;

  @Column({ type: 'double precision', default: 0 })
  effectDays!: number;

  /** Null while nobody needs to ask the client. */
  @Column({ type: 'text', nullable: true })
  consentState!: ConsentState | null;

  @Column({ type: 'timestamptz', nullable: true })
  consentAskedAt!: Date | null;

  @Column({ type: 'timestamptz', nullable: true })
  consentAnsweredAt!: Date | null;

  @ForeignKey(() => Account)
  @Column({ type: 'uuid', nullable: true })
  consentByAccountId!: string | null;

  @Column({ type: 'text', default: '' })
  consentWords!: string;

  @CreateDateColumn({ type: 'timestamptz' })
  createdAt!: Date;
}
