import type { acceptInvitation as contract } from '../../../shared/contracts/accounts.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { Account } from '../../entities/account.ts';
import type { Invitation } from '../../entities/invitation.ts';
import { AppError, InputInvalid, NotPermitted } from '../../errors.ts';
import type { OpenContext } from '../../http/context.ts';
import { hashPassword } from '../../security/passwords.ts';
import { guardPassword } from '../accounts/passwords.ts';

type NewAccount = ParsedInput<typeof contract>['body']['newAccount'];

/** Who takes an invitation: the account that is signed in, or one that is still to be made. */
export type Taker =
  { account: Account } | { toMake: Pick<Account, 'email' | 'displayName' | 'passwordHash'> & { timeZone?: string } };

/**
 * The link proves the invited address, so a new account is made for that address and no other. The password is hashed
 * here, before any transaction: a hash takes long, and neither a connection nor a lock is to be held for it.
 */
export async function takerOf(ctx: OpenContext, invitation: Invitation, newAccount: NewAccount): Promise<Taker> {
  if (ctx.sessionAccountId) {
    const account = await ctx.manager.findOneBy(Account, { id: ctx.sessionAccountId });
    if (!account) throw new AppError('not-signed-in');
    if (account.email !== invitation.email)
      throw new NotPermitted(
        `This invitation is for ${invitation.email}. You are signed in as ${account.email}; sign out and open the link again.`,
      );
    return { account };
  }
  if ((await ctx.manager.countBy(Account, { email: invitation.email })) > 0)
    throw new AppError(
      'not-signed-in',
      `There is an account for ${invitation.email}. Sign in and open the link again; it is still good.`,
    );
  if (!newAccount)
    throw new InputInvalid([{ pointer: '/body/newAccount/displayName', message: 'Give your name and a password' }]);
  const { displayName, password, timeZone } = newAccount;
  guardPassword(password, { email: invitation.email, displayName }, '/body/newAccount/password');
  return {
    toMake: {
      email: invitation.email,
      displayName,
      passwordHash: await hashPassword(password),
      ...(timeZone ? { timeZone } : {}),
    },
  };
}
