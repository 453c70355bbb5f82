import * as contracts from '../../shared/contracts/commissions.ts';
import { inviteParty } from '../commands/parties/invite-party.ts';
import { removeParty } from '../commands/parties/remove-party.ts';
import { withdrawInvitation } from '../commands/parties/withdraw-invitation.ts';
import type { Api } from '../http/api.ts';
import { listParties } from '../queries/parties/list-parties.ts';

export function mountParties(api: Api): void {
  api.signedIn(contracts.listParties, listParties);
  api.signedIn(contracts.inviteParty, async (ctx, input) => {
    const row = await inviteParty(ctx, input);
    return {
      id: row.id,
      email: row.email,
      roles: row.roles,
      invitedAt: row.createdAt.toISOString(),
      expiresAt: row.expiresAt.toISOString(),
    };
  });
  api.signedIn(contracts.withdrawInvitation, async (ctx, input) => {
    await withdrawInvitation(ctx, input);
    return {};
  });
  api.signedIn(contracts.removeParty, async (ctx, input) => {
    await removeParty(ctx, input);
    return {};
  });
}
