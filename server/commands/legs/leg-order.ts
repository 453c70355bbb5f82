import type { EntityManager } from 'typeorm';
import { LegOrder } from '../../entities/leg-order.ts';
import { InputInvalid } from '../../errors.ts';
import type { LegRecord } from '../../queries/legs/load-legs.ts';
import { findLoop } from '../../../shared/engines/schedule/find-loop.ts';

/** Sets what a leg waits for. Legs of another commission are refused, and so is a loop, with its path by the legs' titles. */
export async function setLegOrder(
  manager: EntityManager,
  legs: readonly LegRecord[],
  leg: { id: string; title: string },
  afterLegIds: readonly string[],
): Promise<void> {
  const pointer = '/body/afterLegIds';
  const titles = new Map([...legs.map((one) => [one.id, one.title] as const), [leg.id, leg.title] as const]);
  const unknown = afterLegIds.filter((id) => !titles.has(id));
  if (unknown.length > 0) throw new InputInvalid([{ pointer, message: 'One of these legs is not in this commission' }]);
  const waits = new Map(legs.map((one) => [one.id, one.afterLegIds]));
  waits.set(leg.id, [...afterLegIds]);
  const loop = findLoop(waits);
  if (loop)
    throw new InputInvalid([
      {
        pointer,
        message: `These legs would wait for each other in a circle: ${loop.map((id) => titles.get(id)).join(' → ')}`,
      },
    ]);
  await manager.delete(LegOrder, { legId: leg.id });
  if (afterLegIds.length > 0)
    await manager.insert(
      LegOrder,
      [...new Set(afterLegIds)].map((afterLegId) => ({ legId: leg.id, afterLegId })),
    );
}
