import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { updateJoint, createJoint } from '../../shared/contracts/joints.ts';
import { createLeg, createPart, updateLeg, updatePart } from '../../shared/contracts/parts-and-legs.ts';
import { updateCommission } from '../../shared/contracts/commissions.ts';
import { updateShop } from '../../shared/contracts/shops.ts';
import { updateMe } from '../../shared/contracts/accounts.ts';
import type { AnyRoute } from '../../shared/contracts/route.ts';
import { makeCommissionKit, type CommissionKit } from '../support/commission-kit.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';

let app: TestApp;
let kit: CommissionKit;
const ids: Record<string, string> = {};

beforeAll(async () => {
  app = await startTestApp();
  kit = await makeCommissionKit(app);
  const params = { commissionId: kit.commissionId };
  const { client } = kit.lead;
  const part = async (): Promise<string> =>
    (await client.call(createPart, { params, body: { name: 'Part', kind: 'other', holderPartyId: kit.lead.partyId } }))
      .id;
  const [one, other] = [await part(), await part()];
  const leg = await client.call(createLeg, {
    params,
    body: {
      partyId: kit.lead.partyId,
      partId: one,
      kind: 'other',
      title: 'Leg',
      hopefulDays: 1,
      likelyDays: 2,
      badDays: 3,
      plannedStartOn: null,
      afterLegIds: [],
    },
  });
  const joint = await client.call(createJoint, {
    params,
    body: {
      name: 'Joint',
      kind: 'other',
      holePartId: one,
      shaftPartId: other,
      holePartyId: kit.lead.partyId,
      shaftPartyId: kit.maker.partyId,
      nominalMm: 30,
      clearanceMinUm: 1,
      clearanceMaxUm: 2,
      holeClass: null,
      shaftClass: null,
      handFit: null,
      engagementMm: null,
      hiddenLengthMm: null,
      note: '',
    },
  });
  Object.assign(ids, {
    commission: kit.commissionId,
    part: one,
    leg: leg.id,
    joint: joint.id,
    shop: kit.lead.shopId ?? '',
    account: kit.lead.person.id,
  });
});
afterAll(() => app.close());

const camel = (name: string): string => name.replace(/_(\w)/g, (_whole, letter: string) => letter.toUpperCase());

/** A value of another kind than the stored one, so that a column that takes it is seen. */
const otherValue = (stored: unknown): unknown => {
  if (typeof stored === 'boolean') return !stored;
  if (typeof stored === 'number') return stored + 1;
  if (stored instanceof Date) return '2001-01-01T00:00:00.000Z';
  if (Array.isArray(stored)) return ['00000000-0000-4000-8000-000000000001'];
  if (typeof stored === 'string' && /^[0-9a-f]{8}-/.test(stored)) return '00000000-0000-4000-8000-000000000002';
  if (typeof stored === 'string' && /^\d{4}-\d\d-\d\d$/.test(stored)) return '2001-01-01';
  return '2001-01-01';
};

/** Each route that changes a record, its table, and the columns that its form has. Any other column must stay. */
const PATCHES: readonly [table: string, route: AnyRoute, form: readonly string[], hasRevision: boolean][] = [
  [
    'commission',
    updateCommission,
    ['title', 'brief', 'date_wanted', 'budget_minor', 'currency', 'state', 'cover_file_id'],
    true,
  ],
  ['part', updatePart, ['name', 'kind', 'holder_party_id'], true],
  [
    'leg',
    updateLeg,
    [
      'party_id',
      'part_id',
      'kind',
      'title',
      'hopeful_days',
      'likely_days',
      'bad_days',
      'planned_start_on',
      'private_note',
    ],
    true,
  ],
  [
    'joint',
    updateJoint,
    [
      'name',
      'kind',
      'hole_part_id',
      'shaft_part_id',
      'hole_party_id',
      'shaft_party_id',
      'nominal_mm',
      'clearance_min_um',
      'clearance_max_um',
      'hole_class',
      'shaft_class',
      'hand_fit',
      'engagement_mm',
      'hidden_length_mm',
      'note',
    ],
    true,
  ],
  ['shop', updateShop, ['name', 'craft', 'country', 'time_zone', 'tint'], true],
  ['account', updateMe, ['display_name', 'preferred_unit', 'time_zone'], false],
];

const stored = async (table: string): Promise<Record<string, unknown>> => {
  const [row] = await app.services.db.query<Record<string, unknown>[]>(`SELECT * FROM "${table}" WHERE "id" = $1`, [
    ids[table],
  ]);
  if (!row) throw new Error(`No ${table} is there`);
  return row;
};

describe.each(PATCHES)("a save of a %s with every column's name", (table, route, form, hasRevision) => {
  it('names columns that are there', async () => {
    const columns = Object.keys(await stored(table));
    for (const column of form) expect(columns).toContain(column);
  });

  it('leaves all that its form does not have, whatever is sent under its name', async () => {
    const before = await stored(table);
    const others = Object.keys(before).filter((column) => !form.includes(column) && column !== 'revision');
    expect(others).toContain('id');
    const sent = Object.fromEntries(
      others.flatMap((column) => [
        [camel(column), otherValue(before[column])],
        [column, otherValue(before[column])],
      ]),
    );
    const outcome = await kit.lead.client.try(route, {
      params: {
        commissionId: kit.commissionId,
        partId: ids['part'],
        legId: ids['leg'],
        jointId: ids['joint'],
        shopId: ids['shop'],
      },
      body: { ...sent, ...(hasRevision ? { revision: before['revision'] } : {}) },
    });
    expect(outcome.status).toBe(200);
    const after = await stored(table);
    const touched = ['revision', 'updated_at'];
    for (const column of others)
      if (!touched.includes(column)) expect([column, after[column]]).toEqual([column, before[column]]);
    // It did save: what counts saves moved on, and by one, not to what was sent.
    if (hasRevision) expect(after['revision']).toBe(Number(before['revision']) + 1);
  });
});
