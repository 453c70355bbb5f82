import * as contracts from '../../shared/contracts/files.ts';
import { removeFile } from '../commands/files/remove-file.ts';
import { uploadFile } from '../commands/files/upload-file.ts';
import { NotFound } from '../errors.ts';
import type { Api } from '../http/api.ts';
import { sendStoredBytes } from '../http/byte-range.ts';
import { parseInput } from '../http/parse-input.ts';
import { authorizeFilePlace } from '../policies/authorize-file.ts';
import { loadFile, loadFilesAt, presentFile } from '../queries/files/load-files.ts';

export function mountFiles(api: Api): void {
  api.signedIn(contracts.listFiles, async (ctx, { params: { commissionId }, query }) => {
    await authorizeFilePlace(ctx.manager, ctx.ability, { commissionId, ...query }, 'read');
    return (await loadFilesAt(ctx.manager, commissionId, query.place, query.placeId)).map(presentFile);
  });
  api.bytes(contracts.uploadFile, async (ctx) => {
    ctx.res.status(contracts.uploadFile.status).json(contracts.uploadFile.response.parse(await uploadFile(ctx)));
  });
  api.bytes(contracts.readFileContent, async (ctx) => {
    const { params, query } = parseInput(contracts.readFileContent, ctx.req);
    const file = await loadFile(ctx.manager, params.commissionId, params.fileId);
    if (!file) throw new NotFound();
    // Rights are asked at each request: a link that was good a minute ago may not be now.
    await authorizeFilePlace(ctx.manager, ctx.ability, file, 'read', file.purpose);
    const size = file.renditions?.[query.size ?? 'full'];
    const bytes = size
      ? { key: size.key, byteSize: size.byteSize, sha256: size.sha256, mediaType: 'image/webp' }
      : { key: file.storageKey, byteSize: Number(file.byteSize), sha256: file.sha256, mediaType: file.mediaType };
    await sendStoredBytes(ctx.req, ctx.res, ctx.services.storage, { ...bytes, name: file.name });
  });
  api.signedIn(contracts.removeFile, async (ctx, input) => {
    await removeFile(ctx, input);
    return {};
  });
}
