import { ArrayContains } from 'typeorm';
import type { removeFile as contract } from '../../../shared/contracts/files.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Commission } from '../../entities/commission.ts';
import { FitReport } from '../../entities/fit-report.ts';
import { Message } from '../../entities/message.ts';
import { ReworkNote } from '../../entities/rework-note.ts';
import { StoredFile } from '../../entities/stored-file.ts';
import { NotFound, NotInThisState, NotPermitted } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorizeFilePlace } from '../../policies/authorize-file.ts';
import { loadFile } from '../../queries/files/load-files.ts';

/** Takes a file back while nobody relies on it: not part of a message, nor of a report that was answered. */
export async function removeFile(ctx: RequestContext, { params }: ParsedInput<typeof contract>): Promise<void> {
  const { commissionId, fileId } = params;
  const file = await loadFile(ctx.manager, commissionId, fileId);
  if (!file) throw new NotFound();
  const audience = await authorizeFilePlace(ctx.manager, ctx.ability, file, 'read', file.purpose);
  if (file.addedByAccountId !== ctx.actor.accountId)
    throw new NotPermitted('Only the person who added a file can take it back.');
  await inTransaction(ctx, async (uow) => {
    const carried =
      file.place === 'thread' &&
      (await uow.manager.existsBy(Message, { threadId: file.placeId, fileIds: ArrayContains([fileId]) }));
    if (carried) throw new NotInThisState('A message carries this file. What was sent stays as it was sent.');
    const report = file.place === 'report' ? await uow.manager.findOneBy(FitReport, { id: file.placeId }) : null;
    if (report && (report.state !== 'raised' || (await uow.manager.existsBy(ReworkNote, { reportId: report.id }))))
      throw new NotInThisState('The report has been answered on the strength of its pictures. They stay.');
    await uow.manager.update(Commission, { id: commissionId, coverFileId: fileId }, { coverFileId: null });
    await uow.manager.delete(StoredFile, { id: fileId });
    uow.announce('files.changed', { commissionId, place: file.place, placeId: file.placeId }, audience);
  });
  const keys = file.renditions ? Object.values(file.renditions).map((one) => one.key) : [file.storageKey];
  await Promise.all(keys.map((key) => ctx.services.storage.remove(key)));
}
