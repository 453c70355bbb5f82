import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { getCommission, removeParty } from '../../shared/contracts/commissions.ts';
import * as contracts from '../../shared/contracts/handoffs.ts';
import type { HandoffView } from '../../shared/contracts/handoffs.ts';
import * as legs from '../../shared/contracts/parts-and-legs.ts';
import { getStanding, listMoved } from '../../shared/contracts/standing.ts';
import { addDays, isWorkingDay } from '../../shared/units/calendar-day.ts';
import { ShopMember } from '../../server/entities/shop-member.ts';
import { makeMember } from '../factories/shop.ts';
import { signedInAs } from '../factories/account.ts';
import { makeCommissionKit, type CommissionKit } from '../support/commission-kit.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.close());

let kit: CommissionKit;
let params: { commissionId: string };
let partId: string;
let handoff: HandoffView;

beforeEach(async () => {
  kit = await makeCommissionKit(app);
  params = { commissionId: kit.commissionId };
  partId = (
    await kit.lead.client.call(legs.createPart, {
      params,
      body: { name: 'Hilt', kind: 'hilt', holderPartyId: kit.maker.partyId },
    })
  ).id;
  const days = { hopefulDays: 2, likelyDays: 3, badDays: 6, plannedStartOn: null };
  const turning = await kit.lead.client.call(legs.createLeg, {
    params,
    body: { partyId: kit.maker.partyId, partId, kind: 'machining', title: 'Turn', ...days, afterLegIds: [] },
  });
  const wiring = await kit.lead.client.call(legs.createLeg, {
    params,
    body: { partyId: kit.lead.partyId, partId, kind: 'wiring', title: 'Wire', ...days, afterLegIds: [turning.id] },
  });
  handoff = await kit.lead.client.call(contracts.createHandoff, {
    params,
    body: {
      fromPartyId: kit.maker.partyId,
      toPartyId: kit.lead.partyId,
      partIds: [partId],
      fromLegId: turning.id,
      toLegId: wiring.id,
      transitDays: 1,
      carriage: '',
    },
  });
});

const inDays = (count: number): string => {
  let day = addDays(new Date().toISOString().slice(0, 10), count);
  while (!isWorkingDay(day)) day = addDays(day, 1);
  return day;
};
const path = () => ({ ...params, handoffId: handoff.id });
const offer = (who: 'lead' | 'maker', onDay: string, revision = handoff.revision) =>
  kit[who].client.call(contracts.offerHandoffDay, { params: path(), body: { revision, onDay, words: '' } });
const standing = (view: HandoffView) => view.offers?.find((one) => one.state === 'standing');

describe("a handoff's day", () => {
  it('is offered, countered, and agreed by both; only then does anyone else see it', async () => {
    const first = await offer('maker', inDays(20));
    expect((await kit.finisher.client.call(contracts.getHandoff, { params: path() })).offers).toBeUndefined();
    const countered = await offer('lead', inDays(25), first.revision);
    expect(countered.offers?.map((one) => one.state)).toEqual(['standing', 'countered']);
    const offerId = standing(countered)?.id ?? '';
    expect(
      (
        await kit.lead.client.refused(contracts.acceptHandoffDay, {
          params: { ...path(), offerId },
          body: { revision: countered.revision },
        })
      ).code,
    ).toBe('not-in-this-state');
    const told = async () => (await kit.client.client.call(getStanding, { params })).facts.handoffs[0]?.agreedOn;
    expect(await told()).toBeNull();
    const agreed = await kit.maker.client.call(contracts.acceptHandoffDay, {
      params: { ...path(), offerId },
      body: { revision: countered.revision },
    });
    expect(agreed.agreedOn).toBe(inDays(25));
    expect(await told()).toBe(inDays(25));
  });

  it('that is agreed stays in force until a new one is', async () => {
    const first = await offer('maker', inDays(20));
    const agreed = await kit.lead.client.call(contracts.acceptHandoffDay, {
      params: { ...path(), offerId: standing(first)?.id ?? '' },
      body: { revision: first.revision },
    });
    const moved = await offer('maker', inDays(30), agreed.revision);
    expect(moved.agreedOn).toBe(inDays(20));
    const declined = await kit.lead.client.call(contracts.declineHandoffDay, {
      params: { ...path(), offerId: standing(moved)?.id ?? '' },
      body: { revision: moved.revision, reason: 'The bench is full' },
    });
    expect(declined).toMatchObject({ agreedOn: inDays(20) });
    expect(declined.offers?.[0]).toMatchObject({ state: 'declined', reason: 'The bench is full' });
  });

  it("says what it does to the client's date before anyone agrees", async () => {
    const effect = (onDay: string) =>
      kit.maker.client.call(contracts.previewHandoffDay, { params: path(), query: { onDay } });
    expect((await effect(inDays(1))).words).toMatch(/^Keeps the client's date: likely /);
    const late = await effect(inDays(60));
    expect(late.movedDays).toBeGreaterThan(20);
    expect(late.words).toMatch(/^Moves the client's date by \d+ days later: likely .*, was /);
  });

  it('answered by two people of one shop at the same moment gets one outcome, and the other a clear word', async () => {
    const second = await makeMember(app, { id: kit.lead.shopId ?? '' }, 'hand');
    const colleague = await signedInAs(app, second);
    const offered = await offer('maker', inDays(20));
    const target = { ...path(), offerId: standing(offered)?.id ?? '' };
    const outcomes = await Promise.all([
      kit.lead.client.try(contracts.acceptHandoffDay, { params: target, body: { revision: offered.revision } }),
      colleague.try(contracts.declineHandoffDay, {
        params: target,
        body: { revision: offered.revision, reason: 'Not on my watch' },
      }),
    ]);
    expect(outcomes.filter((outcome) => outcome.ok)).toHaveLength(1);
    const [refused] = outcomes.filter((outcome) => !outcome.ok);
    expect(refused && !refused.ok ? refused.problem.code : '').toBe('stale-revision');
    const after = await kit.lead.client.call(contracts.getHandoff, { params: path() });
    expect(after.offers?.filter((one) => one.state === 'accepted' || one.state === 'declined')).toHaveLength(1);
    expect(after.revision).toBe(offered.revision + 1);
  });

  it('offered by both sides at the same moment leaves one standing', async () => {
    const outcomes = await Promise.all(
      (['lead', 'maker'] as const).map((who) =>
        kit[who].client.try(contracts.offerHandoffDay, {
          params: path(),
          body: { revision: handoff.revision, onDay: inDays(20), words: '' },
        }),
      ),
    );
    expect(outcomes.filter((outcome) => outcome.ok)).toHaveLength(1);
    const after = await kit.lead.client.call(contracts.getHandoff, { params: path() });
    expect(after.offers?.filter((one) => one.state === 'standing')).toHaveLength(1);
  });
});

it('receiving moves the parts to the receiver, once', async () => {
  const today = new Date().toISOString().slice(0, 10);
  const done = await kit.lead.client.call(contracts.completeHandoff, {
    params: path(),
    body: { revision: handoff.revision, onDay: today, words: '' },
  });
  expect(done.doneOn).toBe(today);
  const [part] = await kit.lead.client.call(legs.listParts, { params });
  expect(part).toMatchObject({ holderPartyId: kit.lead.partyId, holderSince: today });
  expect(
    (
      await kit.lead.client.refused(contracts.completeHandoff, {
        params: path(),
        body: { revision: done.revision, onDay: today, words: '' },
      })
    ).code,
  ).toBe('not-in-this-state');
});

describe('a handoff that will not come about', () => {
  it('is dropped by the lead with a reason, leaves every list and the client’s dates, and stays on record', async () => {
    const offered = await offer('maker', inDays(5));
    const agreed = await kit.lead.client.call(contracts.acceptHandoffDay, {
      params: { ...path(), offerId: standing(offered)?.id ?? '' },
      body: { revision: offered.revision },
    });
    const drop = { params: path(), body: { revision: agreed.revision, words: 'It is carried over by hand' } };
    expect((await kit.maker.client.refused(contracts.dropHandoff, drop)).code).toBe('not-permitted');
    await kit.lead.client.call(contracts.dropHandoff, drop);
    expect(await kit.maker.client.call(contracts.listHandoffs, { params })).toEqual([]);
    expect((await kit.maker.client.refused(contracts.getHandoff, { params: path() })).code).toBe('not-found');
    const told = await kit.client.client.call(getStanding, { params });
    expect(told.facts.handoffs).toEqual([]);
    const history = await kit.maker.client.call(listMoved, { params });
    expect(history.items[0]?.words).toContain('It is carried over by hand');
  });

  it('holds its sides in the commission until it is dropped', async () => {
    const leave = { params: { ...params, partyId: kit.finisher.partyId } };
    const coating = await kit.lead.client.call(contracts.createHandoff, {
      params,
      body: {
        fromPartyId: kit.maker.partyId,
        toPartyId: kit.finisher.partyId,
        partIds: [partId],
        fromLegId: null,
        toLegId: null,
        transitDays: 1,
        carriage: '',
      },
    });
    expect((await kit.lead.client.refused(removeParty, leave)).code).toBe('not-in-this-state');
    await kit.lead.client.call(contracts.dropHandoff, {
      params: { ...params, handoffId: coating.id },
      body: { revision: coating.revision, words: 'No coating after all' },
    });
    await kit.lead.client.call(removeParty, leave);
  });
});

it('the books of the other side give no say in its days', async () => {
  await app.services.db.manager.insert(ShopMember, {
    shopId: kit.lead.shopId ?? '',
    accountId: kit.maker.person.id,
    role: 'bookkeeper',
  });
  const offered = await offer('maker', inDays(5));
  const refused = await kit.maker.client.refused(contracts.acceptHandoffDay, {
    params: { ...path(), offerId: standing(offered)?.id ?? '' },
    body: { revision: offered.revision },
  });
  expect(refused.code).toBe('not-in-this-state');
});

it('the piece is delivered once the client has every part of it', async () => {
  const blade = await kit.lead.client.call(legs.createPart, {
    params,
    body: { name: 'Blade', kind: 'blade', holderPartyId: kit.maker.partyId },
  });
  const receive = async (partIds: string[]): Promise<string> => {
    const made = await kit.maker.client.call(contracts.createHandoff, {
      params,
      body: {
        fromPartyId: kit.maker.partyId,
        toPartyId: kit.client.partyId,
        partIds,
        fromLegId: null,
        toLegId: null,
        transitDays: 1,
        carriage: '',
      },
    });
    await kit.client.client.call(contracts.completeHandoff, {
      params: { ...params, handoffId: made.id },
      body: { revision: made.revision, onDay: '2026-01-05', words: '' },
    });
    return (await kit.lead.client.call(getCommission, { params })).state;
  };
  expect(await receive([blade.id])).not.toBe('delivered');
  expect(await receive([partId])).toBe('delivered');
});
