import { toString as qrCode } from 'qrcode';
import type { EntityManager } from 'typeorm';
import type * as contracts from '../../../shared/contracts/accounts.ts';
import type { ParsedInput, RouteOutput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { RecoveryCode } from '../../entities/recovery-code.ts';
import { AppError, NotInThisState } from '../../errors.ts';
import type { OpenContext, RequestContext } from '../../http/context.ts';
import { loadSignInFacts } from '../../queries/accounts/load-account.ts';
import { openField, sealField } from '../../security/field-cipher.ts';
import { verifyPassword } from '../../security/passwords.ts';
import { hashToken } from '../../security/tokens.ts';
import {
  newRecoveryCode,
  newTotpSecret,
  plainRecoveryCode,
  RECOVERY_CODES,
  totpStepOf,
  totpUri,
} from '../../security/totp.ts';

interface FactorRow {
  totp_secret: string | null;
  totp_confirmed_at: Date | null;
}

async function loadFactor(manager: EntityManager, accountId: string, lock = false): Promise<FactorRow | null> {
  const [row] = await manager.query<FactorRow[]>(
    `SELECT "totp_secret", "totp_confirmed_at" FROM "account" WHERE "id" = $1 ${lock ? 'FOR NO KEY UPDATE' : ''}`,
    [accountId],
  );
  return row ?? null;
}

/** Takes a code of the authenticator or a recovery code, each once: two tries at the same moment get one yes. */
export async function takeSecondFactor(ctx: OpenContext, accountId: string, code: string): Promise<boolean> {
  const factor = await loadFactor(ctx.manager, accountId);
  if (!factor?.totp_secret) return false;
  const step = await totpStepOf(
    openField(ctx.services.env.FIELD_KEY, factor.totp_secret),
    code,
    Math.floor(ctx.now.getTime() / 1000),
  );
  if (step !== null) {
    const [, taken] = await ctx.manager.query<[unknown[], number]>(
      'UPDATE "account" SET "totp_last_step" = $2 WHERE "id" = $1 AND ("totp_last_step" IS NULL OR "totp_last_step" < $2)',
      [accountId, step],
    );
    return taken === 1;
  }
  const [, used] = await ctx.manager.query<[unknown[], number]>(
    'UPDATE "recovery_code" SET "used_at" = $3 WHERE "account_id" = $1 AND "code_hash" = $2 AND "used_at" IS NULL',
    [accountId, hashToken(plainRecoveryCode(code)), ctx.now],
  );
  return used === 1;
}

/** Makes a secret that is not in force until a code of it is given. */
export async function beginSecondFactor(ctx: RequestContext): Promise<RouteOutput<typeof contracts.beginSecondFactor>> {
  const secret = newTotpSecret();
  const [, made] = await ctx.manager.query<[unknown[], number]>(
    `UPDATE "account" SET "totp_secret" = $2, "totp_last_step" = NULL
      WHERE "id" = $1 AND "totp_confirmed_at" IS NULL`,
    [ctx.actor.accountId, sealField(ctx.services.env.FIELD_KEY, secret)],
  );
  if (made !== 1) throw new NotInThisState('A second factor is in force. Take it off first to set up another.');
  const uri = totpUri(secret, ctx.person.email);
  return { secret, uri, qrSvg: await qrCode(uri, { type: 'svg', margin: 2 }) };
}

export async function confirmSecondFactor(
  ctx: RequestContext,
  { body }: ParsedInput<typeof contracts.confirmSecondFactor>,
): Promise<RouteOutput<typeof contracts.confirmSecondFactor>> {
  const { accountId } = ctx.actor;
  await ctx.services.limits.take('second-factor', accountId);
  const recoveryCodes = await inTransaction(ctx, async ({ manager }) => {
    // The row stays locked, so that the secret put in force is the one whose code was given.
    const factor = await loadFactor(manager, accountId, true);
    if (!factor?.totp_secret || factor.totp_confirmed_at)
      throw new NotInThisState('There is no second factor waiting to be confirmed.');
    if (!(await takeSecondFactor({ ...ctx, manager }, accountId, body.code)))
      throw new AppError(
        'credentials-refused',
        'This code is not right. Check the clock of your device and try the next one.',
      );
    await manager.query('UPDATE "account" SET "totp_confirmed_at" = $2 WHERE "id" = $1', [accountId, ctx.now]);
    await manager.delete(RecoveryCode, { accountId });
    const codes = Array.from({ length: RECOVERY_CODES }, newRecoveryCode);
    await manager.insert(
      RecoveryCode,
      codes.map((code) => ({ accountId, codeHash: hashToken(plainRecoveryCode(code)) })),
    );
    return codes;
  });
  await ctx.services.limits.forget('second-factor', accountId);
  return { recoveryCodes };
}

export async function removeSecondFactor(
  ctx: RequestContext,
  { body }: ParsedInput<typeof contracts.removeSecondFactor>,
): Promise<void> {
  const { accountId } = ctx.actor;
  await ctx.services.limits.take('second-factor', accountId);
  const facts = await loadSignInFacts(ctx.manager, { id: accountId });
  if (!facts?.secondFactor) throw new NotInThisState('There is no second factor in force.');
  const right = await verifyPassword(facts.passwordHash, body.password);
  await inTransaction(ctx, async ({ manager }) => {
    if (!right || !(await takeSecondFactor({ ...ctx, manager }, accountId, body.code)))
      throw new AppError('credentials-refused', 'Password or code is not right. The second factor stays in force.');
    await manager.query(
      `UPDATE "account" SET "totp_secret" = NULL, "totp_confirmed_at" = NULL, "totp_last_step" = NULL
        WHERE "id" = $1`,
      [accountId],
    );
    await manager.delete(RecoveryCode, { accountId });
  });
  await ctx.services.limits.forget('second-factor', accountId);
}
