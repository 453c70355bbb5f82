import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import * as contracts from '../../shared/contracts/joints.ts';
import type { JointView } from '../../shared/contracts/joints.ts';
import { raiseFitReport, withdrawFitReport } from '../../shared/contracts/fit-reports.ts';
import { createPart } from '../../shared/contracts/parts-and-legs.ts';
import { makeCommissionKit, type CommissionKit, type KitParty } from '../support/commission-kit.ts';
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

const partOf = async (where: CommissionKit, name: string, holder: KitParty): Promise<string> => {
  const part = await where.lead.client.call(createPart, {
    params: { commissionId: where.commissionId },
    body: { name, kind: 'other', holderPartyId: holder.partyId },
  });
  return part.id;
};

beforeEach(async () => {
  kit = await makeCommissionKit(app);
  params = { commissionId: kit.commissionId };
  hiltId = await partOf(kit, 'Hilt', kit.maker);
  chassisId = await partOf(kit, 'Chassis', kit.lead);
});

const fields = (changes = {}) => ({
  name: 'Pommel spigot in bore',
  kind: 'spigot-in-bore' as const,
  holePartId: hiltId,
  shaftPartId: chassisId,
  holePartyId: kit.maker.partyId,
  shaftPartyId: kit.lead.partyId,
  nominalMm: 30,
  clearanceMinUm: 20,
  clearanceMaxUm: 74,
  holeClass: 'H8',
  shaftClass: 'f7',
  handFit: null,
  engagementMm: 18,
  hiddenLengthMm: 15,
  note: '',
  ...changes,
});
const make = (changes = {}): Promise<JointView> =>
  kit.lead.client.call(contracts.createJoint, { params, body: fields(changes) });
const refusedFields = async (changes = {}): Promise<string[] | undefined> =>
  (await kit.lead.client.refused(contracts.createJoint, { params, body: fields(changes) })).errors?.map(
    (error) => error.pointer,
  );

describe('a joint', () => {
  it('is kept as agreed and seen by its two sides alone', async () => {
    const joint = await make();
    expect(joint).toMatchObject({ ...fields(), openReportId: null, revision: 1 });
    const seen = async (who: 'lead' | 'maker' | 'finisher' | 'client') =>
      (await kit[who].client.call(contracts.listJoints, { params })).map((one) => one.id);
    expect([await seen('lead'), await seen('maker')]).toEqual([[joint.id], [joint.id]]);
    expect([await seen('finisher'), await seen('client')]).toEqual([[], []]);
  });

  it.each([
    ['a class that ISO 286-1 does not have at this size', { holeClass: 'H99' }, ['/body/holeClass']],
    [
      'both classes wrong, both named',
      { holeClass: 'H99', shaftClass: 'f99' },
      ['/body/holeClass', '/body/shaftClass'],
    ],
    ['a shaft class for the hole', { holeClass: 'h8' }, ['/body/holeClass']],
    ['a range the wrong way round', { clearanceMinUm: 80 }, ['/body/clearanceMinUm']],
    ['a size outside the tables', { nominalMm: 200 }, ['/body/nominalMm']],
    ['a part that is not there', { holePartId: randomUUID() }, ['/body/holePartId']],
    ['a party that is not there', { shaftPartyId: randomUUID() }, ['/body/shaftPartyId']],
  ])('is refused with %s', async (_case, changes, pointers) => {
    expect(await refusedFields(changes)).toEqual(pointers);
    expect(await kit.lead.client.call(contracts.listJoints, { params })).toEqual([]);
  });

  it('is between two parts', async () => {
    expect(await refusedFields({ shaftPartId: hiltId })).toEqual(['/body/shaftPartId']);
    const joint = await make();
    const refusal = await kit.lead.client.refused(contracts.updateJoint, {
      params: { ...params, jointId: joint.id },
      body: { revision: 1, shaftPartId: hiltId },
    });
    expect(refusal.errors?.map((error) => error.pointer)).toEqual(['/body/shaftPartId']);
  });

  it('takes no part and no party of another commission', async () => {
    const other = await makeCommissionKit(app);
    expect(await refusedFields({ holePartId: await partOf(other, 'Blade', other.maker) })).toEqual([
      '/body/holePartId',
    ]);
    expect(await refusedFields({ holePartyId: other.maker.partyId })).toEqual(['/body/holePartyId']);
    const joint = await make();
    expect(
      (
        await other.lead.client.refused(contracts.getJoint, {
          params: { commissionId: other.commissionId, jointId: joint.id },
        })
      ).code,
    ).toBe('not-found');
  });

  it('is checked as a whole when only one end of its range changes', async () => {
    const joint = await make();
    const refusal = await kit.lead.client.refused(contracts.updateJoint, {
      params: { ...params, jointId: joint.id },
      body: { revision: 1, clearanceMinUm: 75 },
    });
    expect(refusal.errors?.map((error) => error.pointer)).toEqual(['/body/clearanceMinUm']);
  });

  it('saved from an older state is told of the newer one, and neither is lost', async () => {
    const joint = await make();
    const path = { ...params, jointId: joint.id };
    await kit.lead.client.call(contracts.updateJoint, { params: path, body: { revision: 1, note: 'Theirs' } });
    const refusal = await kit.lead.client.refused(contracts.updateJoint, {
      params: path,
      body: { revision: 1, note: 'Mine' },
    });
    expect(refusal.code).toBe('stale-revision');
    expect(contracts.jointView.parse(refusal.current)).toMatchObject({ note: 'Theirs', revision: 2 });
    expect((await kit.maker.client.call(contracts.getJoint, { params: path })).joint.note).toBe('Theirs');
  });

  it('given to another shop is lost from sight by the one that had it, with its readings', async () => {
    const joint = await make();
    const path = { ...params, jointId: joint.id };
    await kit.lead.client.call(contracts.updateJoint, {
      params: path,
      body: { revision: 1, holePartyId: kit.finisher.partyId },
    });
    expect((await kit.maker.client.refused(contracts.getJoint, { params: path })).code).toBe('not-found');
    expect((await kit.finisher.client.call(contracts.getJoint, { params: path })).joint.id).toBe(joint.id);
  });

  it('says which report is open on it, and forgets it with the report', async () => {
    const joint = await make();
    const detail = await kit.maker.client.call(raiseFitReport, {
      params,
      body: { jointId: joint.id, title: 'Binds', plainWords: '', blocking: false, heldLegId: null },
    });
    const open = async () => (await kit.lead.client.call(contracts.listJoints, { params }))[0]?.openReportId;
    expect(await open()).toBe(detail.report.id);
    await kit.maker.client.call(withdrawFitReport, {
      params: { ...params, reportId: detail.report.id },
      body: { revision: 1, words: 'A chip sat in the bore' },
    });
    expect(await open()).toBeNull();
  });
});

describe('sets of readings', () => {
  const add = (who: 'lead' | 'maker', jointId: string, key: string = randomUUID(), text = '30.01') =>
    kit[who].client.try(
      contracts.addReadings,
      {
        params: { ...params, jointId },
        body: { side: 'hole', resolutionUm: 10, readings: [{ text, unit: 'mm' }] },
      },
      { 'idempotency-key': key },
    );
  const numbers = async (jointId: string): Promise<number[]> =>
    (await kit.maker.client.call(contracts.getJoint, { params: { ...params, jointId } })).readings
      .map((reading) => reading.setNumber)
      .sort();

  it('get numbers of their own, though both sides send at the same moment', async () => {
    const joint = await make();
    const outcomes = await Promise.all([add('lead', joint.id), add('maker', joint.id), add('maker', joint.id)]);
    expect(outcomes.map((outcome) => outcome.status)).toEqual([201, 201, 201]);
    expect(await numbers(joint.id)).toEqual([1, 2, 3]);
  });

  it('sent twice under one key are stored once, and both senders get the same answer', async () => {
    const joint = await make();
    const key = randomUUID();
    const [one, two] = await Promise.all([add('maker', joint.id, key), add('maker', joint.id, key)]);
    expect(one.ok && two.ok && one.body).toEqual(two.ok && two.body);
    expect(await numbers(joint.id)).toEqual([1]);
  });

  it('carry the name of the shop that measured', async () => {
    const joint = await make();
    const outcome = await add('maker', joint.id);
    expect(outcome.ok && outcome.body).toMatchObject([
      { partyId: kit.maker.partyId, takenBy: kit.maker.person.displayName, side: 'hole', enteredText: '30.01' },
    ]);
  });
});
