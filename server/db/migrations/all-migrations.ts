import { FirstSchema1796127050254 } from './1796127050254-first-schema.ts';

/** Every migration in order. */
export const ALL_MIGRATIONS = [FirstSchema1796127050254];
