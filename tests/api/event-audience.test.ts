import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { abilityFor, mayDo } from '../../shared/abilities/ability.ts';
import { AUDIENCES, GUEST_SIGHTS, type GuestSight } from '../../shared/contracts/vocabulary.ts';
import { Party } from '../../server/entities/party.ts';
import { Thread } from '../../server/entities/thread.ts';
import { keysOf } from '../../server/outbox/audience.ts';
import { loadActor } from '../../server/policies/load-actor.ts';
import { makeAccount } from '../factories/account.ts';
import { makeMember } from '../factories/shop.ts';
import { makeCommissionKit } from '../support/commission-kit.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.close());

it('the keys that hear of a thread are those of the people who may read it, for every audience', async () => {
  const { manager } = app.services.db;
  const kit = await makeCommissionKit(app);
  const { commissionId } = kit;
  const guests = await Promise.all(
    ([['standing'], ['standing', 'threads'], [...GUEST_SIGHTS]] as GuestSight[][]).map(async (guestSees) => {
      const person = await makeAccount(app);
      const id = randomUUID();
      await manager.insert(Party, { id, commissionId, accountId: person.id, roles: ['guest'], guestSees });
      return { partyId: id, key: person.id, accountId: person.id };
    }),
  );
  const past = await makeAccount(app);
  await manager.insert(Party, {
    commissionId,
    accountId: past.id,
    roles: ['guest'],
    guestSees: [...GUEST_SIGHTS],
    seesUntil: '2020-01-01',
  });
  const shopOf = (side: (typeof kit)['lead']) => ({
    partyId: side.partyId,
    key: side.shopId ?? side.person.id,
    accountId: side.person.id,
  });
  const sides = [shopOf(kit.lead), shopOf(kit.maker), shopOf(kit.finisher), shopOf(kit.client), ...guests];
  const everyone = [...sides, { partyId: '', key: past.id, accountId: past.id }];
  for (const audience of AUDIENCES)
    for (const named of [[kit.maker.partyId], [kit.finisher.partyId, kit.client.partyId], [guests[2]?.partyId ?? '']]) {
      const threadId = randomUUID();
      await manager.insert(Thread, {
        id: threadId,
        commissionId,
        subject: 'commission',
        subjectId: commissionId,
        title: audience,
        audience,
        partyIds: audience === 'named' || audience === 'own-shop' ? named : [],
        openedByPartyId: kit.lead.partyId,
      });
      const thread = await manager.findOneByOrFail(Thread, { id: threadId });
      const readers = new Set<string>();
      for (const { key, accountId } of everyone) {
        const known = await loadActor(app.services.db, accountId, { commissionId });
        if (known && mayDo(abilityFor(known.actor), 'read', 'Thread', thread)) readers.add(key);
      }
      const heard = new Set(await keysOf(manager, { to: 'thread', threadId }));
      expect([...heard].sort(), `${audience} ${named.join()}`).toEqual([...readers].sort());
    }
});

it('a bookkeeper of a shop is no reader, though the shop hears', async () => {
  const kit = await makeCommissionKit(app);
  const keeper = await makeMember(app, { id: kit.maker.shopId ?? '' }, 'bookkeeper');
  const known = await loadActor(app.services.db, keeper.id, { commissionId: kit.commissionId });
  const thread = { commissionId: kit.commissionId, audience: 'everyone' as const, partyIds: [] };
  expect(known && mayDo(abilityFor(known.actor), 'read', 'Thread', thread)).toBe(false);
});
