import { createHash, randomBytes } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { mkdir, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Request, Response } from 'express';
import multer, { MulterError, type StorageEngine } from 'multer';
import { FileRefusedError } from '../integrations/images/file-refused-error.ts';
import { cleanFileName } from '../integrations/storage/file-name.ts';

export interface ReceivedFile {
  /** Where it lies until it is stored or discarded. */
  readonly path: string;
  /** The sender's name for it, cleaned for showing. */
  readonly name: string;
  readonly byteSize: number;
  /** SHA-256 of what was received, hexadecimal. */
  readonly sha256: string;
  /** Removes it; removing it again is no error. */
  discard(): Promise<void>;
}

export interface ReceivedForm {
  /** Text fields, not yet checked. */
  readonly fields: Readonly<Record<string, unknown>>;
  readonly file: ReceivedFile;
}

export interface UploadOptions {
  readonly uploadsDir: string;
  readonly maxFileBytes: number;
  /** Form field that holds the file. */
  readonly fieldName?: string;
}

const FIELDS_MAX = 12;
const FIELD_BYTES_MAX = 8 * 1024;
const FIELD_NAME_BYTES_MAX = 60;
const HEADER_PAIRS_MAX = 20;

/** Folder of files under way; `sweepTempFiles` may clear it of what a killed process left. */
export const incomingFolder = (uploadsDir: string): string => join(uploadsDir, 'incoming');

interface KeptPart {
  path: string;
  size: number;
  sha256: string;
}

/** Writes a file to a made-up name and takes its sum on the way, so that it is read only once. */
function hashingDisk(folder: string): StorageEngine {
  const receive = async (file: Express.Multer.File): Promise<KeptPart> => {
    await mkdir(folder, { recursive: true, mode: 0o700 });
    const path = join(folder, randomBytes(16).toString('hex'));
    const hash = createHash('sha256');
    let size = 0;
    const summed = new Transform({
      transform(chunk: Buffer, _encoding, done) {
        hash.update(chunk);
        size += chunk.length;
        done(null, chunk);
      },
    });
    try {
      await pipeline(file.stream, summed, createWriteStream(path, { flags: 'wx', mode: 0o600 }));
    } catch (error) {
      await rm(path, { force: true });
      throw error;
    }
    return { path, size, sha256: hash.digest('hex') };
  };
  return {
    _handleFile: (_req, file, done) => void receive(file).then((kept) => done(null, kept), done),
    _removeFile: (_req, file, done) => void rm(file.path, { force: true }).then(() => done(null), done),
  };
}

const megabytes = (bytes: number): string => (bytes >= 1e6 ? `${Math.floor(bytes / 1e6)} MB` : `${bytes} bytes`);

function refusalOf(error: unknown, maxFileBytes: number): FileRefusedError {
  const code = error instanceof MulterError ? (error.code as string) : '';
  const options = { cause: error };
  if (code === 'LIMIT_FILE_SIZE')
    return new FileRefusedError(
      'too-large',
      `This file is larger than ${megabytes(maxFileBytes)}, so nothing of it was kept. Make it smaller or split it and send it again.`,
      options,
    );
  if (code === 'LIMIT_FILE_COUNT' || code === 'LIMIT_UNEXPECTED_FILE')
    return new FileRefusedError(
      'too-many',
      'Files are sent one at a time; none of these was kept. Send them singly.',
      options,
    );
  if (code.startsWith('LIMIT_') || code === 'INVALID_FIELD_NAME' || code === 'MISSING_FIELD_NAME')
    return new FileRefusedError(
      'form-too-large',
      'More came with this file than belongs to it, so nothing was kept. Reload the page and send it again.',
      options,
    );
  return new FileRefusedError(
    'upload-broken',
    'The file did not arrive whole, so nothing of it was kept. Send it again.',
    options,
  );
}

/** Faults of this side's disk, as against a connection that broke. */
const isFault = (error: unknown): boolean => {
  const { syscall } = error as NodeJS.ErrnoException;
  return syscall !== undefined && syscall !== 'read';
};

/**
 * Makes a reader of one file in a `multipart/form-data` request. The file lies on disk while it is looked at and is
 * the caller's to discard; where receiving fails or the sender goes away, nothing is left.
 * @throws (the reader) FileRefusedError `too-large`, `too-many`, `form-too-large` or `upload-broken`
 */
export function createUploadReceiver({
  uploadsDir,
  maxFileBytes,
  fieldName = 'file',
}: UploadOptions): (req: Request, res: Response) => Promise<ReceivedForm> {
  const read = multer({
    storage: hashingDisk(incomingFolder(uploadsDir)),
    defParamCharset: 'utf8',
    limits: {
      fileSize: maxFileBytes,
      files: 1,
      fields: FIELDS_MAX,
      parts: FIELDS_MAX + 1,
      fieldSize: FIELD_BYTES_MAX,
      fieldNameSize: FIELD_NAME_BYTES_MAX,
      fieldNestingDepth: 0,
      headerPairs: HEADER_PAIRS_MAX,
    },
  }).single(fieldName);

  return async (req, res) => {
    try {
      await new Promise<void>((resolve, reject) => {
        read(req, res, (error?: unknown) => (error instanceof Error ? reject(error) : resolve()));
      });
    } catch (error) {
      if (isFault(error)) throw error;
      throw refusalOf(error, maxFileBytes);
    }
    const kept = req.file as (Express.Multer.File & KeptPart) | undefined;
    if (!kept)
      throw new FileRefusedError(
        'upload-broken',
        'No file came with this, so nothing was kept. Choose one and send it again.',
      );
    return {
      fields: { ...(req.body as Record<string, unknown>) },
      file: {
        path: kept.path,
        name: cleanFileName(kept.originalname),
        byteSize: kept.size,
        sha256: kept.sha256,
        discard: () => rm(kept.path, { force: true }),
      },
    };
  };
}
