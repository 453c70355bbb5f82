import { Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm';
import { Account } from './account.ts';
import { Thread } from './thread.ts';

/** How far a person has read a thread. */
@Entity('thread_mark')
export class ThreadMark {
  @ForeignKey(() => Thread)
  @PrimaryColumn({ type: 'uuid' })
  threadId!: string;

  @ForeignKey(() => Account)
  @PrimaryColumn({ type: 'uuid' })
  accountId!: string;

  @Column({ type: 'int' })
  readSequence!: number;
}
