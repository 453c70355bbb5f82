import { Check, Column, CreateDateColumn, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { FILE_PLACES, FILE_PURPOSES, type FilePlace, type FilePurpose } from '../../shared/contracts/vocabulary.ts';
import { Account } from './account.ts';
import { Commission } from './commission.ts';
import { oneOf } from './one-of.ts';

/** One size of a photograph in storage. */
export interface StoredRendition {
  key: string;
  byteSize: number;
  width: number;
  height: number;
  sha256: string;
}

/** A file in a place (thread, report, commission); who may read the place may read the file. */
@Entity('stored_file')
@Index('stored_file_place_idx', ['place', 'placeId', 'createdAt'])
@Check('stored_file_place_known', oneOf('place', FILE_PLACES))
@Check('stored_file_purpose_known', oneOf('purpose', FILE_PURPOSES))
export class StoredFile {
  /** Made by the sender's browser. */
  @PrimaryColumn({ type: 'uuid' })
  id!: string;

  @Index('stored_file_commission_idx')
  @ForeignKey(() => Commission)
  @Column({ type: 'uuid' })
  commissionId!: string;

  @Column({ type: 'text' })
  place!: FilePlace;

  @Column({ type: 'uuid' })
  placeId!: string;

  @Column({ type: 'text' })
  purpose!: FilePurpose;

  @Column({ type: 'text' })
  name!: string;

  @Column({ type: 'text', default: '' })
  caption!: string;

  @Column({ type: 'text' })
  mediaType!: string;

  /** Bytes up to 2^53; pg gives bigint as text. */
  @Column({ type: 'bigint' })
  byteSize!: string;

  @Column({ type: 'text' })
  sha256!: string;

  /** Made-up name in the storage. */
  @Column({ type: 'text', select: false })
  storageKey!: string;

  /** Sizes of a photograph by name; null for other files. */
  @Column({ type: 'jsonb', nullable: true, select: false })
  renditions!: Record<string, StoredRendition> | null;

  @Column({ type: 'int', nullable: true })
  width!: number | null;

  @Column({ type: 'int', nullable: true })
  height!: number | null;

  @ForeignKey(() => Account)
  @Column({ type: 'uuid' })
  addedByAccountId!: string;

  @CreateDateColumn({ type: 'timestamptz' })
  createdAt!: Date;
}
