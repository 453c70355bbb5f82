import { randomInt } from 'node:crypto';
import { mayDo } from '../../../shared/abilities/ability.ts';
import type { createCommission as contract } from '../../../shared/contracts/commissions.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { encodeCode } from '../../../shared/engines/codes/crockford.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Commission } from '../../entities/commission.ts';
import { Party } from '../../entities/party.ts';
import { NotPermitted } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { refreshCommissionNames } from './refresh-members.ts';

/** 35 random bits, so that a code says nothing of how many commissions there are. */
const newCode = (): string => encodeCode(BigInt(randomInt(2 ** 17)) * 2n ** 18n + BigInt(randomInt(2 ** 18)));

export const createCommission = (ctx: RequestContext, { body }: ParsedInput<typeof contract>): Promise<Commission> =>
  inTransaction(ctx, async (uow) => {
    const { leadShopId, alsoRoles, ...fields } = body;
    if (!mayDo(ctx.ability, 'create', 'NewCommission', { leadShopId }))
      throw new NotPermitted('Only an owner or hand of the shop can open a commission in its name.');
    const row = await uow.manager.save(
      uow.manager.create(Commission, { ...fields, code: newCode(), updatedAt: ctx.now }),
    );
    await uow.manager.insert(Party, { commissionId: row.id, shopId: leadShopId, roles: ['lead', ...alsoRoles] });
    await refreshCommissionNames(uow.manager, row.id);
    uow.record({
      commissionId: row.id,
      accountId: ctx.actor.accountId,
      subject: 'commission',
      subjectId: row.id,
      words: `Opened the commission ${row.title}`,
    });
    uow.announce('membership.changed', { commissionId: row.id }, { to: 'keys', keys: [leadShopId] });
    uow.announce('commission.changed', { commissionId: row.id }, { to: 'everyone', commissionId: row.id });
    return uow.manager.findOneByOrFail(Commission, { id: row.id });
  });
