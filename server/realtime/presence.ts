import type { ThreadPresence } from '../../shared/realtime/events.ts';

interface Here {
  accountId: string;
  displayName: string;
  typing: boolean;
}

/** Who is in which thread, in memory only: it is true for as long as the connection is. */
export class Presence {
  readonly #threads = new Map<string, Map<string, Here>>();

  enter(threadId: string, socketId: string, person: { accountId: string; displayName: string }): void {
    const here = this.#threads.get(threadId) ?? new Map<string, Here>();
    here.set(socketId, { accountId: person.accountId, displayName: person.displayName, typing: false });
    this.#threads.set(threadId, here);
  }

  leave(threadId: string, socketId: string): void {
    const here = this.#threads.get(threadId);
    here?.delete(socketId);
    if (here?.size === 0) this.#threads.delete(threadId);
  }

  /** Says whether anything changed. */
  type(threadId: string, socketId: string, typing: boolean): boolean {
    const one = this.#threads.get(threadId)?.get(socketId);
    if (!one || one.typing === typing) return false;
    one.typing = typing;
    return true;
  }

  threadsOf(socketId: string): string[] {
    return [...this.#threads].filter(([, here]) => here.has(socketId)).map(([threadId]) => threadId);
  }

  leaveAll(socketId: string): string[] {
    const threads = this.threadsOf(socketId);
    for (const threadId of threads) this.leave(threadId, socketId);
    return threads;
  }

  /** One entry per person, whatever number of windows they have open. */
  peopleIn(threadId: string): ThreadPresence['people'] {
    const people = new Map<string, Here>();
    for (const one of this.#threads.get(threadId)?.values() ?? [])
      people.set(one.accountId, { ...one, typing: one.typing || (people.get(one.accountId)?.typing ?? false) });
    return [...people.values()];
  }
}
