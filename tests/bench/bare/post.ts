import express from 'express';
import pg from 'pg';
import type { BarePostSettings } from './settings.ts';

/** One INSERT behind Express and pg: no session, no rights, no sequence, no outbox. */
const settings = JSON.parse(process.env['BARE_SETTINGS'] ?? '') as BarePostSettings;
const pool = new pg.Pool({ connectionString: settings.databaseUrl, max: 10 });
const app = express();
app.disable('x-powered-by');
app.get('/ready', (_req, res) => void res.json({}));
app.use(express.json());
app.post('/threads/:threadId/messages', async (req, res) => {
  const { id, body } = req.body as { id: string; body: string };
  await pool.query({
    name: 'insert',
    text: 'INSERT INTO "bare_message" ("id", "thread_id", "author_account_id", "body") VALUES ($1, $2, $3, $4)',
    values: [id, req.params.threadId, req.get('x-account'), body],
  });
  res.status(201).json({ id, body });
});

app.listen(settings.port, '127.0.0.1');
process.on('SIGTERM', () => process.exit(0));
