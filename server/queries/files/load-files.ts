import type { EntityManager } from 'typeorm';
import type { StoredFileView } from '../../../shared/contracts/files.ts';
import type { FilePlace, FilePurpose } from '../../../shared/contracts/vocabulary.ts';
import type { StoredRendition } from '../../entities/stored-file.ts';

export interface FileRecord {
  id: string;
  commissionId: string;
  place: FilePlace;
  placeId: string;
  purpose: FilePurpose;
  name: string;
  caption: string;
  mediaType: string;
  byteSize: string;
  sha256: string;
  storageKey: string;
  renditions: Record<string, StoredRendition> | null;
  width: number | null;
  height: number | null;
  addedByAccountId: string;
  addedBy: string;
  createdAt: Date;
}

const filesSql = (where: string): string => `
  SELECT f."id", f."commission_id" AS "commissionId", f."place", f."place_id" AS "placeId", f."purpose", f."name", f."caption", f."media_type" AS "mediaType",
    f."byte_size" AS "byteSize", f."sha256", f."storage_key" AS "storageKey", f."renditions", f."width", f."height",
    f."added_by_account_id" AS "addedByAccountId", f."created_at" AS "createdAt", a."display_name" AS "addedBy"
  FROM "stored_file" f JOIN "account" a ON a."id" = f."added_by_account_id" WHERE ${where} ORDER BY f."created_at", f."id"`;

export const loadFilesAt = (
  manager: EntityManager,
  commissionId: string,
  place: FilePlace,
  placeId: string,
): Promise<FileRecord[]> =>
  manager.query<FileRecord[]>(filesSql('f."commission_id" = $1 AND f."place" = $2 AND f."place_id" = $3'), [
    commissionId,
    place,
    placeId,
  ]);

export async function loadFile(
  manager: EntityManager,
  commissionId: string,
  fileId: string,
): Promise<FileRecord | null> {
  const [row] = await manager.query<FileRecord[]>(filesSql('f."commission_id" = $1 AND f."id" = $2'), [
    commissionId,
    fileId,
  ]);
  return row ?? null;
}

/** What a reader sees of a file; where its bytes lie is nobody's business. */
export const presentFile = (row: FileRecord): StoredFileView => ({
  id: row.id,
  name: row.name,
  mediaType: row.mediaType,
  byteSize: Number(row.byteSize),
  sha256: row.sha256,
  width: row.width,
  height: row.height,
  place: row.place,
  placeId: row.placeId,
  purpose: row.purpose,
  caption: row.caption,
  addedBy: row.addedBy,
  addedAt: row.createdAt.toISOString(),
});
