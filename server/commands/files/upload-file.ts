import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { stat } from 'node:fs/promises';
import { pipeline } from 'node:stream/promises';
import { FILE_LIMITS, uploadFile as contract, type StoredFileView } from '../../../shared/contracts/files.ts';
import { pointersOf } from '../../../shared/problems/pointers.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { FitReport } from '../../entities/fit-report.ts';
import { StoredFile } from '../../entities/stored-file.ts';
import { AppError, InputInvalid, isConstraint, NotFound } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { unstorableIn } from '../../http/unstorable.ts';
import { createUploadReceiver, type ReceivedFile } from '../../http/multipart.ts';
import { detectMediaType } from '../../integrations/images/detect-media-type.ts';
import { FileRefusedError } from '../../integrations/images/file-refused-error.ts';
import { stripVideoLocation } from '../../integrations/images/strip-video-location.ts';
import { newObjectKey, type ObjectStorage } from '../../integrations/storage/object-storage.ts';
import { authorizeFilePlace } from '../../policies/authorize-file.ts';
import { authorizeCommissionSight } from '../../policies/authorize.ts';
import { loadFile, presentFile } from '../../queries/files/load-files.ts';
import { storePhotograph, type StoredBytes } from './store-photograph.ts';

/** What each place takes; a purpose elsewhere is a mistake of the sender. */
const PURPOSES = {
  thread: ['message'],
  report: ['before', 'after'],
  commission: ['cover', 'brief', 'condition'],
} as const satisfies Record<string, readonly string[]>;

async function checksumOf(filePath: string): Promise<string> {
  const hash = createHash('sha256');
  await pipeline(createReadStream(filePath), hash);
  return hash.digest('hex');
}

/** What is shown as a picture of the piece has to be one, or a video; a brief may be a paper too. */
const PICTURED = new Set(['before', 'after', 'cover', 'condition']);

/** Stores what was received under made-up names: photographs in sizes, videos without their place, the rest as it is. */
async function store(storage: ObjectStorage, file: ReceivedFile, purpose: string): Promise<StoredBytes> {
  const { mediaType, kind } = await detectMediaType(file.path);
  if (PICTURED.has(purpose) && !/^(?:image|video)\//.test(mediaType))
    throw new AppError('file-refused', 'Only pictures and videos go here, and this file is neither.');
  if (kind === 'image') {
    if (file.byteSize > FILE_LIMITS.imageBytes)
      throw new FileRefusedError(
        'image-too-large',
        `A picture may have up to ${FILE_LIMITS.imageBytes / 1024 / 1024} MB.`,
      );
    return storePhotograph(storage, file.path);
  }
  const isVideo = mediaType === 'video/mp4' || mediaType === 'video/quicktime';
  if (isVideo) await stripVideoLocation(file.path);
  const sha256 = isVideo ? await checksumOf(file.path) : file.sha256;
  const byteSize = isVideo ? (await stat(file.path)).size : file.byteSize;
  const storageKey = newObjectKey();
  await storage.put({ filePath: file.path }, storageKey, { mediaType, byteSize });
  return { mediaType, byteSize: String(byteSize), sha256, storageKey, renditions: null, width: null, height: null };
}

const keysOfStored = (stored: StoredBytes): string[] =>
  stored.renditions ? Object.values(stored.renditions).map((one) => one.key) : [stored.storageKey];

const asProblem = (thrown: unknown): unknown =>
  thrown instanceof FileRefusedError
    ? new AppError(thrown.code === 'too-large' ? 'too-large' : 'file-refused', thrown.words)
    : thrown;

/** Takes one file into a place. The same id again gives what is stored; a file whose row cannot be written leaves nothing behind. */
export async function uploadFile(ctx: RequestContext): Promise<StoredFileView> {
  const params = contract.params.safeParse(ctx.req.params);
  if (!params.success) throw new NotFound();
  const { commissionId } = params.data;
  // Who has no part in the commission is turned away before a byte of the file is read.
  authorizeCommissionSight(ctx.ability, commissionId);
  const { UPLOADS_DIR, MAX_UPLOAD_BYTES } = ctx.services.env;
  try {
    const receive = createUploadReceiver({
      uploadsDir: UPLOADS_DIR,
      maxFileBytes: Math.min(MAX_UPLOAD_BYTES, FILE_LIMITS.fileBytes),
    });
    const { fields, file } = await receive(ctx.req, ctx.res);
    try {
      return await keep(ctx, commissionId, fields, file);
    } finally {
      await file.discard();
    }
  } catch (error) {
    throw asProblem(error);
  }
}

async function keep(
  ctx: RequestContext,
  commissionId: string,
  fields: Readonly<Record<string, unknown>>,
  file: ReceivedFile,
): Promise<StoredFileView> {
  const unstorable = unstorableIn('body', fields);
  if (unstorable.length > 0) throw new InputInvalid(unstorable);
  const parsed = contract.body.safeParse(fields);
  if (!parsed.success) throw new InputInvalid(pointersOf('body', parsed.error.issues));
  const { id, place, placeId, purpose, caption } = parsed.data;
  const audience = await authorizeFilePlace(ctx.manager, ctx.ability, { commissionId, place, placeId }, 'picture');
  if (!(PURPOSES[place] as readonly string[]).includes(purpose))
    throw new InputInvalid([
      { pointer: '/body/purpose', message: `Files here are for: ${PURPOSES[place].join(', ')}` },
    ]);
  const earlier = await loadFile(ctx.manager, commissionId, id);
  if (earlier) {
    if (earlier.addedByAccountId !== ctx.actor.accountId || earlier.placeId !== placeId)
      throw new AppError('already-there', 'A file with this id is somewhere else.');
    return presentFile(earlier);
  }
  const { storage } = ctx.services;
  const stored = await store(storage, file, purpose);
  try {
    await inTransaction(ctx, async (uow) => {
      await uow.manager.insert(StoredFile, {
        id,
        commissionId,
        place,
        placeId,
        purpose,
        caption,
        name: file.name,
        addedByAccountId: ctx.actor.accountId,
        createdAt: ctx.now,
        ...stored,
      });
      uow.announce('files.changed', { commissionId, place, placeId }, audience);
      if (place === 'report') {
        const report = await uow.manager.findOneByOrFail(FitReport, { id: placeId });
        uow.announce('fit-report.changed', { commissionId, reportId: placeId, jointId: report.jointId }, audience);
      }
    });
  } catch (error) {
    await Promise.all(keysOfStored(stored).map((key) => storage.remove(key)));
    // The same upload twice at the same moment: the one that came first is what is stored.
    if (!isConstraint(error, 'PK_e140967af84027b493a3ff04fbb')) throw error;
  }
  const row = await loadFile(ctx.manager, commissionId, id);
  if (!row) throw new NotFound();
  return presentFile(row);
}
