import type * as contracts from '../../../shared/contracts/accounts.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { PasswordReset } from '../../entities/password-reset.ts';
import { AppError, InputInvalid } from '../../errors.ts';
import type { OpenContext, RequestContext } from '../../http/context.ts';
import { loadSignInFacts } from '../../queries/accounts/load-account.ts';
import { weaknessOf } from '../../security/common-passwords.ts';
import { hashPassword, verifyPassword } from '../../security/passwords.ts';
import { hashToken, newLinkToken } from '../../security/tokens.ts';
import { endSessionsOf } from './sessions.ts';

const ONE_HOUR_MS = 60 * 60 * 1000;

/** Refuses a password that guessers try first. @param pointer the field it was typed in */
export function guardPassword(password: string, person: { email: string; displayName: string }, pointer: string): void {
  const weakness = weaknessOf(password, ['ferrule', person.displayName, person.email, ...person.email.split(/[@.]/)]);
  if (weakness) throw new InputInvalid([{ pointer, message: weakness }]);
}

export async function changePassword(ctx: RequestContext, { body }: ParsedInput<typeof contracts.changePassword>): Promise<void> {
  const { accountId } = ctx.actor;
  await ctx.services.limits.take('password', accountId);
  guardPassword(body.newPassword, ctx.person, '/body/newPassword');
  const facts = await loadSignInFacts(ctx.manager, { id: accountId });
  if (!(await verifyPassword(facts?.passwordHash ?? null, body.currentPassword)))
    throw new AppError('credentials-refused', 'The current password is not right. Nothing was changed.');
  const passwordHash = await hashPassword(body.newPassword);
  await ctx.manager.query('UPDATE "account" SET "password_hash" = $2 WHERE "id" = $1', [accountId, passwordHash]);
  await endSessionsOf(ctx.manager, accountId, ctx.req.sessionID);
  ctx.services.endConnections(accountId);
}

/** The answer is the same whether the account is there or not; the letter leaves by the outbox, after the answer. */
export async function askPasswordReset(ctx: OpenContext, { body }: ParsedInput<typeof contracts.askPasswordReset>): Promise<void> {
  await ctx.services.limits.take('reset-address', ctx.req.ip ?? 'unknown');
  await ctx.services.limits.take('reset-email', body.email);
  await inTransaction(ctx, async (uow) => {
    const facts = await loadSignInFacts(uow.manager, { email: body.email });
    if (!facts) return;
    const { token, tokenHash } = newLinkToken();
    await uow.manager.insert(PasswordReset, { accountId: facts.id, tokenHash, expiresAt: new Date(ctx.now.getTime() + ONE_HOUR_MS) });
    uow.mail({ letter: 'password-reset', to: facts.email, displayName: facts.displayName, token });
  });
}

export async function completePasswordReset(ctx: OpenContext, { body }: ParsedInput<typeof contracts.completePasswordReset>): Promise<void> {
  await ctx.services.limits.take('link', ctx.req.ip ?? 'unknown');
  await inTransaction(ctx, async (uow) => {
    // Taking the link is one statement, so that of two tries at once one gets it.
    const [rows] = await uow.manager.query<[{ account_id: string }[], number]>(
      'UPDATE "password_reset" SET "used_at" = $2 WHERE "token_hash" = $1 AND "used_at" IS NULL AND "expires_at" > $2 RETURNING "account_id"',
      [hashToken(body.token), ctx.now],
    );
    const accountId = rows[0]?.account_id;
    const facts = accountId ? await loadSignInFacts(uow.manager, { id: accountId }) : null;
    if (!accountId || !facts) throw new AppError('link-expired', 'Ask for a new link; each works once, for one hour.');
    guardPassword(body.newPassword, facts, '/body/newPassword');
    const passwordHash = await hashPassword(body.newPassword);
    await uow.manager.query('UPDATE "account" SET "password_hash" = $2 WHERE "id" = $1', [accountId, passwordHash]);
    // Other links of the account end with it.
    await uow.manager.query('UPDATE "password_reset" SET "used_at" = $2 WHERE "account_id" = $1 AND "used_at" IS NULL', [accountId, ctx.now]);
    await endSessionsOf(uow.manager, accountId);
    ctx.services.endConnections(accountId);
  });
}
