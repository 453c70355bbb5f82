import { createHash } from 'node:crypto';
import pg from 'pg';
import { RateLimiterMemory, RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import { AppError } from '../errors.ts';

interface DoorPlan {
  readonly points: number;
  readonly durationS: number;
  /** How long a key waits once its tries are used up; 0: until the window ends. */
  readonly blockS: number;
  /** Each further wait within a day is twice as long, up to this. */
  readonly growsToS?: number;
}

/** Tries in a window, per key, counted in PostgreSQL so that they outlive the process. */
const DOORS = {
  /** Wrong passwords for one account from one address; a stranger elsewhere cannot lock the owner out. */
  'sign-in-pair': { points: 5, durationS: 15 * 60, blockS: 60, growsToS: 60 * 60 },
  'sign-in-address': { points: 60, durationS: 15 * 60, blockS: 5 * 60 },
  'second-factor': { points: 5, durationS: 15 * 60, blockS: 5 * 60, growsToS: 60 * 60 },
  'reset-email': { points: 3, durationS: 60 * 60, blockS: 0 },
  'reset-address': { points: 20, durationS: 60 * 60, blockS: 0 },
  link: { points: 30, durationS: 15 * 60, blockS: 60 },
  invite: { points: 60, durationS: 60 * 60, blockS: 0 },
  password: { points: 10, durationS: 15 * 60, blockS: 60 },
} as const satisfies Record<string, DoorPlan>;

/** Any unsafe request of one account: a brake on a runaway client, counted in the process, where it costs no statement. */
const WRITES = { points: 600, durationS: 60 };

export type Door = keyof typeof DOORS;

export interface Limits {
  /** Takes one unsafe request of an account; throws as `take`. */
  takeWrite(accountId: string): Promise<void>;
  /** Takes one try; throws `too-many-tries` with the seconds to wait. */
  take(door: Door, key: string): Promise<void>;
  /** Forgets the tries of a key, after a success. */
  forget(door: Door, key: string): Promise<void>;
  close(): Promise<void>;
}

const ONE_DAY_S = 24 * 60 * 60;

/** Keys hold addresses of people: the table gets their hash, which also keeps a long one within its column. */
const hidden = (key: string): string => createHash('sha256').update(key).digest('base64url');

const tooMany = (waitS: number): AppError => {
  const retryAfterS = Math.max(1, Math.ceil(waitS));
  return new AppError('too-many-tries', `Nothing is lost. Try again in ${retryAfterS} s.`, { retryAfterS });
};

/**
 * The counters have two connections of their own: tries are counted inside transactions too, and transactions that wait
 * for a second connection of the same pool can wait for one another.
 * @param factor multiplies every allowance; browser tests sign in far more often than people.
 */
export function createLimits(databaseUrl: string, factor = 1): Limits {
  const pool = new pg.Pool({
    connectionString: databaseUrl,
    max: 2,
    connectionTimeoutMillis: 10_000,
    application_name: 'ferrule limits',
    // A count lost with the database's last half second hurts nobody; waiting for the disk at each write hurts everyone.
    options: '-c synchronous_commit=off',
  });
  // An idle connection that breaks is replaced at the next try; unheard, the event would end the process.
  pool.on('error', () => undefined);
  const limiter = (keyPrefix: string, points: number, durationS: number, blockS: number): RateLimiterPostgres =>
    new RateLimiterPostgres({
      storeClient: pool,
      storeType: 'pool',
      tableName: 'rate_limit',
      tableCreated: true,
      clearExpiredByTimeout: false,
      keyPrefix,
      points,
      duration: durationS,
      blockDuration: blockS,
    });
  const doors = new Map<Door, RateLimiterPostgres>();
  /** Counts how often a key had to wait. */
  const waits = new Map<Door, RateLimiterPostgres>();
  for (const [door, plan] of Object.entries<DoorPlan>(DOORS) as [Door, DoorPlan][]) {
    doors.set(door, limiter(door, plan.points * factor, plan.durationS, plan.blockS));
    if (plan.growsToS) waits.set(door, limiter(`${door}-waits`, Number.MAX_SAFE_INTEGER, ONE_DAY_S, 0));
  }

  /** Seconds to wait: at the first refusal of a row of tries the wait begins, longer each time. */
  async function refusedForS(door: Door, key: string, refusal: RateLimiterRes): Promise<number> {
    const { points, blockS, growsToS }: DoorPlan = DOORS[door];
    const counter = waits.get(door);
    if (!counter || !growsToS || refusal.consumedPoints !== points * factor + 1) return refusal.msBeforeNext / 1000;
    const { consumedPoints: count } = await counter.consume(key);
    const waitS = Math.min(growsToS, blockS * 2 ** (count - 1));
    await doors.get(door)?.block(key, waitS);
    return waitS;
  }

  const writes = new RateLimiterMemory({ points: WRITES.points * factor, duration: WRITES.durationS });

  return {
    async takeWrite(accountId) {
      try {
        await writes.consume(accountId);
      } catch (refusal) {
        if (!(refusal instanceof RateLimiterRes)) throw refusal;
        throw tooMany(refusal.msBeforeNext / 1000);
      }
    },
    async take(door, key) {
      const hiddenKey = hidden(key);
      try {
        await doors.get(door)?.consume(hiddenKey);
      } catch (refusal) {
        if (!(refusal instanceof RateLimiterRes)) throw refusal;
        throw tooMany(await refusedForS(door, hiddenKey, refusal));
      }
    },
    async forget(door, key) {
      const hiddenKey = hidden(key);
      await doors.get(door)?.delete(hiddenKey);
      await waits.get(door)?.delete(hiddenKey);
    },
    close: () => pool.end(),
  };
}
