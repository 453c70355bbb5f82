import { Like } from 'typeorm';
import type { updateCommission as contract } from '../../../shared/contracts/commissions.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Commission } from '../../entities/commission.ts';
import { StoredFile } from '../../entities/stored-file.ts';
import { InputInvalid } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorize } from '../../policies/authorize.ts';
import { presentCommission } from '../../presenters/commission.ts';
import { given, guardRevision } from '../revision.ts';

export const updateCommission = (
  ctx: RequestContext,
  { params, body }: ParsedInput<typeof contract>,
): Promise<Commission> =>
  inTransaction(ctx, async (uow) => {
    const row = await uow.manager.findOne(Commission, {
      where: { id: params.commissionId },
      lock: { mode: 'pessimistic_write' },
    });
    authorize(ctx.ability, 'update', 'Commission', row);
    const { revision, ...changes } = body;
    guardRevision(row, revision, () => presentCommission(ctx.ability, ctx.actor, row));
    if (changes.coverFileId) {
      const ours = await uow.manager.countBy(StoredFile, {
        id: changes.coverFileId,
        commissionId: row.id,
        place: 'commission',
        mediaType: Like('image/%'),
      });
      if (ours === 0)
        throw new InputInvalid([{ pointer: '/body/coverFileId', message: 'Choose a picture of this commission' }]);
    }
    const moves = changes.state !== undefined && changes.state !== row.state;
    Object.assign(row, given(changes), { revision: row.revision + 1, updatedAt: ctx.now });
    await uow.manager.save(row);
    uow.record({
      commissionId: row.id,
      accountId: ctx.actor.accountId,
      subject: 'commission',
      subjectId: row.id,
      words: moves ? `Set the commission to ${row.state.replace('-', ' ')}` : 'Changed the commission',
      clientMayRead: moves,
    });
    uow.announce('commission.changed', { commissionId: row.id }, { to: 'everyone', commissionId: row.id });
    uow.announce('standing.changed', { commissionId: row.id }, { to: 'everyone', commissionId: row.id });
    return row;
  });
