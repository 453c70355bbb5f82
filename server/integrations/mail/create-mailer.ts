import { join } from 'node:path';
import type { Env } from '../../config/env.ts';
import { createCatcherMailer } from './catcher-mailer.ts';
import type { Mailer } from './mailer.ts';
import { createSmtpMailer } from './smtp-mailer.ts';

/** SMTP where `MAIL_URL` says so; else letters are caught in `MAIL_DIR`, or in `mail` below the uploads. */
export function createMailer(env: Pick<Env, 'MAIL_URL' | 'MAIL_DIR' | 'MAIL_FROM' | 'UPLOADS_DIR'>): Mailer {
  if (env.MAIL_URL !== undefined && env.MAIL_URL !== '') return createSmtpMailer(env.MAIL_URL, env.MAIL_FROM);
  return createCatcherMailer(env.MAIL_DIR ?? join(env.UPLOADS_DIR, 'mail'), env.MAIL_FROM);
}
