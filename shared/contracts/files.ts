import { z } from 'zod';
import { inCommission, instant, uuid } from './common.ts';
import { defineRoute, nothing } from './route.ts';
import { FILE_PLACES, FILE_PURPOSES } from './vocabulary.ts';

export const FILE_LIMITS = {
  /** Bytes of one upload. */
  fileBytes: 200 * 1024 * 1024,
  imageBytes: 40 * 1024 * 1024,
} as const;

export const IMAGE_SIZES = ['thumb', 'screen', 'full'] as const;

export const storedFileView = z.object({
  id: uuid,
  name: z.string(),
  mediaType: z.string(),
  byteSize: z.int(),
  /** SHA-256 of the stored bytes, hexadecimal. */
  sha256: z.string(),
  width: z.int().nullable(),
  height: z.int().nullable(),
  place: z.enum(FILE_PLACES),
  placeId: uuid,
  purpose: z.enum(FILE_PURPOSES),
  caption: z.string(),
  addedBy: z.string(),
  addedAt: instant,
});
export type StoredFileView = z.infer<typeof storedFileView>;

export const listFiles = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/files',
  status: 200,
  access: 'signed-in',
  summary: 'Files of one place: a thread, a report, or the commission itself',
  params: inCommission,
  query: z.object({ place: z.enum(FILE_PLACES), placeId: uuid }),
  body: nothing,
  response: z.array(storedFileView),
  problems: ['not-found', 'not-permitted'],
});

export const uploadFile = defineRoute({
  method: 'POST',
  path: '/commissions/:commissionId/files',
  status: 201,
  access: 'signed-in',
  multipart: true,
  summary: 'Add one file to a place, under an id the browser made; sending again stores nothing twice',
  params: inCommission,
  query: nothing,
  body: z.object({
    id: uuid,
    place: z.enum(FILE_PLACES),
    placeId: uuid,
    purpose: z.enum(FILE_PURPOSES),
    caption: z.string().trim().max(300).default(''),
  }),
  response: storedFileView,
  problems: ['not-found', 'not-permitted', 'too-large', 'file-refused', 'already-there', 'busy'],
});

export const readFileContent = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/files/:fileId/content',
  status: 200,
  access: 'signed-in',
  raw: true,
  summary: 'The bytes, with ranges; photographs in a size',
  params: inCommission.extend({ fileId: uuid }),
  query: z.object({ size: z.enum(IMAGE_SIZES).optional() }),
  body: nothing,
  response: nothing,
  problems: ['not-found', 'not-permitted', 'range-not-satisfiable'],
});

export const removeFile = defineRoute({
  method: 'DELETE',
  path: '/commissions/:commissionId/files/:fileId',
  status: 204,
  access: 'signed-in',
  summary: 'Take a file back before it is part of a message or report history (its sender)',
  params: inCommission.extend({ fileId: uuid }),
  query: nothing,
  body: nothing,
  response: nothing,
  problems: ['not-found', 'not-permitted', 'not-in-this-state'],
});
