import type * as contracts from '../../../shared/contracts/accounts.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { AppError, InputInvalid } from '../../errors.ts';
import type { OpenContext, RequestContext } from '../../http/context.ts';
import { loadSignInFacts } from '../../queries/accounts/load-account.ts';
import { findReset } from '../../queries/accounts/find-reset.ts';
import { addressKey } from '../../security/address-key.ts';
import { weaknessOf } from '../../security/common-passwords.ts';
import { hashPassword, verifyPassword } from '../../security/passwords.ts';
import { hashToken, newLinkToken } from '../../security/tokens.ts';
import { endSessionsOf, openSession } from './sessions.ts';

const ONE_HOUR_MS = 60 * 60 * 1000;

/** Refuses a password that guessers try first. @param pointer the field it was typed in */
export function guardPassword(password: string, person: { email: string; displayName: string }, pointer: string): void {
  const weakness = weaknessOf(password, ['ferrule', person.displayName, person.email, ...person.email.split(/[@.]/)]);
  if (weakness) throw new InputInvalid([{ pointer, message: weakness }]);
}

/** Every session ends, and this browser gets a new one. */
export async function changePassword(
  ctx: RequestContext,
  { body }: ParsedInput<typeof contracts.changePassword>,
): Promise<void> {
  const { accountId } = ctx.actor;
  await ctx.services.limits.take('password', accountId);
  guardPassword(body.newPassword, ctx.person, '/body/newPassword');
  const facts = await loadSignInFacts(ctx.manager, { id: accountId });
  if (!(await verifyPassword(facts?.passwordHash ?? null, body.currentPassword)))
    throw new AppError('credentials-refused', 'The current password is not right. Nothing was changed.');
  const passwordHash = await hashPassword(body.newPassword);
  await inTransaction(ctx, async ({ manager }) => {
    await manager.query('UPDATE "account" SET "password_hash" = $2 WHERE "id" = $1', [accountId, passwordHash]);
    // A reset link that is still on its way would undo the change.
    await manager.query('UPDATE "password_reset" SET "used_at" = $2 WHERE "account_id" = $1 AND "used_at" IS NULL', [
      accountId,
      ctx.now,
    ]);
    await endSessionsOf(manager, accountId);
  });
  await openSession(ctx.req, accountId, ctx.now);
  await ctx.services.limits.forget('password', accountId);
  ctx.services.endConnections(accountId);
}

/**
 * The answer is the same whether the account is there or not, and takes as long: in both cases one row goes into the
 * outbox, and the letter leaves after the answer.
 */
export async function askPasswordReset(
  ctx: OpenContext,
  { body }: ParsedInput<typeof contracts.askPasswordReset>,
): Promise<void> {
  await ctx.services.limits.take('reset-address', addressKey(ctx.req.ip));
  await ctx.services.limits.take('reset-email', body.email);
  const { token, tokenHash } = newLinkToken();
  await inTransaction(ctx, async (uow) => {
    const [account] = await uow.manager.query<{ display_name: string }[]>(
      `WITH found AS (SELECT "id", "display_name" FROM "account" WHERE "email" = $1),
         made AS (INSERT INTO "password_reset" ("account_id", "token_hash", "expires_at") SELECT "id", $2, $3 FROM found)
       SELECT "display_name" FROM found`,
      [body.email, tokenHash, new Date(ctx.now.getTime() + ONE_HOUR_MS)],
    );
    uow.mail(
      account
        ? { letter: 'password-reset', to: body.email, displayName: account.display_name, token }
        : { letter: 'none', to: body.email },
    );
  });
}

export async function completePasswordReset(
  ctx: OpenContext,
  { body }: ParsedInput<typeof contracts.completePasswordReset>,
): Promise<void> {
  await ctx.services.limits.take('link', addressKey(ctx.req.ip));
  const tokenHash = hashToken(body.token);
  const person = await findReset(ctx.manager, tokenHash, ctx.now);
  if (!person) throw linkExpired();
  guardPassword(body.newPassword, person, '/body/newPassword');
  // Before the transaction: a hash takes long, and a connection is not to be held for it.
  const passwordHash = await hashPassword(body.newPassword);
  const { accountId } = person;
  await inTransaction(ctx, async ({ manager }) => {
    // Taking the link is one statement, so that of two tries at once one gets it.
    const [, taken] = await manager.query<[unknown[], number]>(
      `UPDATE "password_reset" SET "used_at" = $2
        WHERE "token_hash" = $1 AND "used_at" IS NULL AND "expires_at" > $2`,
      [tokenHash, ctx.now],
    );
    if (taken !== 1) throw linkExpired();
    await manager.query('UPDATE "account" SET "password_hash" = $2 WHERE "id" = $1', [accountId, passwordHash]);
    // Other links of the account end with it.
    await manager.query('UPDATE "password_reset" SET "used_at" = $2 WHERE "account_id" = $1 AND "used_at" IS NULL', [
      accountId,
      ctx.now,
    ]);
    await endSessionsOf(manager, accountId);
  });
  ctx.services.endConnections(accountId);
}

const linkExpired = (): AppError => new AppError('link-expired', 'Ask for a new link; each works once, for one hour.');
