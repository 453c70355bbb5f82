import { FirstSchema1796127050254 } from './1796127050254-first-schema.ts';
import { DroppedHandoffs1796141000000 } from './1796141000000-dropped-handoffs.ts';
import { PartyIndexes1796134200000 } from './1796134200000-party-indexes.ts';

/** Every migration in order. */
export const ALL_MIGRATIONS = [FirstSchema1796127050254, PartyIndexes1796134200000, DroppedHandoffs1796141000000];
