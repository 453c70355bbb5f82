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
const IDLE_POLL_MS = 1000;
/** Events are marked a batch at a time, for hearing one twice is nothing; letters one by one, for getting one twice is noticed. */
const BATCHES = { event: 100, mail: 1 } as const;
/** About a day of tries; a letter that nobody takes for so long is told to the steward's log, and its link's token is dropped. */
const GIVE_UP_AFTER = 150;

export type OutboxKind = keyof typeof BATCHES;
/** A message that fails waits twice as long each time, up to ten minutes. */
const backoffS = (attempts: number): number => Math.min(600, 2 ** attempts);

/**
 * Sends what committed transactions left in the outbox: claim under a lease, commit, send, mark. Delivery is at least
 * once; a crash between send and mark sends again, so handlers are idempotent. Rows are found by `sent_at IS NULL` and
 * not by "id above the last", since ids do not follow the order of commits. Each kind has a relay of its own: a mail
 * server that does not answer must not hold up what is said in a thread.
 */
export class OutboxRelay {
  readonly #db: DataSource;
  readonly #log: Logger;
  readonly #kind: OutboxKind;
  readonly #handle: OutboxHandler;
  #timer: NodeJS.Timeout | undefined;
  #running: Promise<void> | undefined;
  #again = false;
  #stopped = false;

  constructor(db: DataSource, log: Logger, kind: OutboxKind, handle: OutboxHandler) {
    this.#db = db;
    this.#log = log;
    this.#kind = kind;
    this.#handle = handle;
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
      if (batch.length < BATCHES[this.#kind] || this.#stopped) return;
    }
  }

  async #claim(): Promise<OutgoingMessage[]> {
    const [rows] = await this.#db.query<[OutgoingMessage[], number]>(
      `UPDATE "outbox_message" SET "leased_until" = now() + make_interval(secs => $1), "attempts" = "attempts" + 1
        WHERE "id" IN (
          SELECT "id" FROM "outbox_message"
           WHERE "sent_at" IS NULL AND ("leased_until" IS NULL OR "leased_until" < now()) AND starts_with("topic", $3)
           ORDER BY "id" LIMIT $2 FOR UPDATE SKIP LOCKED)
        RETURNING "id", "topic", "payload", "attempts"`,
      [LEASE_S, BATCHES[this.#kind], `${this.#kind}:`],
    );
    return rows.sort((one, other) => (BigInt(one.id) < BigInt(other.id) ? -1 : 1));
  }

  /** @returns whether the message is done with */
  async #send(message: OutgoingMessage): Promise<boolean> {
    const about = { topic: message.topic, attempts: message.attempts };
    try {
      await this.#handle(message);
      return true;
    } catch (error) {
      if (message.attempts >= GIVE_UP_AFTER) {
        this.#log.error({ err: error, ...about }, 'outbox message given up');
        return true;
      }
      this.#log.warn({ err: error, ...about }, 'outbox message not sent');
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
