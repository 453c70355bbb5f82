import { Check, Column, CreateDateColumn, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm';
import { AUDIENCES, THREAD_SUBJECTS, type Audience, type ThreadSubject } from '../../shared/contracts/vocabulary.ts';
import { Commission } from './commission.ts';
import { oneOf } from './one-of.ts';
import { Party } from './party.ts';

/** A conversation. Its audience is fixed when it is opened. */
@Entity('thread')
@Index('thread_subject_idx', ['commissionId', 'subject', 'subjectId'])
@Check('thread_audience_known', oneOf('audience', AUDIENCES))
@Check('thread_subject_known', oneOf('subject', THREAD_SUBJECTS))
@Check('thread_named_parties', `("audience" IN ('own-shop', 'named')) = (cardinality("party_ids") > 0)`)
export class Thread {
  @PrimaryGeneratedColumn('uuid')
  id!: string;

  @ForeignKey(() => Commission)
  @Column({ type: 'uuid' })
  commissionId!: string;

  @Column({ type: 'text' })
  subject!: ThreadSubject;

  @Column({ type: 'uuid' })
  subjectId!: string;

  @Column({ type: 'text' })
  title!: string;

  @Column({ type: 'text' })
  audience!: Audience;

  @Column({ type: 'uuid', array: true, default: '{}' })
  partyIds!: string[];

  /** Sequence of the last message; taken under the row's lock, so that a thread has no gap. */
  @Column({ type: 'int', default: 0 })
  lastSequence!: number;

  @Column({ type: 'timestamptz', nullable: true })
  lastMessageAt!: Date | null;

  @ForeignKey(() => Party)
  @Column({ type: 'uuid' })
  openedByPartyId!: string;

  @CreateDateColumn({ type: 'timestamptz' })
  createdAt!: Date;
}
