import * as contracts from '../../shared/contracts/accounts.ts';
import * as passwords from '../commands/accounts/passwords.ts';
import * as factor from '../commands/accounts/second-factor.ts';
import { closeSession, endSessionsOf } from '../commands/accounts/sessions.ts';
import { giveSecondFactor, signIn } from '../commands/accounts/sign-in.ts';
import { updateMe } from '../commands/accounts/update-me.ts';
import { acceptInvitation } from '../commands/invitations/accept-invitation.ts';
import type { Api } from '../http/api.ts';
import { loadAccountView } from '../queries/accounts/load-account.ts';
import { previewInvitation } from '../queries/invitations/preview-invitation.ts';

/** Runs a command whose answer is empty. */
const done =
  <C, I>(command: (ctx: C, input: I) => Promise<unknown>) =>
  async (ctx: C, input: I): Promise<Record<string, never>> => {
    await command(ctx, input);
    return {};
  };

export function mountAccounts(api: Api): void {
  api.open(contracts.signIn, signIn);
  api.open(contracts.giveSecondFactor, giveSecondFactor);
  api.signedIn(
    contracts.signOut,
    done(async (ctx) => {
      await closeSession(ctx.req);
      // Those of the person's other sessions come back by themselves.
      ctx.services.endConnections(ctx.actor.accountId);
    }),
  );
  api.signedIn(
    contracts.signOutEverywhere,
    done(async (ctx) => {
      await endSessionsOf(ctx.manager, ctx.actor.accountId);
      await closeSession(ctx.req);
      ctx.services.endConnections(ctx.actor.accountId);
    }),
  );
  api.signedIn(contracts.getMe, (ctx) => loadAccountView(ctx.manager, ctx.actor.accountId));
  api.signedIn(contracts.updateMe, async (ctx, input) => {
    await updateMe(ctx, input);
    return loadAccountView(ctx.manager, ctx.actor.accountId);
  });
  api.signedIn(contracts.changePassword, done(passwords.changePassword));
  api.signedIn(contracts.beginSecondFactor, factor.beginSecondFactor);
  api.signedIn(contracts.confirmSecondFactor, factor.confirmSecondFactor);
  api.signedIn(contracts.removeSecondFactor, done(factor.removeSecondFactor));
  api.open(contracts.askPasswordReset, done(passwords.askPasswordReset));
  api.open(contracts.completePasswordReset, done(passwords.completePasswordReset));
  api.open(contracts.previewInvitation, previewInvitation);
  api.open(contracts.acceptInvitation, acceptInvitation);
}
