import express from 'express';
import pg from 'pg';
import { showCode } from '../../../shared/engines/codes/crockford.ts';
import { encodeCursor } from '../../../server/queries/keyset.ts';
import { presentMessage, type MessageRow } from '../../../server/queries/threads/list-messages.ts';
import type { BarePageSettings, Statement } from './settings.ts';

/** What Express and pg take for the same pages by themselves: the same statement, pool, rows and bytes, no session. */
const settings = JSON.parse(process.env['BARE_SETTINGS'] ?? '') as BarePageSettings;
const pool = new pg.Pool({ connectionString: settings.databaseUrl, max: 10 });
const app = express();
app.disable('x-powered-by');
app.get('/ready', (_req, res) => void res.json({}));

interface ListRow {
  id: string;
  code: string;
  title: string;
  state: string;
  lead_name: string;
  client_name: string | null;
  your_roles: string[] | null;
  date_wanted: string | null;
  cover_file_id: string | null;
  held_legs: number;
  updated_at: Date;
  updated_mark: string;
}

async function listPage(statement: Statement, limit: number): Promise<object> {
  const { rows } = await pool.query<ListRow>({ ...statement });
  const shown = rows.slice(0, limit);
  const last = shown.at(-1);
  return {
    items: shown.map((row) => ({
      id: row.id,
      code: showCode(row.code),
      title: row.title,
      state: row.state,
      leadName: row.lead_name,
      clientName: row.client_name,
      yourRoles: row.your_roles ?? [],
      dateWanted: row.date_wanted,
      coverFileId: row.cover_file_id,
      heldLegs: row.held_legs,
      updatedAt: row.updated_at.toISOString(),
    })),
    nextCursor: rows.length > limit && last ? encodeCursor([last.updated_mark, last.id]) : null,
  };
}

for (const [name, page] of Object.entries(settings.pages)) {
  const body = async (): Promise<object> => {
    if (page.kind === 'list') return listPage(page.statement, page.limit);
    const { rows } = await pool.query<MessageRow>({ ...page.statement });
    return { messages: rows.map(presentMessage), lastSequence: page.lastSequence };
  };
  app.get(`/${name}`, async (_req, res) => void res.json(await body()));
  // The same page after the statements that say who is asking, in the order the application sends them.
  app.get(`/${name}-known`, async (_req, res) => {
    for (const statement of page.before) await pool.query({ ...statement });
    res.json(await body());
  });
}

app.listen(settings.port, '127.0.0.1');
process.on('SIGTERM', () => process.exit(0));
