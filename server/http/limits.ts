import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import type { DataSource } from 'typeorm';
import { poolOf } from '../db/data-source.ts';
import { AppError } from '../errors.ts';

/** Tries in a window, per key, counted in PostgreSQL so that every process shares them. */
const DOORS = {
  /** Wrong passwords for one account from one address; a stranger elsewhere cannot lock the owner out. */
  'sign-in-pair': { points: 5, durationS: 15 * 60, blockS: 60 },
  'sign-in-address': { points: 60, durationS: 15 * 60, blockS: 5 * 60 },
  'second-factor': { points: 5, durationS: 15 * 60, blockS: 5 * 60 },
  'reset-email': { points: 3, durationS: 60 * 60, blockS: 0 },
  'reset-address': { points: 20, durationS: 60 * 60, blockS: 0 },
  link: { points: 30, durationS: 15 * 60, blockS: 60 },
  invite: { points: 60, durationS: 60 * 60, blockS: 0 },
  password: { points: 10, durationS: 15 * 60, blockS: 60 },
  /** Any unsafe request of one account. */
  write: { points: 600, durationS: 60, blockS: 0 },
} as const;

export type Door = keyof typeof DOORS;

export interface Limits {
  /** Takes one try; throws `too-many-tries` with the seconds to wait. */
  take(door: Door, key: string): Promise<void>;
  /** Forgets the tries of a key, after a success. */
  forget(door: Door, key: string): Promise<void>;
}

/** @param factor multiplies every allowance; browser tests sign in far more often than people. */
export function createLimits(db: DataSource, factor = 1): Limits {
  const limiters = Object.fromEntries(
    Object.entries(DOORS).map(([door, { points, durationS, blockS }]) => [
      door,
      new RateLimiterPostgres({
        storeClient: poolOf(db),
        storeType: 'pool',
        tableName: 'rate_limit',
        tableCreated: true,
        clearExpiredByTimeout: false,
        keyPrefix: door,
        points: points * factor,
        duration: durationS,
        blockDuration: blockS,
      }),
    ]),
  ) as Record<Door, RateLimiterPostgres>;
  return {
    async take(door, key) {
      try {
        await limiters[door].consume(key);
      } catch (refusal) {
        if (!(refusal instanceof RateLimiterRes)) throw refusal;
        const retryAfterS = Math.max(1, Math.ceil(refusal.msBeforeNext / 1000));
        throw new AppError('too-many-tries', `Nothing is lost. Try again in ${retryAfterS} s.`, { retryAfterS });
      }
    },
    async forget(door, key) {
      await limiters[door].delete(key);
    },
  };
}
