import { poolOf } from '../../server/db/data-source.ts';
import type { TestApp } from './test-app.ts';

/**
 * How many statements go to the database while `act` runs, over every connection of the application's pool. The relay
 * must be stopped before, since it looks into the outbox by itself.
 */
export async function statementsDuring(app: TestApp, act: () => Promise<unknown>): Promise<string[]> {
  const pool = poolOf(app.services.db);
  const seen: string[] = [];
  const note = (args: unknown[]): void => {
    const [query] = args;
    seen.push(typeof query === 'string' ? query : String((query as { text?: unknown } | undefined)?.text));
  };
  const watched = new Map<object, (...args: unknown[]) => unknown>();
  const watch = (client: object): void => {
    if (watched.has(client)) return;
    const target = client as { query: (...args: unknown[]) => unknown };
    const original = target.query;
    watched.set(client, original);
    target.query = function (this: unknown, ...args: unknown[]) {
      note(args);
      return original.apply(this, args);
    };
  };
  // `pool.query` takes a connection and asks it, so that watching connections sees those statements too.
  pool.on('acquire', watch);
  try {
    await act();
  } finally {
    pool.off('acquire', watch);
    for (const [client, original] of watched) Object.assign(client, { query: original });
  }
  return seen;
}
