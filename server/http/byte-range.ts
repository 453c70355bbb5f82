import { pipeline } from 'node:stream/promises';
import type { Request, Response } from 'express';
import { AppError } from '../errors.ts';
import { isShownInline } from '../integrations/images/media-types.ts';
import { downloadName } from '../integrations/storage/file-name.ts';
import type { ByteSpan, ObjectStorage } from '../integrations/storage/object-storage.ts';

/** What a `Range` header asks of a file: all of it, a part of it, or something that it does not have. */
export type AskedRange = 'whole' | 'unsatisfiable' | ByteSpan;

/**
 * Reads a `Range` header (RFC 9110, 14.1.2 and 14.2). A header that is not understood is ignored, as the standard asks,
 * and so are several ranges at once, which a server may answer with the whole.
 */
export function askedRange(header: string | undefined, byteSize: number): AskedRange {
  const [, first, last] = /^bytes\s*=\s*(\d*)\s*-\s*(\d*)\s*$/i.exec(header ?? '') ?? [];
  if (first === undefined || last === undefined || (first === '' && last === '')) return 'whole';
  if (first === '') {
    const length = Math.min(Number(last), byteSize);
    return length === 0 ? 'unsatisfiable' : { start: byteSize - length, end: byteSize - 1 };
  }
  const start = Number(first);
  if (last !== '' && isBefore(last, first)) return 'whole';
  if (start >= byteSize) return 'unsatisfiable';
  return { start, end: last === '' ? byteSize - 1 : Math.min(Number(last), byteSize - 1) };
}

/** Compared as written: numbers beyond 2^53 lose digits. */
const isBefore = (one: string, other: string): boolean => BigInt(one) < BigInt(other);

export interface StoredBytes {
  readonly key: string;
  readonly byteSize: number;
  /** As stored by us after looking into the file; what the sender called it plays no part. */
  readonly mediaType: string;
  /** SHA-256 of the bytes, hexadecimal. */
  readonly sha256: string;
  /** Name for showing and saving. */
  readonly name: string;
}

/** A header value for a name in any script (RFC 6266, RFC 8187). */
export function contentDisposition(name: string, mediaType: string): string {
  const saved = downloadName(name, mediaType);
  const plain = saved.replace(/[^\x20-\x7E]|["\\%]/g, '_');
  const encoded = encodeURIComponent(saved).replace(
    /['()*!]/g,
    (character) => `%${character.charCodeAt(0).toString(16).toUpperCase()}`,
  );
  return `${isShownInline(mediaType) ? 'inline' : 'attachment'}; filename="${plain}"; filename*=UTF-8''${encoded}`;
}

const isText = (mediaType: string): boolean => mediaType.startsWith('text/') || mediaType === 'application/json';

function describe(res: Response, file: StoredBytes, etag: string): void {
  res.setHeader('ETag', etag);
  res.setHeader('Accept-Ranges', 'bytes');
  // Kept, but asked about each time: rights may end, and someone else may sign in at this browser.
  res.setHeader('Cache-Control', 'private, no-cache');
  res.setHeader('X-Content-Type-Options', 'nosniff');
  res.setHeader('Cross-Origin-Resource-Policy', 'same-origin');
  res.setHeader(
    'Content-Security-Policy',
    "default-src 'none'; img-src 'self'; media-src 'self'; frame-ancestors 'none'; sandbox",
  );
  res.setHeader('Content-Disposition', contentDisposition(file.name, file.mediaType));
  res.setHeader('Content-Type', isText(file.mediaType) ? `${file.mediaType}; charset=utf-8` : file.mediaType);
}

/** Whether an `If-None-Match` list names the entity, compared weakly (RFC 9110, 13.1.2). */
const isKnown = (header: string | undefined, etag: string): boolean =>
  header !== undefined && header.split(',').some((one) => ['*', etag].includes(one.trim().replace(/^W\//, '')));

/**
 * Sends a stored file, or the part of it that is asked for. `If-Range` counts only with the same strong ETag, so that a
 * part of one version is never joined to a part of another. A stream that breaks cuts the connection, since a short
 * answer must not look like a whole one.
 * @throws AppError `range-not-satisfiable` with `Content-Range` set; whatever the storage throws before the first byte
 */
export async function sendStoredBytes(
  req: Request,
  res: Response,
  storage: ObjectStorage,
  file: StoredBytes,
): Promise<void> {
  const etag = `"${file.sha256}"`;
  if (isKnown(req.get('if-none-match'), etag)) {
    describe(res, file, etag);
    res.removeHeader('Content-Type');
    return void res.status(304).end();
  }
  const condition = req.get('if-range');
  const rangeCounts = req.method === 'GET' && (condition === undefined || condition.trim() === etag);
  const asked = rangeCounts ? askedRange(req.get('range'), file.byteSize) : 'whole';
  if (asked === 'unsatisfiable') {
    res.setHeader('Content-Range', `bytes */${file.byteSize}`);
    throw new AppError('range-not-satisfiable', `The file has ${file.byteSize} bytes.`);
  }
  const span = asked === 'whole' ? undefined : asked;
  if (req.method === 'HEAD') {
    describe(res, file, etag);
    res.setHeader('Content-Length', file.byteSize);
    return void res.status(200).end();
  }
  const opened = await storage.openRead(file.key, span);
  if (!span && opened.byteSize !== file.byteSize) {
    opened.stream.destroy();
    throw new Error(`The object ${file.key} has ${opened.byteSize} bytes, not ${file.byteSize}.`);
  }
  describe(res, file, etag);
  res.setHeader('Content-Length', opened.byteSize);
  if (span) res.status(206).setHeader('Content-Range', `bytes ${span.start}-${span.end}/${file.byteSize}`);
  try {
    await pipeline(opened.stream, res);
  } catch (error) {
    // The pipeline has cut the connection. A reader who seeks or leaves closes the connection; that is no fault.
    if ((error as NodeJS.ErrnoException).code !== 'ERR_STREAM_PREMATURE_CLOSE') throw error;
  }
}
