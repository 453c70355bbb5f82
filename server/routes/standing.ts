import * as contracts from '../../shared/contracts/standing.ts';
import { mayDo } from '../../shared/abilities/ability.ts';
import { NotPermitted } from '../errors.ts';
import type { Api } from '../http/api.ts';
import { loadCommission } from '../queries/commissions/load-commission.ts';
import { loadClientFacts } from '../queries/standing/load-facts.ts';

export function mountStanding(api: Api): void {
  api.signedIn(contracts.getStanding, async (ctx, { params: { commissionId } }) => {
    const commission = await loadCommission(ctx.manager, ctx.ability, commissionId);
    if (!mayDo(ctx.ability, 'read', 'Standing', { commissionId })) throw new NotPermitted();
    return { todayIso: ctx.todayIso, facts: await loadClientFacts(ctx.manager, commission, ctx.todayIso) };
  });
}
