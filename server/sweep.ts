import type { DataSource } from 'typeorm';
import type { Env } from './config/env.ts';
import { forgetOldKeys } from './http/idempotency.ts';
import { incomingFolder } from './http/multipart.ts';
import { sweepTempFiles } from './integrations/storage/sweep-temp-files.ts';
import { forgetSentMessages } from './outbox/relay.ts';

/** Uploads under way are younger; what is older was left by a process that was killed. */
const TEMP_FILE_MS = 24 * 60 * 60 * 1000;

/** Clears away what is of no more use: at start and once an hour. */
export async function sweep(db: DataSource, env: Env, now: Date): Promise<void> {
  await Promise.all([
    forgetOldKeys(db.manager),
    forgetSentMessages(db),
    db.query(`DELETE FROM "rate_limit" WHERE "expire" < $1`, [now.getTime()]),
    db.query(`DELETE FROM "password_reset" WHERE "expires_at" < $1::timestamptz - interval '1 day'`, [now]),
    sweepTempFiles(incomingFolder(env.UPLOADS_DIR), TEMP_FILE_MS, now.getTime()),
  ]);
}
