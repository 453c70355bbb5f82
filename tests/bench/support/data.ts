import { createHmac, randomBytes } from 'node:crypto';
import type pg from 'pg';

export const COMMISSIONS = 10_000;
export const LONG_THREAD_MESSAGES = 100_000;
const ALL_MESSAGES = 1_000_000;
/** Commissions of the shop that stands for a usual one; the big shop has a part in all of them. */
const USUAL_COMMISSIONS = 40;
const WRITERS = 16;

export const SESSION_SECRET = 'a secret for measuring alone, long enough';
const SESSION_DAYS = 14;

export interface Reader {
  readonly accountId: string;
  readonly sessionId: string;
  /** Cookie header of a signed-in browser. */
  readonly cookie: string;
}

export interface PostPlace {
  readonly commissionId: string;
  readonly threadId: string;
  readonly partyId: string;
}

export interface Data {
  /** Of a shop with a part in every commission. */
  readonly bigReader: Reader;
  /** Of a shop with a part in forty. */
  readonly usualReader: Reader;
  /** Hands of the big shop, each with a session. */
  readonly writers: readonly Reader[];
  readonly bigShopId: string;
  readonly longThread: PostPlace;
  readonly posts: readonly PostPlace[];
}

/** Rows that hold every constraint, without asking each foreign key a million times. */
const FILL = [
  `SET session_replication_role = replica`,
  `INSERT INTO "shop" ("name", "country") VALUES ('Big shop', 'DE'), ('Usual shop', 'DE')`,
  `INSERT INTO "account" ("email", "display_name", "password_hash")
     SELECT 'writer-' || n || '@bench.test', 'Writer ' || n, '!' FROM generate_series(1, ${WRITERS}) n`,
  `INSERT INTO "account" ("email", "display_name", "password_hash") VALUES ('usual@bench.test', 'Usual reader', '!')`,
  `INSERT INTO "shop_member" ("shop_id", "account_id", "role")
     SELECT s."id", a."id", 'owner' FROM "shop" s JOIN "account" a ON (s."name" = 'Usual shop') = (a."email" = 'usual@bench.test')`,
  `INSERT INTO "commission" ("code", "title", "brief", "state", "lead_name", "client_name", "date_wanted", "created_at", "updated_at", "member_keys")
     SELECT lpad(to_hex(n), 8, '0'), 'Hilt with turned collar ' || n, repeat('A brief of some length. ', 20),
       (ARRAY['in-brief', 'at-work', 'at-work', 'delivered'])[1 + n % 4], 'Big shop', 'Client ' || n, date '2031-01-01' + n % 700,
       now() - interval '900 days', now() - make_interval(mins => n),
       (SELECT array_agg(s."id") FROM "shop" s WHERE s."name" = 'Big shop' OR n % ${COMMISSIONS / USUAL_COMMISSIONS} = 0)
     FROM generate_series(1, ${COMMISSIONS}) n`,
  `INSERT INTO "party" ("commission_id", "roles", "shop_id")
     SELECT c."id", CASE s."name" WHEN 'Big shop' THEN ARRAY['lead', 'maker'] ELSE ARRAY['finisher'] END, s."id"
     FROM "commission" c JOIN "shop" s ON s."id" = ANY(c."member_keys")`,
  `INSERT INTO "thread" ("commission_id", "subject", "subject_id", "title", "audience", "opened_by_party_id", "last_sequence", "last_message_at")
     SELECT c."id", 'commission', c."id", 'All of us', 'everyone', p."id",
       CASE c."code" WHEN '00000001' THEN ${LONG_THREAD_MESSAGES} ELSE ${(ALL_MESSAGES - LONG_THREAD_MESSAGES) / COMMISSIONS} END, now()
     FROM "commission" c JOIN "party" p ON p."commission_id" = c."id" AND 'lead' = ANY(p."roles")`,
  `INSERT INTO "message" ("thread_id", "sequence", "id", "author_account_id", "author_party_id", "body", "created_at")
     SELECT t."id", n, gen_random_uuid(), a."id", t."opened_by_party_id",
       'Message ' || n || ': the collar sits, the pommel thread wants one more light pass before it goes on its way.',
       now() - make_interval(secs => t."last_sequence" - n)
     FROM "thread" t CROSS JOIN LATERAL generate_series(1, t."last_sequence") n
       JOIN "account" a ON a."email" = 'writer-' || (1 + n % ${WRITERS}) || '@bench.test'`,
  `CREATE TABLE "bare_message" ("id" uuid PRIMARY KEY, "thread_id" uuid NOT NULL, "author_account_id" uuid NOT NULL, "body" text NOT NULL, "created_at" timestamptz NOT NULL DEFAULT now())`,
  `SET session_replication_role = DEFAULT`,
  `VACUUM (ANALYZE)`,
  `CHECKPOINT`,
];

async function signedIn(client: pg.Client, accountId: string): Promise<Reader> {
  const sessionId = randomBytes(24).toString('base64url');
  const expires = new Date(Date.now() + SESSION_DAYS * 86_400_000);
  const kept = {
    cookie: { originalMaxAge: SESSION_DAYS * 86_400_000, expires, httpOnly: true, path: '/', sameSite: 'lax' },
    accountId,
    signedInAt: Date.now(),
  };
  await client.query('INSERT INTO "web_session" ("sid", "sess", "expire") VALUES ($1, $2, $3)', [
    sessionId,
    JSON.stringify(kept),
    expires,
  ]);
  // express-session signs `s:<id>.<HMAC-SHA-256 in base 64 without padding>`.
  const signature = createHmac('sha256', SESSION_SECRET).update(sessionId).digest('base64').replace(/=+$/, '');
  return { accountId, sessionId, cookie: `ferrule=${encodeURIComponent(`s:${sessionId}.${signature}`)}` };
}

/** Fills an empty, migrated database: 10,000 commissions and 1,000,000 messages, 100,000 of them in one thread. */
export async function fillDatabase(client: pg.Client): Promise<Data> {
  for (const statement of FILL) await client.query(statement);
  const accounts = await client.query<{ id: string; email: string }>('SELECT "id", "email" FROM "account"');
  const threads = await client.query<{ commission_id: string; id: string; opened_by_party_id: string }>(
    'SELECT "commission_id", "id", "opened_by_party_id" FROM "thread" ORDER BY "last_sequence" DESC, "id" LIMIT 101',
  );
  const shop = await client.query<{ id: string }>(`SELECT "id" FROM "shop" WHERE "name" = 'Big shop'`);
  const [longThread, ...posts] = threads.rows.map((row) => ({
    commissionId: row.commission_id,
    threadId: row.id,
    partyId: row.opened_by_party_id,
  }));
  const usual = accounts.rows.find((row) => row.email === 'usual@bench.test');
  const writers: Reader[] = [];
  for (const row of accounts.rows) if (row !== usual) writers.push(await signedIn(client, row.id));
  const [bigReader] = writers;
  const bigShopId = shop.rows[0]?.id;
  if (!longThread || !usual || !bigReader || !bigShopId) throw new Error('The rows to measure on were not made');
  return { bigReader, usualReader: await signedIn(client, usual.id), writers, bigShopId, longThread, posts };
}
