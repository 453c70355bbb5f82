import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { removeParty } from '../../shared/contracts/commissions.ts';
import * as contracts from '../../shared/contracts/fit-reports.ts';
import type { FitReportDetail } from '../../shared/contracts/fit-reports.ts';
import * as joints from '../../shared/contracts/joints.ts';
import * as legs from '../../shared/contracts/parts-and-legs.ts';
import { getStanding } from '../../shared/contracts/standing.ts';
import { makeCommissionKit, type CommissionKit } from '../support/commission-kit.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.close());

interface Bench extends CommissionKit {
  params: { commissionId: string };
  jointId: string;
  legId: string;
  hiltId: string;
}

let bench: Bench;

/** A hilt of the maker's and a chassis of the lead's, with a joint between them and a leg that waits. */
beforeEach(async () => {
  const kit = await makeCommissionKit(app);
  const params = { commissionId: kit.commissionId };
  const part = (name: string, holderPartyId: string) =>
    kit.lead.client.call(legs.createPart, { params, body: { name, kind: 'other', holderPartyId } });
  const [hilt, chassis] = [await part('Hilt', kit.maker.partyId), await part('Chassis', kit.lead.partyId)];
  const joint = await kit.lead.client.call(joints.createJoint, {
    params,
    body: {
      name: 'Chassis in cavity',
      kind: 'chassis-in-cavity',
      holePartId: hilt.id,
      shaftPartId: chassis.id,
      holePartyId: kit.maker.partyId,
      shaftPartyId: kit.lead.partyId,
      nominalMm: 28,
      clearanceMinUm: 50,
      clearanceMaxUm: 100,
      holeClass: 'H8',
      shaftClass: 'f7',
      handFit: null,
      engagementMm: null,
      hiddenLengthMm: null,
      note: '',
    },
  });
  const leg = await kit.lead.client.call(legs.createLeg, {
    params,
    body: {
      partyId: kit.lead.partyId,
      partId: hilt.id,
      kind: 'wiring',
      title: 'Wire',
      hopefulDays: 1,
      likelyDays: 2,
      badDays: 3,
      plannedStartOn: null,
      afterLegIds: [],
    },
  });
  await kit.lead.client.call(legs.moveLeg, {
    params: { ...params, legId: leg.id },
    body: { revision: leg.revision, state: 'under-way', onDay: '2026-01-05' },
  });
  bench = { ...kit, params, jointId: joint.id, legId: leg.id, hiltId: hilt.id };
});

const raise = (): Promise<FitReportDetail> =>
  bench.lead.client.call(contracts.raiseFitReport, {
    params: bench.params,
    body: { jointId: bench.jointId, title: 'Binds', plainWords: '', blocking: true, heldLegId: bench.legId },
  });

const note = (revision: number, changes = {}) => ({
  revision,
  method: 'Open the bore',
  cutSide: 'hole' as const,
  removeOnDiameterUm: 80,
  overLengthMm: null,
  risk: '',
  shows: false,
  whereItShows: '',
  costMinor: 1200,
  currency: 'EUR' as const,
  costBorneByPartyId: null,
  effectDays: 1,
  ...changes,
});

const answer = (detail: FitReportDetail, changes = {}): Promise<FitReportDetail> =>
  bench.maker.client.call(contracts.answerFitReport, {
    params: { ...bench.params, reportId: detail.report.id },
    body: note(detail.report.revision, changes),
  });

const agree = (detail: FitReportDetail): Promise<FitReportDetail> =>
  bench.lead.client.call(contracts.agreeToRework, {
    params: { ...bench.params, reportId: detail.report.id },
    body: { revision: detail.report.revision, noteId: detail.notes.at(-1)?.id ?? '' },
  });

describe('a fit report', () => {
  it('goes from raised to closed through a failed verification, holding its leg until then, with its history kept', async () => {
    let detail = await agree(await answer(await raise()));
    const params = { ...bench.params, reportId: detail.report.id };
    const held = await bench.lead.client.call(legs.listLegs, { params: bench.params });
    expect(held[0]?.held).toMatchObject({ reportId: detail.report.id, title: 'Binds' });
    const finish = {
      params: { ...bench.params, legId: bench.legId },
      body: { revision: held[0]?.revision ?? 0, state: 'finished' as const, onDay: '2026-01-09' },
    };
    expect((await bench.lead.client.refused(legs.moveLeg, finish)).code).toBe('not-in-this-state');

    const rework = async () => {
      detail = await bench.maker.client.call(contracts.startRework, {
        params,
        body: { revision: detail.report.revision },
      });
      detail = await bench.maker.client.call(contracts.finishRework, {
        params,
        body: { revision: detail.report.revision, words: 'Done' },
      });
    };
    await rework();
    detail = await bench.lead.client.call(contracts.verifyRework, {
      params,
      body: { revision: detail.report.revision, passed: false, words: 'Still tight' },
    });
    expect(detail.report).toMatchObject({ state: 'raised', reopenedCount: 1 });
    detail = await agree(await answer(detail));
    await rework();
    const passed = { params, body: { revision: detail.report.revision, passed: true, words: '' } };
    expect((await bench.lead.client.refused(contracts.verifyRework, passed)).code).toBe('not-in-this-state');
    await bench.lead.client.call(joints.addReadings, {
      params: { ...bench.params, jointId: bench.jointId },
      body: { side: 'shaft', resolutionUm: 10, reportId: detail.report.id, readings: [{ text: '27.92', unit: 'mm' }] },
    });
    detail = await bench.lead.client.call(contracts.verifyRework, passed);
    expect(detail.report.state).toBe('closed');
    expect(detail.events.map((event) => event.act)).toEqual([
      'raise',
      'answer',
      'agree',
      'start-rework',
      'finish-rework',
      'verify-fail',
      'answer',
      'agree',
      'start-rework',
      'finish-rework',
      'verify-pass',
    ]);
    expect((await bench.lead.client.call(legs.listLegs, { params: bench.params }))[0]?.held).toBeNull();
    expect((await bench.lead.client.call(legs.moveLeg, finish)).state).toBe('finished');
  });

  it('takes no answer that cuts past what is hidden and says that nothing shows', async () => {
    const detail = await raise();
    const [joint] = await bench.lead.client.call(joints.listJoints, { params: bench.params });
    await bench.lead.client.call(joints.updateJoint, {
      params: { ...bench.params, jointId: bench.jointId },
      body: { revision: joint?.revision ?? 0, engagementMm: 10, hiddenLengthMm: 8 },
    });
    const params = { ...bench.params, reportId: detail.report.id };
    const body = note(detail.report.revision, { overLengthMm: 12 });
    const refused = await bench.maker.client.refused(contracts.answerFitReport, { params, body });
    expect(refused.errors?.map((error) => error.pointer)).toEqual(['/body/overLengthMm']);
    const told = await answer(detail, { overLengthMm: 12, shows: true, whereItShows: 'Below the shoulder' });
    expect(told.report.state).toBe('answered');
  });

  it('can be ended by the lead during the rework, where the other side is gone, and frees its leg', async () => {
    let detail = await agree(await answer(await raise()));
    const params = { ...bench.params, reportId: detail.report.id };
    detail = await bench.maker.client.call(contracts.startRework, {
      params,
      body: { revision: detail.report.revision },
    });
    await bench.lead.client.call(legs.updatePart, {
      params: { ...bench.params, partId: bench.hiltId },
      body: { revision: 1, holderPartyId: bench.lead.partyId },
    });
    await bench.lead.client.call(removeParty, { params: { ...bench.params, partyId: bench.maker.partyId } });
    detail = await bench.lead.client.call(contracts.withdrawFitReport, {
      params,
      body: { revision: detail.report.revision, words: 'The maker has left' },
    });
    expect(detail.report.state).toBe('withdrawn');
    expect((await bench.lead.client.call(legs.listLegs, { params: bench.params }))[0]?.held).toBeNull();
  });

  it('answers consent and another act at the same moment without one of them breaking', async () => {
    const outcomes = new Set<number>();
    let detail = await raise();
    const params = { ...bench.params, reportId: detail.report.id };
    for (let round = 0; round < 8; round += 1) {
      detail = await agree(await answer(detail, { shows: true, whereItShows: 'At the rim' }));
      const noteId = detail.notes.at(-1)?.id ?? '';
      const both = await Promise.all([
        bench.client.client.try(contracts.answerConsent, {
          params: { ...bench.params, noteId },
          body: { given: true, words: '' },
        }),
        bench.lead.client.try(contracts.askOtherLimits, {
          params,
          body: { revision: detail.report.revision, noteId, words: 'Smaller' },
        }),
      ]);
      for (const one of both) outcomes.add(one.ok ? 200 : one.problem.status);
      detail = await bench.lead.client.call(contracts.getFitReport, { params });
      if (detail.report.state === 'agreed')
        detail = await bench.lead.client.call(contracts.askOtherLimits, {
          params,
          body: { revision: detail.report.revision, noteId, words: 'Smaller' },
        });
    }
    expect([...outcomes].filter((status) => status >= 500)).toEqual([]);
  });

  it('whose rework shows waits for the client, who is asked in their own words and sees neither price nor method', async () => {
    let detail = await agree(await answer(await raise(), { shows: true, whereItShows: 'A bright ring at the rim' }));
    const params = { ...bench.params, reportId: detail.report.id };
    expect(
      (await bench.maker.client.refused(contracts.startRework, { params, body: { revision: detail.report.revision } }))
        .code,
    ).toBe('not-in-this-state');
    const asked = await bench.client.client.call(contracts.listConsents, { params: bench.params });
    expect(asked).toMatchObject([{ state: 'asked', whereItShows: 'A bright ring at the rim' }]);
    expect(JSON.stringify(asked)).not.toMatch(/Open the bore|1200/);
    const noteId = asked[0]?.noteId ?? '';
    const told = await bench.client.client.call(getStanding, { params: bench.params });
    expect(told.facts.waitingOnClient).toMatchObject([{ kind: 'consent', refId: noteId }]);
    await bench.client.client.call(contracts.answerConsent, {
      params: { ...bench.params, noteId },
      body: { given: true, words: 'Go on' },
    });
    expect(
      (
        await bench.client.client.refused(contracts.answerConsent, {
          params: { ...bench.params, noteId },
          body: { given: false, words: '' },
        })
      ).code,
    ).toBe('not-in-this-state');
    detail = await bench.maker.client.call(contracts.getFitReport, { params });
    expect(
      (await bench.maker.client.call(contracts.startRework, { params, body: { revision: detail.report.revision } }))
        .report.state,
    ).toBe('being-reworked');
  });

  it('refuses what shows without saying where, naming the field, and stores nothing', async () => {
    const detail = await raise();
    const refusal = await bench.maker.client.refused(contracts.answerFitReport, {
      params: { ...bench.params, reportId: detail.report.id },
      body: note(detail.report.revision, { shows: true, whereItShows: '' }),
    });
    expect(refusal).toMatchObject({ status: 422, errors: [{ pointer: '/body/whereItShows' }] });
    expect(
      (
        await bench.lead.client.call(contracts.getFitReport, {
          params: { ...bench.params, reportId: detail.report.id },
        })
      ).notes,
    ).toEqual([]);
  });

  it('gives a stale act the report as it is now, and changes nothing', async () => {
    const detail = await answer(await raise());
    const refusal = await bench.lead.client.refused(contracts.agreeToRework, {
      params: { ...bench.params, reportId: detail.report.id },
      body: { revision: 1, noteId: detail.notes[0]?.id ?? '' },
    });
    expect(refusal.code).toBe('stale-revision');
    expect(contracts.fitReportDetail.parse(refusal.current).report.revision).toBe(detail.report.revision);
  });

  it("stands alone on its joint, and another joint's reading cannot be hung on it", async () => {
    const detail = await raise();
    const again = await bench.maker.client.refused(contracts.raiseFitReport, {
      params: bench.params,
      body: { jointId: bench.jointId, title: 'Again', plainWords: '', blocking: false, heldLegId: null },
    });
    expect(again.code).toBe('already-there');
    const elsewhere = await bench.maker.client.refused(joints.addReadings, {
      params: { ...bench.params, jointId: bench.jointId },
      body: { side: 'hole', resolutionUm: 10, readings: [{ text: '28.02', unit: 'mm' }], reportId: randomUUID() },
    });
    expect(elsewhere.errors?.[0]?.pointer).toBe('/body/reportId');
    expect(detail.report.answerPartyId).toBe(bench.maker.partyId);
  });
});

describe('readings', () => {
  const add = (readings: { text: string; unit: 'mm' | 'inch' | 'inch-fraction' }[]) =>
    bench.maker.client.try(joints.addReadings, {
      params: { ...bench.params, jointId: bench.jointId },
      body: { side: 'hole', resolutionUm: 10, readings },
    });

  it('are kept as typed, in any mixture of units', async () => {
    const outcome = await add([
      { text: '28,031', unit: 'mm' },
      { text: '1.1024 in', unit: 'mm' },
      { text: '1 7/64', unit: 'inch-fraction' },
    ]);
    if (!outcome.ok) throw new Error(outcome.problem.title);
    expect(outcome.body.map((row) => row.enteredText)).toEqual(['28,031', '1.1024 in', '1 7/64']);
    expect(outcome.body.map((row) => Number(row.valueMm.toFixed(6)))).toEqual([
      28.031,
      28.00096,
      Number(((1 + 7 / 64) * 25.4).toFixed(6)),
    ]);
  });

  it('that cannot be read, or are in a mixed-up unit, are named one by one and none is stored', async () => {
    const outcome = await add([
      { text: '28.01', unit: 'mm' },
      { text: '2,8.1', unit: 'mm' },
      { text: '1.1024', unit: 'mm' },
    ]);
    expect(outcome.ok ? [] : outcome.problem.errors?.map((error) => error.pointer)).toEqual([
      '/body/readings/1/text',
      '/body/readings/2/text',
    ]);
    const { readings } = await bench.maker.client.call(joints.getJoint, {
      params: { ...bench.params, jointId: bench.jointId },
    });
    expect(readings).toEqual([]);
  });
});
