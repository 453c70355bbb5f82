import * as contracts from '../../shared/contracts/commissions.ts';
import { abilityFor } from '../../shared/abilities/ability.ts';
import { createCommission } from '../commands/commissions/create-commission.ts';
import { updateCommission } from '../commands/commissions/update-commission.ts';
import type { Api } from '../http/api.ts';
import { loadActorWithin } from '../policies/load-actor.ts';
import { presentCommission } from '../presenters/commission.ts';
import { listCommissions } from '../queries/commissions/list-commissions.ts';
import { loadCommission } from '../queries/commissions/load-commission.ts';

export function mountCommissions(api: Api): void {
  api.signedIn(contracts.listCommissions, listCommissions);
  api.signedIn(contracts.createCommission, async (ctx, input) => {
    const row = await createCommission(ctx, input);
    // The opener has just become the lead's person here; their memberships are read again inside the transaction.
    const known = await loadActorWithin(ctx.manager, ctx.actor.accountId, { commissionId: row.id });
    const actor = known?.actor ?? ctx.actor;
    return presentCommission(abilityFor(actor), actor, row);
  });
  api.signedIn(contracts.getCommission, async (ctx, { params }) =>
    presentCommission(ctx.ability, ctx.actor, await loadCommission(ctx.manager, ctx.ability, params.commissionId)),
  );
  api.signedIn(contracts.updateCommission, async (ctx, input) =>
    presentCommission(ctx.ability, ctx.actor, await updateCommission(ctx, input)),
  );
}
