import { createHash } from 'node:crypto';
import { readdir, readFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { fileURLToPath } from 'node:url';
import pg from 'pg';

const MIGRATIONS = fileURLToPath(new URL('../../server/db/migrations/', import.meta.url));
const TEST_NAME = /^ferrule_[a-z0-9]+_test_\d+_\d+$/;
const DUPLICATE_DATABASE = '42P04';
/** Throw-away clusters live in one of these and nowhere else. */
const THROW_AWAY_PLACES = [tmpdir(), '/var/tmp', '/tmp'];

let made = 0;

export interface TestDatabaseOptions {
  /** What to copy: the migrated template unless said otherwise; `template0` gives an empty database. */
  template?: string;
  /** Lower-case word that ends up in the name. */
  purpose?: string;
}

/** The name of the template that holds the schema of the migrations as they are now. */
export async function migratedTemplateName(): Promise<string> {
  const hash = createHash('sha256');
  for (const file of (await readdir(MIGRATIONS)).sort())
    hash.update(file).update(await readFile(`${MIGRATIONS}${file}`));
  return `ferrule_template_${hash.digest('hex').slice(0, 16)}`;
}

/** Makes a database for one test file and gives its address. */
export async function createTestDatabase(adminUrl: string, options: TestDatabaseOptions = {}): Promise<string> {
  const template = options.template ?? (await migratedTemplateName());
  return withAdmin(adminUrl, async (client) => {
    for (;;) {
      made += 1;
      const name = `ferrule_${options.purpose ?? 'api'}_test_${process.pid}_${made}`;
      try {
        await client.query(`CREATE DATABASE ${quoted(name)} TEMPLATE ${quoted(template)} STRATEGY FILE_COPY`);
        return databaseUrlOf(adminUrl, name);
      } catch (error) {
        // Left by an earlier process with our number.
        if ((error as { code?: string }).code !== DUPLICATE_DATABASE) throw error;
      }
    }
  });
}

/** True when `name` is one that createTestDatabase gives, so that nothing else is ever dropped. */
export const isTestDatabaseName = (name: string): boolean => TEST_NAME.test(name);

/**
 * Drops a database that createTestDatabase made. Refuses any other name, any other server than `adminUrl`, and any
 * server that is not marked as a throw-away one living in a temporary folder.
 */
export async function dropTestDatabase(adminUrl: string, databaseUrl: string): Promise<void> {
  const admin = new URL(adminUrl);
  const target = new URL(databaseUrl);
  const name = target.pathname.slice(1);
  if (!isTestDatabaseName(name)) throw new Error(`Refused to drop "${name}": it is not a test database`);
  if (target.host !== admin.host) throw new Error(`Refused to drop "${name}": it is on another server`);
  await withAdmin(adminUrl, async (client) => {
    await assertThrowAway(client);
    await client.query(`DROP DATABASE IF EXISTS ${quoted(name)} WITH (FORCE)`);
  });
}

/** Drops what test runs that were killed left behind. */
export async function dropAbandonedDatabases(adminUrl: string): Promise<void> {
  await withAdmin(adminUrl, async (client) => {
    await assertThrowAway(client);
    const { rows } = await client.query<{ datname: string }>(
      "SELECT datname FROM pg_database WHERE datname LIKE 'ferrule\\_%\\_test\\_%'",
    );
    for (const { datname } of rows) {
      const owner = Number(/_test_(\d+)_\d+$/.exec(datname)?.[1]);
      if (isTestDatabaseName(datname) && !isRunning(owner))
        await client.query(`DROP DATABASE IF EXISTS ${quoted(datname)} WITH (FORCE)`);
    }
  });
}

/** Makes the migrated template once for these migrations; concurrent runs wait for one another. */
export async function ensureMigratedTemplate(
  adminUrl: string,
  migrate: (databaseUrl: string) => Promise<void>,
): Promise<void> {
  const name = await migratedTemplateName();
  await withAdmin(adminUrl, async (client) => {
    await assertThrowAway(client);
    await client.query("SELECT pg_advisory_lock(hashtext('ferrule migrated template'))");
    const { rowCount } = await client.query('SELECT FROM pg_database WHERE datname = $1', [name]);
    if (rowCount) return;
    // It gets its name when it is whole: a copy of a half-migrated one would fail in places that are hard to read.
    const unfinished = `${name}_unfinished`;
    await client.query(`DROP DATABASE IF EXISTS ${quoted(unfinished)} WITH (FORCE)`);
    await client.query(`CREATE DATABASE ${quoted(unfinished)} TEMPLATE template0`);
    await migrate(databaseUrlOf(adminUrl, unfinished));
    await client.query(`ALTER DATABASE ${quoted(unfinished)} RENAME TO ${quoted(name)}`);
  });
}

async function assertThrowAway(client: pg.Client): Promise<void> {
  const { rows } = await client.query<{ here: string; marked: boolean }>(
    "SELECT current_setting('data_directory') AS here, to_regclass('public.ferrule_throw_away') IS NOT NULL AS marked",
  );
  const { here, marked } = rows[0] ?? { here: '', marked: false };
  const { rowCount } = marked
    ? await client.query('SELECT FROM ferrule_throw_away WHERE data_directory = $1', [here])
    : { rowCount: 0 };
  if (!rowCount || !THROW_AWAY_PLACES.some((place) => here.startsWith(`${place}/ferrule-`)))
    throw new Error(`Refused: the server on ${here} is not marked as a throw-away one`);
}

async function withAdmin<T>(adminUrl: string, work: (client: pg.Client) => Promise<T>): Promise<T> {
  const client = new pg.Client({ connectionString: adminUrl });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}

function databaseUrlOf(adminUrl: string, name: string): string {
  const url = new URL(adminUrl);
  url.pathname = `/${name}`;
  return url.href;
}

const quoted = (name: string): string => pg.escapeIdentifier(name);

function isRunning(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return (error as { code?: string }).code === 'EPERM';
  }
}
