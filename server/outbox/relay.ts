import type { DataSource } from 'typeorm';
import type { Logger } from '../logging/logger.ts';

export interface OutgoingMessage {
  id: string;
  topic: string;
  payload: Record<string, unknown>;
  attempts: number;
}

export type OutboxHandler = (message: OutgoingMessage) => Promise<void>;

const LEASE_S = 30;
const BATCH = 100;
const IDLE_POLL_MS = 1000;
/** A message that fails waits twice as long each time, up to ten minutes. */
const backoffS = (attempts: number): number => Math.min(600, 2 ** attempts);

/**
 * Sends what committed transactions left in the outbox: claim under a lease, commit, send, mark. Delivery is at least
 * once; a crash between send and mark sends again, so handlers are idempotent. Rows are found by `sent_at IS NULL` and
 * not by "id above the last", since ids do not follow the order of commits.
 */
export class OutboxRelay {
  readonly #db: DataSource;
  readonly #log: Logger;
  readonly #handlers: Readonly<Record<'event' | 'mail', OutboxHandler>>;
  #timer: NodeJS.Timeout | undefined;
  #running: Promise<void> | undefined;
  #again = false;
  #stopped = false;

  constructor(db: DataSource, log: Logger, handlers: Readonly<Record<'event' | 'mail', OutboxHandler>>) {
    this.#db = db;
    this.#log = log;
    this.#handlers = handlers;
  }

  start(): void {
    this.#timer = setInterval(() => this.wake(), IDLE_POLL_MS);
    this.wake();
  }

  /** Looks at once; calls while it is looking make it look once more. */
  wake(): void {
    if (this.#stopped) return;
    if (this.#running) {
      this.#again = true;
      return;
    }
    this.#running = this.#drain()
      .catch((error: unknown) => this.#log.warn({ err: error }, 'outbox relay will try again'))
      .finally(() => {
        this.#running = undefined;
        if (this.#again) {
          this.#again = false;
          this.wake();
        }
      });
  }

  async stop(): Promise<void> {
    this.#stopped = true;
    clearInterval(this.#timer);
    await this.#running;
  }

  async #drain(): Promise<void> {
    for (;;) {
      const batch = await this.#claim();
      const heard: string[] = [];
      for (const message of batch) if (await this.#send(message)) heard.push(message.id);
      if (heard.length > 0) await this.#markSent(heard);
      if (batch.length < BATCH || this.#stopped) return;
    }
  }

  async #claim(): Promise<OutgoingMessage[]> {
    const [rows] = await this.#db.query<[OutgoingMessage[], number]>(
      `UPDATE "outbox_message" SET "leased_until" = now() + make_interval(secs => $1), "attempts" = "attempts" + 1
        WHERE "id" IN (
          SELECT "id" FROM "outbox_message" WHERE "sent_at" IS NULL AND ("leased_until" IS NULL OR "leased_until" < now())
           ORDER BY "id" LIMIT $2 FOR UPDATE SKIP LOCKED)
        RETURNING "id", "topic", "payload", "attempts"`,
      [LEASE_S, BATCH],
    );
    return rows.sort((one, other) => (BigInt(one.id) < BigInt(other.id) ? -1 : 1));
  }

  /** @returns whether the message is still to be marked: events are marked a batch at a time, a letter at once. */
  async #send(message: OutgoingMessage): Promise<boolean> {
    const kind = message.topic.startsWith('mail:') ? 'mail' : 'event';
    try {
      await this.#handlers[kind](message);
      // Hearing an event twice is nothing; getting a letter twice is noticed.
      if (kind === 'mail') await this.#markSent([message.id]);
      return kind === 'event';
    } catch (error) {
      this.#log.warn({ err: error, topic: message.topic, attempts: message.attempts }, 'outbox message not sent');
      await this.#db.query(
        `UPDATE "outbox_message" SET "leased_until" = now() + make_interval(secs => $2) WHERE "id" = $1`,
        [message.id, backoffS(message.attempts)],
      );
      return false;
    }
  }

  /** A letter's payload holds the token of its link, which is nowhere else but hashed; it goes once the letter is out. */
  async #markSent(ids: readonly string[]): Promise<void> {
    await this.#db.query(
      `UPDATE "outbox_message" SET "sent_at" = now(), "payload" = '{}'::jsonb WHERE "id" = ANY($1)`,
      [ids],
    );
  }
}

/** Sent rows are of no more use after a day. */
export const forgetSentMessages = (db: DataSource): Promise<unknown> =>
  db.query(`DELETE FROM "outbox_message" WHERE "sent_at" < now() - interval '1 day'`);
