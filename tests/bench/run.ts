import { cpus, loadavg } from 'node:os';
import pg from 'pg';
import { createDataSource } from '../../server/db/data-source.ts';
import { runMigrations } from '../../server/db/migrate.ts';
import { coldStart } from './measurements/cold-start.ts';
import { deep } from './measurements/deep.ts';
import { fanOut } from './measurements/fan-out.ts';
import { firstLoad } from './measurements/first-load.ts';
import { pages } from './measurements/pages.ts';
import { post } from './measurements/post.ts';
import { upload } from './measurements/upload.ts';
import type { Bench, Measurement } from './support/bench.ts';
import { pinLoadAndDatabase } from './support/cores.ts';
import { fillDatabase, type Data } from './support/data.ts';
import { printTable } from './support/report.ts';

const MEASUREMENTS: Readonly<Record<string, Measurement>> = {
  pages,
  post,
  'fan-out': fanOut,
  deep,
  upload,
  'cold-start': coldStart,
  'first-load': firstLoad,
};

const say = (words: string): void => void process.stdout.write(`${words}\n`);

const asked = process.argv.slice(2);
const unknown = asked.filter((name) => !(name in MEASUREMENTS));
const databaseUrl = process.env['DATABASE_URL'];
if (unknown.length > 0 || !databaseUrl) {
  say(`Usage: npm run bench -- [${Object.keys(MEASUREMENTS).join('] [')}]`);
  say('BENCH_ROUNDS: pairs of slices (8); BENCH_SLICE_S: seconds of a slice (2)');
  process.exit(2);
}

await runMigrations(databaseUrl);
const client = new pg.Client({ connectionString: databaseUrl });
await client.connect();
const placed = await pinLoadAndDatabase(client);
const db = createDataSource(databaseUrl, 2);
await db.initialize();
let filled: Promise<Data> | undefined;
const bench: Bench = {
  databaseUrl,
  client,
  db,
  data: () => (filled ??= fillDatabase(client)),
  rounds: Number(process.env['BENCH_ROUNDS'] ?? 8),
  sliceSeconds: Number(process.env['BENCH_SLICE_S'] ?? 2),
};

const { rows } = await client.query<{ server_version: string }>('SHOW server_version');
say(
  `Node ${process.version}, PostgreSQL ${rows[0]?.server_version ?? '?'}, ${cpus().length} cores (${cpus()[0]?.model ?? '?'})`,
);
say(`${placed}; ${new Date().toISOString().slice(0, 10)}`);

let failed = false;
try {
  for (const [name, measurement] of Object.entries(MEASUREMENTS)) {
    if (asked.length > 0 && !asked.includes(name)) continue;
    try {
      printTable(`${measurement.title} (${name})`, await measurement.run(bench));
    } catch (error) {
      failed = true;
      say(
        `\n### ${measurement.title} (${name})\n\nvoid: ${error instanceof Error ? (error.stack ?? error.message) : String(error)}`,
      );
    }
    say(`\nLoad of the machine over the last minute: ${(loadavg()[0] ?? 0).toFixed(1)}`);
  }
} finally {
  await db.destroy();
  await client.end();
}
process.exit(failed ? 1 : 0);
