import type { EntityManager } from 'typeorm';
import type { AppAbility } from '../../../shared/abilities/ability.ts';
import { Thread } from '../../entities/thread.ts';
import { authorize } from '../../policies/authorize.ts';

/** The thread, when the reader may read it. */
export async function loadThread(
  manager: EntityManager,
  ability: AppAbility,
  commissionId: string,
  threadId: string,
): Promise<Thread> {
  const row = await manager.findOneBy(Thread, { id: threadId, commissionId });
  authorize(ability, 'read', 'Thread', row);
  return row;
}
