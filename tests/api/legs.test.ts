import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import * as contracts from '../../shared/contracts/parts-and-legs.ts';
import type { LegView } from '../../shared/contracts/parts-and-legs.ts';
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

beforeEach(async () => {
  kit = await makeCommissionKit(app);
  params = { commissionId: kit.commissionId };
  const part = await kit.lead.client.call(contracts.createPart, {
    params,
    body: { name: 'Hilt', kind: 'hilt', holderPartyId: kit.maker.partyId },
  });
  partId = part.id;
});

const fields = (title: string, changes = {}) => ({
  partyId: kit.maker.partyId,
  partId,
  kind: 'machining' as const,
  title,
  hopefulDays: 1,
  likelyDays: 2,
  badDays: 3,
  plannedStartOn: null,
  afterLegIds: [],
  ...changes,
});
const make = (title: string, changes = {}): Promise<LegView> =>
  kit.lead.client.call(contracts.createLeg, { params, body: fields(title, changes) });
const move = (leg: { id: string }, revision: number, state: LegView['state'], onDay = '2026-03-02', early = false) =>
  kit.maker.client.try(contracts.moveLeg, {
    params: { ...params, legId: leg.id },
    body: { revision, state, onDay, early },
  });
const stored = async (id: string): Promise<LegView | undefined> =>
  (await kit.maker.client.call(contracts.listLegs, { params })).find((leg) => leg.id === id);

describe('a leg', () => {
  it('is added by the lead with everything the plan needs', async () => {
    const first = await make('Turn');
    const second = await make('Hollow', { afterLegIds: [first.id], plannedStartOn: '2026-04-01' });
    expect(second).toMatchObject({
      partyId: kit.maker.partyId,
      partId,
      title: 'Hollow',
      state: 'planned',
      afterLegIds: [first.id],
      plannedStartOn: '2026-04-01',
      position: 1,
      revision: 1,
      held: null,
    });
  });

  it.each([
    ['an empty title', { title: ' ' }, '/body/title'],
    ['days in no order', { likelyDays: 5, badDays: 4 }, '/body/likelyDays'],
    ['negative days', { hopefulDays: -1 }, '/body/hopefulDays'],
    ['a kind that is none', { kind: 'magic' }, '/body/kind'],
    ['a day that is none', { plannedStartOn: '2026-02-30' }, '/body/plannedStartOn'],
    ['a shop that takes no part', { partyId: randomUUID() }, '/body/partyId'],
    ['a part that is not there', { partId: randomUUID() }, '/body/partId'],
    ['a leg to wait for that is not there', { afterLegIds: [randomUUID()] }, '/body/afterLegIds'],
  ])('is refused with %s, at its field, and nothing is stored', async (_case, changes, pointer) => {
    const refusal = await kit.lead.client.refused(contracts.createLeg, {
      params,
      body: fields('Turn', changes),
    });
    expect(refusal).toMatchObject({ status: 422, code: 'input-invalid' });
    expect(refusal.errors?.map((error) => error.pointer)).toEqual([pointer]);
    expect(await kit.lead.client.call(contracts.listLegs, { params })).toEqual([]);
  });

  it("takes no part, party or leg of another commission, though the lead's shop may be in both", async () => {
    const other = await makeCommissionKit(app);
    const theirs = { commissionId: other.commissionId };
    const part = await other.lead.client.call(contracts.createPart, {
      params: theirs,
      body: { name: 'Blade', kind: 'blade', holderPartyId: other.maker.partyId },
    });
    const leg = await other.lead.client.call(contracts.createLeg, {
      params: theirs,
      body: { ...fields('Grind'), partyId: other.maker.partyId, partId: part.id },
    });
    for (const [changes, pointer] of [
      [{ partId: part.id }, '/body/partId'],
      [{ partyId: other.maker.partyId }, '/body/partyId'],
      [{ afterLegIds: [leg.id] }, '/body/afterLegIds'],
    ] as const) {
      const refusal = await kit.lead.client.refused(contracts.createLeg, { params, body: fields('Turn', changes) });
      expect(refusal.errors?.map((error) => error.pointer)).toEqual([pointer]);
    }
    // The right id under the wrong commission is nothing, for the one who may see that commission and for its owner alike.
    for (const client of [kit.lead.client, other.lead.client])
      expect(
        (
          await client.refused(contracts.updateLeg, {
            params: { ...params, legId: leg.id },
            body: { revision: 1, title: 'Mine now' },
          })
        ).code,
      ).toBe('not-found');
  });

  it('saved from an older state is told of the newer one, and neither is lost', async () => {
    const leg = await make('Turn');
    const path = { ...params, legId: leg.id };
    await kit.maker.client.call(contracts.updateLeg, { params: path, body: { revision: 1, likelyDays: 2.5 } });
    const refusal = await kit.lead.client.refused(contracts.updateLeg, {
      params: path,
      body: { revision: 1, title: 'Turn and hollow' },
    });
    expect(refusal.code).toBe('stale-revision');
    expect(contracts.legView.parse(refusal.current)).toMatchObject({ revision: 2, likelyDays: 2.5, title: 'Turn' });
    expect(await stored(leg.id)).toMatchObject({ revision: 2, likelyDays: 2.5, title: 'Turn' });
  });

  it("of two saves at the same moment takes one, and shows the other's writer what stands", async () => {
    const leg = await make('Turn');
    const outcomes = await Promise.all(
      ['Turn once', 'Turn twice'].map((title) =>
        kit.lead.client.try(contracts.updateLeg, {
          params: { ...params, legId: leg.id },
          body: { revision: 1, title },
        }),
      ),
    );
    expect(outcomes.map((outcome) => outcome.status).sort()).toEqual([200, 409]);
    const won = outcomes.find((outcome) => outcome.ok);
    expect((await stored(leg.id))?.title).toBe(won?.ok ? won.body.title : 'nobody');
  });

  it("keeps a shop's hands off the lead's fields: the whole save is refused and named", async () => {
    const leg = await make('Turn');
    const refusal = await kit.maker.client.refused(contracts.updateLeg, {
      params: { ...params, legId: leg.id },
      body: { revision: 1, likelyDays: 2.5, title: 'Ours' },
    });
    expect(refusal).toMatchObject({ code: 'not-permitted', detail: expect.stringContaining('title') as string });
    expect(await stored(leg.id)).toMatchObject({ likelyDays: 2, title: 'Turn', revision: 1 });
  });

  it('that would wait for itself is refused with the way round', async () => {
    const leg = await make('Turn');
    const refusal = await kit.lead.client.refused(contracts.updateLeg, {
      params: { ...params, legId: leg.id },
      body: { revision: 1, afterLegIds: [leg.id] },
    });
    expect(refusal.errors).toEqual([
      {
        pointer: '/body/afterLegIds',
        message: 'These legs would wait for each other in a circle: Turn → Turn',
      },
    ]);
  });

  it('two orders that make a circle only together are not both taken, though saved at the same moment', async () => {
    const [one, two] = [await make('One'), await make('Two')];
    const wait = (leg: LegView, after: LegView) =>
      kit.lead.client.try(contracts.updateLeg, {
        params: { ...params, legId: leg.id },
        body: { revision: 1, afterLegIds: [after.id] },
      });
    const outcomes = await Promise.all([wait(one, two), wait(two, one)]);
    expect(outcomes.map((outcome) => outcome.status).sort()).toEqual([200, 422]);
  });
});

describe('progress of a leg', () => {
  it('goes from planned to finished with its days, and back again when it was said too soon', async () => {
    const leg = await make('Turn');
    const started = await move(leg, 1, 'under-way', '2026-03-02');
    expect(started.ok && started.body).toMatchObject({ state: 'under-way', startedOn: '2026-03-02', revision: 2 });
    const finished = await move(leg, 2, 'finished', '2026-03-05');
    expect(finished.ok && finished.body).toMatchObject({ startedOn: '2026-03-02', finishedOn: '2026-03-05' });
    const reopened = await move(leg, 3, 'under-way', '2026-03-09');
    expect(reopened.ok && reopened.body).toMatchObject({
      state: 'under-way',
      startedOn: '2026-03-02',
      finishedOn: null,
    });
  });

  it('is not finished before it was started', async () => {
    const leg = await make('Turn');
    await move(leg, 1, 'under-way', '2026-03-02');
    const early = await move(leg, 2, 'finished', '2026-03-01');
    expect(early.ok ? [] : early.problem.errors?.map((error) => error.pointer)).toEqual(['/body/onDay']);
    expect(await stored(leg.id)).toMatchObject({ state: 'under-way', finishedOn: null, revision: 2 });
  });

  it('waits for the legs before it, unless the shop says that it starts early', async () => {
    const first = await make('Turn');
    const second = await make('Hollow', { afterLegIds: [first.id] });
    const refused = await move(second, 1, 'under-way');
    expect(refused.ok ? '' : [refused.problem.code, refused.problem.detail]).toEqual([
      'not-in-this-state',
      expect.stringContaining('Turn'),
    ]);
    expect(await stored(second.id)).toMatchObject({ state: 'planned', startedOn: null, revision: 1 });
    expect((await move(second, 1, 'under-way', '2026-03-02', true)).ok).toBe(true);
  });

  it('from an older state is told of the newer one', async () => {
    const leg = await make('Turn');
    await move(leg, 1, 'under-way', '2026-03-02');
    const stale = await move(leg, 1, 'under-way', '2026-03-03');
    expect(stale.ok ? '' : stale.problem.code).toBe('stale-revision');
    expect(await stored(leg.id)).toMatchObject({ startedOn: '2026-03-02', revision: 2 });
  });

  it("belongs to the leg's shop; dropping it belongs to the lead", async () => {
    const leg = await make('Turn');
    const body = { revision: 1, onDay: '2026-03-02' };
    const path = { ...params, legId: leg.id };
    expect((await move(leg, 1, 'dropped')).status).toBe(403);
    expect(
      (
        await kit.lead.client.refused(contracts.moveLeg, {
          params: path,
          body: { ...body, state: 'under-way' },
        })
      ).code,
    ).toBe('not-permitted');
    const dropped = await kit.lead.client.call(contracts.moveLeg, {
      params: path,
      body: { ...body, state: 'dropped' },
    });
    expect(dropped.state).toBe('dropped');
  });
});

describe('a part', () => {
  it('that is put with another holder by correction counts from today', async () => {
    app.setNow(new Date('2027-06-10T10:00:00Z'));
    try {
      const moved = await kit.lead.client.call(contracts.updatePart, {
        params: { ...params, partId },
        body: { revision: 1, holderPartyId: kit.finisher.partyId },
      });
      expect(moved).toMatchObject({
        holderPartyId: kit.finisher.partyId,
        holderSince: '2027-06-10',
        revision: 2,
        name: 'Hilt',
      });
    } finally {
      app.setNow(new Date());
    }
  });

  it('always has a holder who takes part', async () => {
    for (const holderPartyId of [randomUUID(), (await makeCommissionKit(app)).maker.partyId]) {
      const refusal = await kit.lead.client.refused(contracts.updatePart, {
        params: { ...params, partId },
        body: { revision: 1, holderPartyId },
      });
      expect(refusal.errors?.map((error) => error.pointer)).toEqual(['/body/holderPartyId']);
    }
    const [part] = await kit.lead.client.call(contracts.listParts, { params });
    expect(part).toMatchObject({ holderPartyId: kit.maker.partyId, revision: 1 });
  });

  it('saved from an older state is told of the newer one', async () => {
    const path = { ...params, partId };
    await kit.lead.client.call(contracts.updatePart, { params: path, body: { revision: 1, name: 'Grip' } });
    const refusal = await kit.lead.client.refused(contracts.updatePart, {
      params: path,
      body: { revision: 1, name: 'Handle' },
    });
    expect(contracts.partView.parse(refusal.current)).toMatchObject({ name: 'Grip', revision: 2 });
  });
});
