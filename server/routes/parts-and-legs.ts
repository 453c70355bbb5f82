import * as contracts from '../../shared/contracts/parts-and-legs.ts';
import { mayDo } from '../../shared/abilities/ability.ts';
import { createLeg } from '../commands/legs/create-leg.ts';
import { moveLeg } from '../commands/legs/move-leg.ts';
import { updateLeg } from '../commands/legs/update-leg.ts';
import { createPart } from '../commands/parts/create-part.ts';
import { updatePart } from '../commands/parts/update-part.ts';
import { Part } from '../entities/part.ts';
import { NotPermitted } from '../errors.ts';
import type { Api } from '../http/api.ts';
import { authorizeCommissionSight } from '../policies/authorize.ts';
import { presentLeg } from '../presenters/leg.ts';
import { presentPart } from '../presenters/part.ts';
import { loadVisibleLegs } from '../queries/legs/load-legs.ts';

export function mountPartsAndLegs(api: Api): void {
  api.signedIn(contracts.listParts, async (ctx, { params: { commissionId } }) => {
    authorizeCommissionSight(ctx.ability, commissionId);
    if (!mayDo(ctx.ability, 'read', 'Part', { commissionId })) throw new NotPermitted();
    return (await ctx.manager.find(Part, { where: { commissionId }, order: { position: 'ASC', id: 'ASC' } })).map(
      presentPart,
    );
  });
  api.signedIn(contracts.createPart, async (ctx, input) => presentPart(await createPart(ctx, input)));
  api.signedIn(contracts.updatePart, async (ctx, input) => presentPart(await updatePart(ctx, input)));
  api.signedIn(contracts.listLegs, async (ctx, { params: { commissionId } }) => {
    authorizeCommissionSight(ctx.ability, commissionId);
    return (await loadVisibleLegs(ctx.manager, ctx.ability, commissionId)).map((leg) => presentLeg(ctx.ability, leg));
  });
  api.signedIn(contracts.createLeg, async (ctx, input) => presentLeg(ctx.ability, await createLeg(ctx, input)));
  api.signedIn(contracts.updateLeg, async (ctx, input) => presentLeg(ctx.ability, await updateLeg(ctx, input)));
  api.signedIn(contracts.moveLeg, async (ctx, input) => presentLeg(ctx.ability, await moveLeg(ctx, input)));
}
