import { Column, CreateDateColumn, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { Account } from './account.ts';
import { Party } from './party.ts';
import { Thread } from './thread.ts';

@Entity('message')
@Index('message_author_client_id_key', ['authorAccountId', 'id'], { unique: true })
export class Message {
  @ForeignKey(() => Thread)
  @PrimaryColumn({ type: 'uuid' })
  threadId!: string;

  @PrimaryColumn({ type: 'int' })
  sequence!: number;

  /** Made by the writer's browser. */
  @Column({ type: 'uuid' })
  id!: string;

  @ForeignKey(() => Account)
  @Column({ type: 'uuid' })
  authorAccountId!: string;

  @ForeignKey(() => Party)
  @Column({ type: 'uuid' })
  authorPartyId!: string;

  @Column({ type: 'text' })
  body!: string;

  @Column({ type: 'uuid', array: true, default: '{}' })
  mentionedAccountIds!: string[];

  @Column({ type: 'uuid', array: true, default: '{}' })
  fileIds!: string[];

  @CreateDateColumn({ type: 'timestamptz' })
  createdAt!: Date;
}
