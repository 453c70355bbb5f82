import { z } from 'zod';

const flag = z
  .enum(['0', '1'])
  .default('0')
  .transform((value) => value === '1');

const envSchema = z.object({
  NODE_ENV: z.enum(['production', 'development', 'test']).default('production'),
  DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/, error: 'must be a postgres:// address' }),
  DATABASE_POOL_SIZE: z.coerce.number().int().min(1).max(100).default(10),
  HOST: z.string().default('127.0.0.1'),
  PORT: z.coerce.number().int().min(0).max(65535).default(4310),
  /** Address people type; it is the only origin that may change anything. */
  PUBLIC_ORIGIN: z
    .url({ protocol: /^https?$/, error: 'must be an http:// or https:// address' })
    .transform((url) => new URL(url).origin),
  SESSION_SECRET: z.string().min(32, 'must be at least 32 characters'),
  /** Encrypts the second factors' secrets: 32 bytes as hexadecimal. */
  FIELD_KEY: z.string().regex(/^[0-9a-f]{64}$/i, 'must be 64 hexadecimal digits'),
  UPLOADS_DIR: z.string().min(1),
  MAX_UPLOAD_BYTES: z.coerce
    .number()
    .int()
    .min(1024)
    .default(200 * 1024 * 1024),
  WEB_DIR: z.string().optional(),
  MAIL_URL: z.string().optional(),
  MAIL_DIR: z.string().optional(),
  MAIL_FROM: z.string().default('Ferrule <ferrule@localhost>'),
  STORAGE: z.enum(['disk', 's3']).default('disk'),
  S3_ENDPOINT: z.string().optional(),
  S3_BUCKET: z.string().optional(),
  S3_REGION: z.string().default('us-east-1'),
  S3_ACCESS_KEY_ID: z.string().optional(),
  S3_SECRET_ACCESS_KEY: z.string().optional(),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent']).default('info'),
  /** Number of proxies in front that set X-Forwarded-For. */
  TRUST_PROXY: z.coerce.number().int().min(0).max(5).default(0),
  MIGRATE: flag,
  /** Loosens the sign-in limits for browser tests; refused in production. */
  RELAXED_LIMITS: flag,
});

export type Env = z.output<typeof envSchema>;

export class EnvInvalid extends Error {}

/** Reads and checks the environment once, at start. The message names every variable that is wrong and never prints a value. */
export function readEnv(source: NodeJS.ProcessEnv): Env {
  const parsed = envSchema.safeParse(source);
  if (!parsed.success) {
    const lines = parsed.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`);
    throw new EnvInvalid(`The configuration is not usable:\n${lines.join('\n')}`);
  }
  if (parsed.data.RELAXED_LIMITS && parsed.data.NODE_ENV === 'production')
    throw new EnvInvalid('The configuration is not usable:\n  RELAXED_LIMITS: not in production');
  return parsed.data;
}
