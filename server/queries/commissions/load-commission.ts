import type { EntityManager } from 'typeorm';
import type { AppAbility } from '../../../shared/abilities/ability.ts';
import { Commission } from '../../entities/commission.ts';
import { authorize } from '../../policies/authorize.ts';

/** The commission, when the reader has a part in it. */
export async function loadCommission(
  manager: EntityManager,
  ability: AppAbility,
  commissionId: string,
): Promise<Commission> {
  const row = await manager.findOneBy(Commission, { id: commissionId });
  authorize(ability, 'read', 'Commission', row);
  return row;
}
