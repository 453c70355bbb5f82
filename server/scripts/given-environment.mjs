import { join } from 'node:path';

/**
 * The application's environment: what the person set wins, the rest is filled in.
 * @param {{ env: Record<string, string | undefined>, folder: string, secrets: import('./secrets.mjs').Secrets, databaseUrl: string, port: number, origin: string }} run
 * @returns {Record<string, string | undefined>}
 */
export const appEnvironment = ({ env, folder, secrets, databaseUrl, port, origin }) => ({
  PUBLIC_ORIGIN: origin,
  SESSION_SECRET: secrets.sessionSecret,
  FIELD_KEY: secrets.fieldKey,
  UPLOADS_DIR: join(folder, 'uploads'),
  MAIL_DIR: join(folder, 'mail'),
  LOG_LEVEL: 'warn',
  ...Object.fromEntries(Object.entries(env).filter(([, value]) => value !== undefined && value !== '')),
  DATABASE_URL: databaseUrl,
  PORT: String(port),
});

/**
 * Address by which this machine reaches the application.
 * @param {string | undefined} host value of HOST
 * @param {number} port
 */
export const localOrigin = (host, port) => {
  const reachable =
    !host || host === '0.0.0.0' || host === '::' ? '127.0.0.1' : host.includes(':') ? `[${host}]` : host;
  return `http://${reachable}:${port}`;
};
