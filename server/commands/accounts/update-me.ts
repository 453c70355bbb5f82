import type { updateMe as contract } from '../../../shared/contracts/accounts.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Account } from '../../entities/account.ts';
import type { RequestContext } from '../../http/context.ts';
import { refreshCommissionNames } from '../commissions/refresh-members.ts';
import { given } from '../revision.ts';

export const updateMe = (ctx: RequestContext, { body }: ParsedInput<typeof contract>): Promise<void> =>
  inTransaction(ctx, async (uow) => {
    const changes = given(body);
    if (Object.keys(changes).length === 0) return;
    const { accountId } = ctx.actor;
    await uow.manager.update(Account, { id: accountId }, changes);
    if (!changes.displayName) return;
    const asClient = await uow.manager.query<{ commission_id: string }[]>(
      `SELECT "commission_id" FROM "party" WHERE "account_id" = $1 AND "left_at" IS NULL AND 'client' = ANY("roles")
        ORDER BY "commission_id"`,
      [accountId],
    );
    for (const { commission_id: commissionId } of asClient) {
      await refreshCommissionNames(uow.manager, commissionId);
      uow.announce('parties.changed', { commissionId }, { to: 'everyone', commissionId });
    }
  });
