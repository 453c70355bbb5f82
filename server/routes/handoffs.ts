import * as contracts from '../../shared/contracts/handoffs.ts';
import { completeHandoff } from '../commands/handoffs/complete-handoff.ts';
import { createHandoff } from '../commands/handoffs/create-handoff.ts';
import { dropHandoff } from '../commands/handoffs/drop-handoff.ts';
import * as days from '../commands/handoffs/handoff-days.ts';
import type { HandoffView } from '../../shared/contracts/handoffs.ts';
import type { Api } from '../http/api.ts';
import type { RequestContext } from '../http/context.ts';
import { authorize, authorizeCommissionSight } from '../policies/authorize.ts';
import { loadHandoff, loadVisibleHandoffs, presentHandoff } from '../queries/handoffs/load-handoffs.ts';
import { previewHandoffDay } from '../queries/handoffs/preview-day.ts';

async function shownHandoff(ctx: RequestContext, commissionId: string, handoffId: string): Promise<HandoffView> {
  const row = await loadHandoff(ctx.manager, commissionId, handoffId);
  authorize(ctx.ability, 'read', 'Handoff', row);
  return presentHandoff(ctx.ability, row);
}

/** Runs a command and answers with the handoff as its caller now sees it. */
const thenShown =
  <I extends { params: { commissionId: string } }>(command: (ctx: RequestContext, input: I) => Promise<string>) =>
  async (ctx: RequestContext, input: I): Promise<HandoffView> =>
    shownHandoff(ctx, input.params.commissionId, await command(ctx, input));

export function mountHandoffs(api: Api): void {
  api.signedIn(contracts.listHandoffs, async (ctx, { params: { commissionId } }) => {
    authorizeCommissionSight(ctx.ability, commissionId);
    return (await loadVisibleHandoffs(ctx.manager, ctx.ability, commissionId)).map((row) =>
      presentHandoff(ctx.ability, row),
    );
  });
  api.signedIn(contracts.getHandoff, (ctx, { params }) => shownHandoff(ctx, params.commissionId, params.handoffId));
  api.signedIn(contracts.createHandoff, thenShown(createHandoff));
  api.signedIn(contracts.previewHandoffDay, previewHandoffDay);
  api.signedIn(contracts.offerHandoffDay, thenShown(days.offerHandoffDay));
  api.signedIn(contracts.acceptHandoffDay, thenShown(days.acceptHandoffDay));
  api.signedIn(contracts.declineHandoffDay, thenShown(days.declineHandoffDay));
  api.signedIn(contracts.withdrawHandoffDay, thenShown(days.withdrawHandoffDay));
  api.signedIn(contracts.completeHandoff, thenShown(completeHandoff));
  api.signedIn(contracts.dropHandoff, async (ctx, input) => {
    await dropHandoff(ctx, input);
    return {};
  });
}
