import type { DataSource } from 'typeorm';
import { abilityFor, mayDo } from '../../shared/abilities/ability.ts';
import { Thread } from '../entities/thread.ts';
import { loadActor } from '../policies/load-actor.ts';

/** The keys under which a person hears events: the account, and each shop where they work; bookkeepers hear money only. */
const keysFor = (actor: { accountId: string; shops: readonly { shopId: string; role: string }[] }): string[] => [
  actor.accountId,
  ...actor.shops.filter((shop) => shop.role !== 'bookkeeper').map((shop) => shop.shopId),
];

export async function personOf(
  db: DataSource,
  accountId: string,
): Promise<{ accountId: string; displayName: string; rooms: string[] } | null> {
  const known = await loadActor(db, accountId, {});
  return known && { accountId, displayName: known.person.displayName, rooms: keysFor(known.actor) };
}

export async function roomsOf(db: DataSource, accountId: string): Promise<string[]> {
  const known = await loadActor(db, accountId, {});
  return known ? keysFor(known.actor) : [];
}

/** The same ability as the API asks: may this account read this thread just now? */
export async function mayReadThread(
  db: DataSource,
  accountId: string,
  commissionId: string | null,
  threadId: string,
): Promise<boolean> {
  const thread = await db.manager.findOneBy(Thread, { id: threadId, ...(commissionId ? { commissionId } : {}) });
  if (!thread) return false;
  const known = await loadActor(db, accountId, { commissionId: thread.commissionId });
  return known !== null && mayDo(abilityFor(known.actor), 'read', 'Thread', thread);
}
