import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { listCommissions, listParties } from '../../shared/contracts/commissions.ts';
import { listFiles } from '../../shared/contracts/files.ts';
import { listConsents, listFitReports } from '../../shared/contracts/fit-reports.ts';
import { listHandoffs } from '../../shared/contracts/handoffs.ts';
import { getJoint, listJoints } from '../../shared/contracts/joints.ts';
import { listLegs, listParts } from '../../shared/contracts/parts-and-legs.ts';
import type { AnyRoute } from '../../shared/contracts/route.ts';
import { listShopMembers } from '../../shared/contracts/shops.ts';
import { getBench, getStanding, listMoved } from '../../shared/contracts/standing.ts';
import { listMessages, listThreads } from '../../shared/contracts/threads.ts';
import { makeMember } from '../factories/shop.ts';
import { makeCommissionKit, makeThread, type CommissionKit } from '../support/commission-kit.ts';
import { statementsDuring } from '../support/count-statements.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
  await app.stopRelays();
});
afterAll(() => app.close());

interface Filled {
  kit: CommissionKit;
  threadId: string;
  jointId: string;
}

/** A commission in which every list has `rows` rows, put there by statements. */
async function fill(rows: number): Promise<Filled> {
  const kit = await makeCommissionKit(app);
  const { commissionId } = kit;
  const [lead, maker, person] = [kit.lead.partyId, kit.maker.partyId, kit.lead.person.id];
  const { db } = app.services;
  const threadId = await makeThread(app, kit, 'makers');
  const jointId = randomUUID();
  const many = (sql: string, params: unknown[]) =>
    db.query(sql.replace('ROWS', `generate_series(1, ${rows}) n`), params);
  await many(
    `INSERT INTO "part" ("id", "commission_id", "name", "kind", "holder_party_id", "position")
     SELECT gen_random_uuid(), $1, 'Part ' || n, 'other', $2, n FROM ROWS`,
    [commissionId, lead],
  );
  const [partRow] = await db.query<{ id: string }[]>('SELECT "id" FROM "part" WHERE "commission_id" = $1', [
    commissionId,
  ]);
  const partId = partRow?.id;
  await many(
    `INSERT INTO "leg" ("id", "commission_id", "party_id", "part_id", "kind", "title", "hopeful_days", "likely_days", "bad_days", "position")
     SELECT gen_random_uuid(), $1, $2, $3, 'other', 'Leg ' || n, 1, 2, 3, n FROM ROWS`,
    [commissionId, lead, partId],
  );
  await db.query(
    `INSERT INTO "part" ("id", "commission_id", "name", "kind", "holder_party_id") VALUES (gen_random_uuid(), $1, 'Other', 'other', $2)`,
    [commissionId, lead],
  );
  await many(
    `INSERT INTO "joint" ("id", "commission_id", "name", "kind", "hole_part_id", "shaft_part_id", "hole_party_id", "shaft_party_id",
       "nominal_mm", "clearance_min_um", "clearance_max_um")
     SELECT CASE WHEN n = 1 THEN $4::uuid ELSE gen_random_uuid() END, $1, 'Joint ' || n, 'other', $3,
       (SELECT "id" FROM "part" WHERE "commission_id" = $1 AND "name" = 'Other'), $2, $5, 30, 1, 2 FROM ROWS`,
    [commissionId, lead, partId, jointId, maker],
  );
  await db.query(
    `INSERT INTO "fit_report" ("id", "commission_id", "joint_id", "title", "state", "blocking", "raised_by_party_id", "raised_by_account_id", "answer_party_id")
     SELECT gen_random_uuid(), $1, "id", 'Report', 'agreed', false, $2, $3, $4 FROM "joint" WHERE "commission_id" = $1`,
    [commissionId, lead, person, maker],
  );
  await db.query(
    `INSERT INTO "rework_note" ("id", "report_id", "party_id", "account_id", "state", "method", "cut_side", "remove_on_diameter_um", "shows", "consent_state", "consent_asked_at")
     SELECT gen_random_uuid(), "id", $2, $3, 'agreed', 'Turn', 'shaft', 10, true, 'asked', now() FROM "fit_report" WHERE "commission_id" = $1`,
    [commissionId, maker, person],
  );
  await many(
    `INSERT INTO "handoff" ("id", "commission_id", "from_party_id", "to_party_id", "part_ids")
     SELECT gen_random_uuid(), $1, $2, $3, ARRAY[$4::uuid] FROM ROWS`,
    [commissionId, lead, maker, partId],
  );
  await db.query(
    `INSERT INTO "handoff_offer" ("id", "handoff_id", "by_party_id", "by_account_id", "on_day")
     SELECT gen_random_uuid(), "id", $2, $3, '2099-01-04' FROM "handoff" WHERE "commission_id" = $1`,
    [commissionId, maker, person],
  );
  await many(
    `INSERT INTO "reading" ("id", "joint_id", "side", "position", "party_id", "set_number", "value_mm", "entered_text", "entered_unit", "resolution_um", "account_id")
     SELECT gen_random_uuid(), $1, 'hole', n, $2, 1, 30, '30', 'mm', 10, $3 FROM ROWS`,
    [jointId, lead, person],
  );
  for (let made = 0; made < rows; made += 1) await makeThread(app, kit, 'makers');
  await many(
    `INSERT INTO "message" ("id", "thread_id", "sequence", "author_account_id", "author_party_id", "body", "mentioned_account_ids", "file_ids")
     SELECT gen_random_uuid(), $1, n, $2, $3, 'Words', ARRAY[$2::uuid], '{}' FROM ROWS`,
    [threadId, person, lead],
  );
  await many(
    `INSERT INTO "stored_file" ("id", "commission_id", "place", "place_id", "purpose", "name", "media_type", "byte_size", "sha256", "storage_key", "added_by_account_id")
     SELECT gen_random_uuid(), $1, 'thread', $2::uuid, 'message', 'note.txt', 'text/plain', 5, 'x', 'none/' || n || ($2::uuid)::text, $3 FROM ROWS`,
    [commissionId, threadId, person],
  );
  await many(
    `INSERT INTO "history_line" ("commission_id", "account_id", "subject", "subject_id", "words")
     SELECT $1::uuid, $2, 'leg', $1::uuid, 'Moved ' || n FROM ROWS`,
    [commissionId, kit.maker.person.id],
  );
  // Commissions of the same lead, for the list over all of them.
  await many(
    `INSERT INTO "commission" ("id", "code", "title", "member_keys") SELECT gen_random_uuid(), 'T' || n || left(($1::uuid)::text, 6), 'Other', ARRAY[$2::uuid] FROM ROWS`,
    [commissionId, kit.lead.shopId],
  );
  await db.query(
    `INSERT INTO "party" ("id", "commission_id", "roles", "shop_id") SELECT gen_random_uuid(), c."id", '{lead}', $1 FROM "commission" c
     WHERE c."member_keys" = ARRAY[$1::uuid] AND c."title" = 'Other'`,
    [kit.lead.shopId],
  );
  for (let made = 0; made < Math.min(rows, 12); made += 1) await makeMember(app, { id: kit.lead.shopId ?? '' }, 'hand');
  return { kit, threadId, jointId };
}

/** Every list of the product, with the number of its rows read off the answer. */
const LISTS: readonly [string, AnyRoute, (filled: Filled) => object, (body: never) => number][] = [
  [
    'commissions',
    listCommissions,
    () => ({ query: { limit: 100 } }),
    (body: { items: unknown[] }) => body.items.length,
  ],
  ['parties', listParties, at(), (body: { parties: unknown[] }) => body.parties.length],
  ['parts', listParts, at(), rowsOf],
  ['legs', listLegs, at(), rowsOf],
  ['joints', listJoints, at(), rowsOf],
  [
    'readings',
    getJoint,
    ({ kit, jointId }) => ({ params: { commissionId: kit.commissionId, jointId } }),
    (body: { readings: unknown[] }) => body.readings.length,
  ],
  ['fit reports', listFitReports, at(), rowsOf],
  ['consents', listConsents, at(), rowsOf],
  ['handoffs', listHandoffs, at(), rowsOf],
  ['threads', listThreads, at(), rowsOf],
  [
    'messages',
    listMessages,
    ({ kit, threadId }) => ({ params: { commissionId: kit.commissionId, threadId }, query: { limit: 200 } }),
    (body: { messages: unknown[] }) => body.messages.length,
  ],
  [
    'files',
    listFiles,
    ({ kit, threadId }) => ({
      params: { commissionId: kit.commissionId },
      query: { place: 'thread', placeId: threadId },
    }),
    rowsOf,
  ],
  ['history', listMoved, at({ query: { limit: 100 } }), (body: { items: unknown[] }) => body.items.length],
  ['standing', getStanding, at(), (body: { facts: { legs: unknown[] } }) => body.facts.legs.length],
  ['bench', getBench, () => ({}), (body: { youWaitOn: unknown[] }) => body.youWaitOn.length],
  [
    'members',
    listShopMembers,
    ({ kit }) => ({ params: { shopId: kit.lead.shopId } }),
    (body: { members: unknown[] }) => body.members.length,
  ],
];

function at(more: object = {}): (filled: Filled) => object {
  return ({ kit }) => ({ params: { commissionId: kit.commissionId }, ...more });
}
function rowsOf(body: unknown[]): number {
  return body.length;
}

let sizes: Filled[];
beforeAll(async () => {
  sizes = [await fill(1), await fill(10), await fill(100)];
}, 120_000);

it.each(LISTS)('%s: as many statements for a hundred rows as for one', async (name, route, input, count) => {
  const statements: string[][] = [];
  const rows: number[] = [];
  for (const filled of sizes) {
    const seen = await statementsDuring(app, async () => {
      const body: unknown = await filled.kit.lead.client.call(route, input(filled));
      rows.push(count(body as never));
    });
    statements.push(seen);
  }
  const [one, ten, hundred] = statements.map((seen) => seen.length);
  expect(one, name).toBeGreaterThan(2);
  expect([ten, hundred], statements.at(-1)?.join('\n---\n')).toEqual([one, one]);
  // The lists did grow, or the comparison says nothing. Parties are the same four; a shop has at most a dozen hands here.
  if (name !== 'parties') expect(rows[0]).toBeLessThan(rows[1] ?? 0);
  if (name !== 'parties' && name !== 'members') expect(rows[2]).toBeGreaterThanOrEqual(100);
});
