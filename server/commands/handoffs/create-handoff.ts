import { In } from 'typeorm';
import type { createHandoff as contract } from '../../../shared/contracts/handoffs.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import type { ProblemError } from '../../../shared/problems/problems.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Handoff } from '../../entities/handoff.ts';
import { Leg } from '../../entities/leg.ts';
import { InputInvalid } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorizeCreate } from '../../policies/authorize.ts';
import { partyNames, requireParties } from '../../queries/parties/load-party.ts';
import { requireParts } from '../../queries/parts/load-part.ts';
import { announceHandoff } from './announce-handoff.ts';

/** A handoff comes after a leg of the party that gives, and before one of the party that receives. */
function legError(
  field: 'fromLegId' | 'toLegId',
  legId: string | null,
  owners: ReadonlyMap<string, string>,
  partyId: string,
): ProblemError[] {
  if (legId === null || owners.get(legId) === partyId) return [];
  const message = owners.has(legId) ? 'This leg is work of another party' : 'This leg is not in this commission';
  return [{ pointer: `/body/${field}`, message }];
}

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
    const owners = new Map(
      (await uow.manager.findBy(Leg, { commissionId, id: In(legIds) })).map((leg) => [leg.id, leg.partyId]),
    );
    const errors = [
      ...legError('fromLegId', body.fromLegId, owners, body.fromPartyId),
      ...legError('toLegId', body.toLegId, owners, body.toPartyId),
    ];
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
