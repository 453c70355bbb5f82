import type { giveSecondFactor as factorContract, signIn as contract } from '../../../shared/contracts/accounts.ts';
import type { ParsedInput, RouteOutput } from '../../../shared/contracts/route.ts';
import { AppError } from '../../errors.ts';
import type { OpenContext } from '../../http/context.ts';
import { loadSignInFacts } from '../../queries/accounts/load-account.ts';
import { addressKey } from '../../security/address-key.ts';
import { verifyPassword } from '../../security/passwords.ts';
import { takeSecondFactor } from './second-factor.ts';
import { openPendingSession, openSession } from './sessions.ts';

type SignedIn = RouteOutput<typeof contract>;

const PENDING_MS = 10 * 60 * 1000;

/** One answer and one duration, whether the account is there or not. */
export async function signIn(ctx: OpenContext, { body }: ParsedInput<typeof contract>): Promise<SignedIn> {
  const { limits } = ctx.services;
  const address = addressKey(ctx.req.ip);
  const pair = `${address}|${body.email}`;
  await limits.take('sign-in-address', address);
  await limits.take('sign-in-pair', pair);
  const facts = await loadSignInFacts(ctx.manager, { email: body.email });
  const right = await verifyPassword(facts?.passwordHash ?? null, body.password);
  if (!right || !facts)
    throw new AppError(
      'credentials-refused',
      'E-mail and password do not go together. Check both, or ask for a new password.',
    );
  await limits.forget('sign-in-pair', pair);
  if (facts.secondFactor) {
    await openPendingSession(ctx.req, facts.id, ctx.now);
    return { next: 'second-factor' };
  }
  await openSession(ctx.req, facts.id, ctx.now);
  return { next: 'done' };
}

export async function giveSecondFactor(
  ctx: OpenContext,
  { body }: ParsedInput<typeof factorContract>,
): Promise<SignedIn> {
  const { pendingAccountId, pendingSince } = ctx.req.session;
  if (!pendingAccountId || !pendingSince || ctx.now.getTime() - pendingSince > PENDING_MS)
    throw new AppError('credentials-refused', 'This sign-in has run out. Begin again with your password.');
  await ctx.services.limits.take('second-factor', pendingAccountId);
  if (!(await takeSecondFactor(ctx, pendingAccountId, body.code)))
    throw new AppError(
      'credentials-refused',
      'This code is not right, or was used already. Wait for the next one and try again.',
    );
  await ctx.services.limits.forget('second-factor', pendingAccountId);
  await openSession(ctx.req, pendingAccountId, ctx.now);
  return { next: 'done' };
}
