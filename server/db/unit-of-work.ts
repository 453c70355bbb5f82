import type { DataSource, EntityManager } from 'typeorm';
import { HistoryLine } from '../entities/history-line.ts';
import { OutboxMessage } from '../entities/outbox-message.ts';
import type { Letter } from '../outbox/letters.ts';
import type { RealtimeEvents, RealtimeName } from '../../shared/realtime/events.ts';
import type { EventAudience } from '../outbox/audience.ts';

export interface HistoryWords {
  commissionId: string;
  accountId: string | null;
  subject: string;
  subjectId: string;
  words: string;
  /** Parties that may read it; null for every shop of the commission. */
  partyIds?: string[] | null;
  clientMayRead?: boolean;
}

/** One transaction with what others must hear of it; nothing leaves before the commit. */
export class UnitOfWork {
  readonly #outgoing: { topic: string; payload: Record<string, unknown> }[] = [];
  readonly #history: HistoryWords[] = [];
  readonly manager: EntityManager;

  constructor(manager: EntityManager) {
    this.manager = manager;
  }

  /** Tells browsers, by event name and ids only. Who hears it is worked out when it is sent. */
  announce<N extends RealtimeName>(name: N, event: RealtimeEvents[N], audience: EventAudience): void {
    this.#outgoing.push({ topic: `event:${name}`, payload: { event, audience } });
  }

  /** One letter to one recipient. */
  mail(letter: Letter): void {
    this.#outgoing.push({ topic: `mail:${letter.letter}`, payload: { ...letter } });
  }

  /** Adds a line to what moved in the commission. */
  record(words: HistoryWords): void {
    this.#history.push(words);
  }

  async flush(): Promise<void> {
    if (this.#history.length > 0)
      await this.manager.insert(
        HistoryLine,
        this.#history.map((line) => ({ partyIds: null, clientMayRead: false, ...line })),
      );
    if (this.#outgoing.length > 0)
      await this.manager.insert(
        OutboxMessage,
        this.#outgoing.map(({ topic, payload }) => ({ topic, payload: payload })),
      );
    this.#history.length = 0;
    this.#outgoing.length = 0;
  }
}

/** What a transaction needs of its surroundings: the database, or the unit of work it is to join. */
export interface TransactionScope {
  readonly db: DataSource;
  readonly uow: UnitOfWork | null;
  /** Called after a commit so that the outbox relay looks at once. */
  wakeRelay(): void;
}

/** Runs work in one transaction; inside a keyed request it joins the transaction that also keeps the key's answer. */
export async function inTransaction<T>(scope: TransactionScope, work: (uow: UnitOfWork) => Promise<T>): Promise<T> {
  if (scope.uow) return work(scope.uow);
  const result = await scope.db.transaction(async (manager) => {
    const uow = new UnitOfWork(manager);
    const value = await work(uow);
    await uow.flush();
    return value;
  });
  scope.wakeRelay();
  return result;
}
