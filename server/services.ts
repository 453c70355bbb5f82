import type { DataSource } from 'typeorm';
import type { Env } from './config/env.ts';
import type { Limits } from './http/limits.ts';
import type { ObjectStorage } from './integrations/storage/object-storage.ts';
import type { Logger } from './logging/logger.ts';

/** What the process is made of; made once at start and handed down. */
export interface Services {
  readonly env: Env;
  readonly db: DataSource;
  readonly log: Logger;
  readonly storage: ObjectStorage;
  readonly limits: Limits;
  /** "Now" is asked for here, so that tests set it. */
  readonly clock: () => Date;
  /** Called after a commit so that the outbox relay looks at once. */
  readonly wakeRelay: () => void;
  /** Ends the live connections of an account whose sessions ended. */
  readonly endConnections: (accountId: string) => void;
}
