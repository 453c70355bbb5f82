import type { AppAbility } from '../../shared/abilities/ability.ts';
import { COMMISSION_FIELDS } from '../../shared/abilities/ability.ts';
import type { Actor } from '../../shared/abilities/actor.ts';
import type { CommissionView } from '../../shared/contracts/commissions.ts';
import { showCode } from '../../shared/engines/codes/crockford.ts';
import type { Commission } from '../entities/commission.ts';
import { fieldsFor, pickFields } from './pick-fields.ts';

const FIELDS = Object.values(COMMISSION_FIELDS).flat();

export function presentCommission(ability: AppAbility, actor: Actor, row: Commission): CommissionView {
  const full: CommissionView = {
    id: row.id,
    code: showCode(row.code),
    title: row.title,
    state: row.state,
    leadName: row.leadName,
    clientName: row.clientName,
    dateWanted: row.dateWanted,
    coverFileId: row.coverFileId,
    revision: row.revision,
    createdAt: row.createdAt.toISOString(),
    updatedAt: row.updatedAt.toISOString(),
    brief: row.brief,
    budgetMinor: row.budgetMinor,
    currency: row.currency,
    memberships: actor.memberships
      .filter((membership) => membership.commissionId === row.id)
      .map((membership) => ({ ...membership, roles: [...membership.roles], guestSees: [...membership.guestSees] })),
  };
  return pickFields(full, fieldsFor(ability, 'read', 'Commission', row, FIELDS));
}
