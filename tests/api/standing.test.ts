import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import * as contracts from '../../shared/contracts/standing.ts';
import type { BenchItemView } from '../../shared/contracts/standing.ts';
import * as reports from '../../shared/contracts/fit-reports.ts';
import { completeHandoff, createHandoff, offerHandoffDay } from '../../shared/contracts/handoffs.ts';
import { createJoint } from '../../shared/contracts/joints.ts';
import {
  createLeg,
  createPart,
  listLegs,
  moveLeg,
  updateLeg,
  updatePart,
} from '../../shared/contracts/parts-and-legs.ts';
import { openThread, postMessage } from '../../shared/contracts/threads.ts';
import { makeCommissionKit, type CommissionKit } from '../support/commission-kit.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.close());

let kit: CommissionKit;
let params: { commissionId: string };
let hiltId: string;
let chassisId: string;
let legId: string;

beforeEach(async () => {
  kit = await makeCommissionKit(app);
  params = { commissionId: kit.commissionId };
  const part = async (name: string, holderPartyId: string): Promise<string> =>
    (await kit.lead.client.call(createPart, { params, body: { name, kind: 'other', holderPartyId } })).id;
  hiltId = await part('Hilt', kit.maker.partyId);
  chassisId = await part('Chassis', kit.lead.partyId);
  legId = (
    await kit.lead.client.call(createLeg, {
      params,
      body: {
        partyId: kit.maker.partyId,
        partId: hiltId,
        kind: 'machining',
        title: 'Turn the hilt',
        hopefulDays: 1,
        likelyDays: 2,
        badDays: 3,
        plannedStartOn: null,
        afterLegIds: [],
      },
    })
  ).id;
});

type Who = 'lead' | 'maker' | 'finisher' | 'client';
const facts = async (who: Who) => (await kit[who].client.call(contracts.getStanding, { params })).facts;
const bench = async (who: Who) => kit[who].client.call(contracts.getBench);
const mine = (items: BenchItemView[]) => items.map((item) => [item.kind, item.refId]);

/** Words, a price and a note that only makers may know, put wherever makers write. */
async function writeSecrets(): Promise<void> {
  await kit.maker.client.call(updateLeg, {
    params: { ...params, legId },
    body: { revision: 1, privateNote: 'SECRET note' },
  });
  const joint = await kit.lead.client.call(createJoint, {
    params,
    body: {
      name: 'SECRET joint',
      kind: 'other',
      holePartId: hiltId,
      shaftPartId: chassisId,
      holePartyId: kit.maker.partyId,
      shaftPartyId: kit.lead.partyId,
      nominalMm: 28,
      clearanceMinUm: 50,
      clearanceMaxUm: 100,
      holeClass: null,
      shaftClass: null,
      handFit: null,
      engagementMm: null,
      hiddenLengthMm: null,
      note: 'SECRET',
    },
  });
  const raised = await kit.lead.client.call(reports.raiseFitReport, {
    params,
    body: { jointId: joint.id, title: 'SECRET title', plainWords: 'SECRET', blocking: true, heldLegId: legId },
  });
  await kit.maker.client.call(reports.answerFitReport, {
    params: { ...params, reportId: raised.report.id },
    body: {
      revision: raised.report.revision,
      method: 'SECRET method',
      cutSide: 'hole',
      removeOnDiameterUm: 4321.25,
      overLengthMm: null,
      risk: 'SECRET risk',
      shows: false,
      whereItShows: '',
      costMinor: 87654321,
      currency: 'EUR',
      costBorneByPartyId: kit.maker.partyId,
      effectDays: 1,
    },
  });
}

describe('where it stands', () => {
  it('is one answer for every reader', async () => {
    const all = await Promise.all((['lead', 'maker', 'finisher', 'client'] as const).map(facts));
    for (const one of all) expect(one).toEqual(all[0]);
    expect(all[0]).toMatchObject({ pieceTitle: 'The Test Piece', clientName: kit.client.person.displayName });
    expect(all[0]?.parts.map((part) => part.name)).toEqual(['Hilt', 'Chassis']);
    expect(all[0]?.legs.map((leg) => [leg.title, leg.state])).toEqual([['Turn the hilt', 'planned']]);
  });

  it('follows the work: begun, finished, and delivered with the handoff to the client', async () => {
    for (const [revision, state, onDay] of [
      [1, 'under-way', '2026-03-02'],
      [2, 'finished', '2026-03-05'],
    ] as const)
      await kit.maker.client.call(moveLeg, { params: { ...params, legId }, body: { revision, state, onDay } });
    expect((await facts('client')).legs[0]).toMatchObject({ startedOn: '2026-03-02', finishedOn: '2026-03-05' });
    await kit.lead.client.call(updatePart, {
      params: { ...params, partId: chassisId },
      body: { revision: 1, holderPartyId: kit.client.partyId },
    });
    const handoff = await kit.lead.client.call(createHandoff, {
      params,
      body: {
        fromPartyId: kit.maker.partyId,
        toPartyId: kit.client.partyId,
        partIds: [hiltId],
        fromLegId: legId,
        toLegId: null,
        transitDays: 1,
        carriage: '',
      },
    });
    await kit.client.client.call(completeHandoff, {
      params: { ...params, handoffId: handoff.id },
      body: { revision: handoff.revision, onDay: '2026-03-09', words: '' },
    });
    const told = await facts('client');
    expect(told.deliveredOn).toBe('2026-03-09');
    expect(told.parts.find((part) => part.id === hiltId)).toMatchObject({
      holderName: kit.client.person.displayName,
      sinceDay: '2026-03-09',
    });
  });

  it('tells the client of a day that is offered to them, and of none between shops', async () => {
    const offer = async (toPartyId: string) => {
      const handoff = await kit.lead.client.call(createHandoff, {
        params,
        body: {
          fromPartyId: kit.maker.partyId,
          toPartyId,
          partIds: [hiltId],
          fromLegId: null,
          toLegId: null,
          transitDays: 1,
          carriage: '',
        },
      });
      await kit.maker.client.call(offerHandoffDay, {
        params: { ...params, handoffId: handoff.id },
        body: { revision: handoff.revision, onDay: '2099-03-04', words: 'SECRET' },
      });
      return handoff.id;
    };
    await offer(kit.lead.partyId);
    expect(JSON.stringify(await facts('client'))).not.toMatch(/2099-03-04|SECRET/);
    const id = await offer(kit.client.partyId);
    expect((await facts('client')).waitingOnClient).toMatchObject([{ kind: 'handoff-day', refId: id }]);
  });
});

describe('what is the makers’ alone', () => {
  it('reaches the client by no list, record or page of theirs', async () => {
    const before = await facts('client');
    await kit.lead.client.call(openThread, {
      params,
      body: { subject: 'commission', subjectId: kit.commissionId, title: 'SECRET', audience: 'makers' },
    });
    await writeSecrets();
    const after = await facts('client');
    expect(JSON.stringify(after)).not.toMatch(/SECRET|4321\.25|87654321/);
    // What did change is what a client may know: the leg is held, in the default words.
    expect(after.legs[0]?.held).toMatchObject({ clientWords: 'A part does not yet go together as agreed' });
    expect(after.parts).toEqual(before.parts);
    const { client } = kit.client;
    const pages = [
      await client.call(contracts.getBench),
      await client.call(contracts.listMoved, { params }),
      await client.call(reports.listFitReports, { params }),
      await client.call(reports.listConsents, { params }),
      await client.call(listLegs, { params }),
    ];
    expect(JSON.stringify(pages)).not.toMatch(/SECRET|4321\.25|87654321/);
  });
});

describe('the bench', () => {
  it('puts each act with the party it waits on, and says what the others wait on', async () => {
    expect(mine((await bench('maker')).waitsOnYou)).toEqual([['start-leg', legId]]);
    expect(mine((await bench('finisher')).waitsOnYou)).toEqual([]);
    expect(mine((await bench('client')).waitsOnYou)).toEqual([]);
    const lead = await bench('lead');
    expect(mine(lead.waitsOnYou)).toEqual([]);
    expect(mine(lead.youWaitOn)).toEqual([['start-leg', legId]]);
    await kit.maker.client.call(moveLeg, {
      params: { ...params, legId },
      body: { revision: 1, state: 'under-way', onDay: '2026-03-02' },
    });
    expect(mine((await bench('maker')).waitsOnYou)).toEqual([['finish-leg', legId]]);
  });

  it('tells what others did since one was last here, and nothing twice', async () => {
    const first = await bench('maker');
    expect(first.moved.map((line) => line.words)).toContain('Added the leg Turn the hilt');
    await kit.maker.client.call(contracts.markBenchSeen);
    expect((await bench('maker')).moved).toEqual([]);
    await kit.lead.client.call(createPart, {
      params,
      body: { name: 'Blade', kind: 'blade', holderPartyId: kit.lead.partyId },
    });
    expect((await bench('maker')).moved.map((line) => line.words)).toEqual(['Added the part Blade']);
    // One's own acts are no news.
    expect((await bench('lead')).moved.map((line) => line.words)).not.toContain('Added the part Blade');
  });

  it('brings a mention to the one who is named, until it is read', async () => {
    const thread = await kit.lead.client.call(openThread, {
      params,
      body: { subject: 'commission', subjectId: kit.commissionId, title: 'Bore depth', audience: 'makers' },
    });
    await kit.lead.client.call(postMessage, {
      params: { ...params, threadId: thread.id },
      body: {
        id: '0f6f4f0e-4b8c-4a53-9c1c-7f6a5f7f0a01',
        body: 'How deep is it?',
        mentionedAccountIds: [kit.maker.person.id],
      },
    });
    expect(mine((await bench('maker')).waitsOnYou)).toContainEqual(['read-mention', thread.id]);
    expect(mine((await bench('finisher')).waitsOnYou)).not.toContainEqual(['read-mention', thread.id]);
    expect([(await bench('maker')).unreadThreads, (await bench('client')).unreadThreads]).toEqual([1, 0]);
  });
});

describe('what happened', () => {
  it('comes in pages without a gap or a double, newest first', async () => {
    for (const name of ['One', 'Two', 'Three'])
      await kit.lead.client.call(createPart, {
        params,
        body: { name, kind: 'other', holderPartyId: kit.lead.partyId },
      });
    const whole = (await kit.maker.client.call(contracts.listMoved, { params, query: { limit: 100 } })).items;
    expect(whole[0]?.words).toBe('Added the part Three');
    const seen: string[] = [];
    let cursor: string | undefined;
    do {
      const page: { items: { id: string }[]; nextCursor: string | null } = await kit.maker.client.call(
        contracts.listMoved,
        { params, query: { limit: 2, ...(cursor ? { cursor } : {}) } },
      );
      seen.push(...page.items.map((line) => line.id));
      cursor = page.nextCursor ?? undefined;
    } while (cursor);
    expect(seen).toEqual(whole.map((line) => line.id));
  });

  it('takes no page mark but its own', async () => {
    const refusal = await kit.maker.client.refused(contracts.listMoved, { params, query: { cursor: '1; DROP' } });
    expect(refusal.errors?.map((error) => error.pointer)).toEqual(['/query/cursor']);
  });
});
