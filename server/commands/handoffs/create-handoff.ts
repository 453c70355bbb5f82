import { In } from 'typeorm';
import type { createHandoff as contract } from '../../../shared/contracts/handoffs.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Handoff } from '../../entities/handoff.ts';
import { Leg } from '../../entities/leg.ts';
import { InputInvalid } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorizeCreate } from '../../policies/authorize.ts';
import { partyNames, requireParties } from '../../queries/parties/load-party.ts';
import { requireParts } from '../../queries/parts/load-part.ts';
import { announceHandoff } from './announce-handoff.ts';

export const createHandoff = (ctx: RequestContext, { params, body }: ParsedInput<typeof contract>): Promise<string> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId } = params;
    authorizeCreate(ctx.ability, 'Handoff', { commissionId, fromPartyId: body.fromPartyId, toPartyId: body.toPartyId });
    await requireParties(uow.manager, commissionId, [
      ['/body/fromPartyId', body.fromPartyId],
      ['/body/toPartyId', body.toPartyId],
    ]);
    await requireParts(
      uow.manager,
      commissionId,
      body.partIds.map((id, index) => [`/body/partIds/${index}`, id]),
    );
    const legIds = [body.fromLegId, body.toLegId].filter((id) => id !== null);
    const found = new Set((await uow.manager.findBy(Leg, { commissionId, id: In(legIds) })).map((leg) => leg.id));
    const errors = (['fromLegId', 'toLegId'] as const)
      .filter((field) => body[field] !== null && !found.has(body[field]))
      .map((field) => ({ pointer: `/body/${field}`, message: 'This leg is not in this commission' }));
    if (errors.length > 0) throw new InputInvalid(errors);
    const row = await uow.manager.save(
      uow.manager.create(Handoff, { ...body, partIds: [...new Set(body.partIds)], commissionId }),
    );
    const names = await partyNames(uow.manager, commissionId);
    announceHandoff(
      uow,
      ctx,
      row,
      `Planned a handoff from ${names.get(row.fromPartyId)} to ${names.get(row.toPartyId)}`,
    );
    return row.id;
  });
