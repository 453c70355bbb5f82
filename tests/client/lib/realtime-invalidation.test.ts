import { QueryClient, QueryObserver } from '@tanstack/react-query';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { createBatch, followRealtime, INVALIDATIONS } from '../../../src/app/realtime-invalidation.ts';
import { keys } from '../../../src/lib/query-keys.ts';
import type { RealtimeEvents, RealtimeName } from '../../../shared/realtime/events.ts';

const wire = vi.hoisted(() => ({
  events: new Map<string, (event: unknown) => void>(),
  connected: () => {},
  ended: () => {},
}));
vi.mock('../../../src/lib/socket.ts', () => ({
  onRealtime: (name: string, listener: (event: unknown) => void) => void wire.events.set(name, listener),
  onConnected: (listener: () => void) => void (wire.connected = listener),
  onSessionEnded: (listener: () => void) => void (wire.ended = listener),
}));

const C = '0f9b1c9e-7c55-4c0e-9a53-1c1d5f3a0001';
const OTHER = '0f9b1c9e-7c55-4c0e-9a53-1c1d5f3a0002';
const J = '0f9b1c9e-7c55-4c0e-9a53-1c1d5f3a0003';
const J2 = '0f9b1c9e-7c55-4c0e-9a53-1c1d5f3a0004';

const keysOf = <N extends RealtimeName>(name: N, event: RealtimeEvents[N]): string[] =>
  INVALIDATIONS[name](event).map((key) => JSON.stringify(key));

/** Queries that are held and no longer fresh. */
const staleIn = (client: QueryClient): string[] =>
  client
    .getQueryCache()
    .getAll()
    .filter((query) => query.state.isInvalidated)
    .map((query) => JSON.stringify(query.queryKey));

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

describe('what an event makes stale', () => {
  it('is the record it names and the lists it stands in, and no other record', () => {
    const client = new QueryClient();
    const held = [keys.joints.detail(C, J), keys.joints.detail(C, J2), keys.joints.lists(C), keys.joints.lists(OTHER)];
    for (const key of held) client.setQueryData(key, {});
    followRealtime(client);
    wire.events.get('joint.changed')?.({ commissionId: C, jointId: J });
    vi.advanceTimersByTime(250);
    expect(staleIn(client)).toEqual([keys.joints.detail(C, J), keys.joints.lists(C)].map((key) => JSON.stringify(key)));
  });

  it('never is a message: those come by sequence', () => {
    expect(keysOf('thread.message-added', { commissionId: C, threadId: J, sequence: 4 })).not.toContain(
      JSON.stringify(keys.threads.messages(C, J)),
    );
  });

  it('is the reader and all of the commission when their rights changed', () => {
    const stale = keysOf('membership.changed', { commissionId: C });
    expect(stale).toContain(JSON.stringify(keys.me()));
    expect(stale).toContain(JSON.stringify(keys.commission(C)));
  });

  it('lets go of what was fetched of a commission, when rights in it changed', () => {
    const client = new QueryClient();
    client.setQueryData(keys.joints.lists(C), ['secret']);
    client.setQueryData(keys.joints.lists(OTHER), ['kept']);
    followRealtime(client);
    wire.events.get('membership.changed')?.({ commissionId: C });
    expect(client.getQueryData(keys.joints.lists(C))).toBeUndefined();
    expect(client.getQueryData(keys.joints.lists(OTHER))).toEqual(['kept']);
  });

  it('includes what happened, for each act that leaves a line there', () => {
    const inCommission = { commissionId: C };
    const line = JSON.stringify(keys.history.list(C));
    expect(keysOf('commission.changed', inCommission)).toContain(line);
    expect(keysOf('parties.changed', inCommission)).toContain(line);
    expect(keysOf('parts.changed', inCommission)).toContain(line);
    expect(keysOf('legs.changed', inCommission)).toContain(line);
    expect(keysOf('joint.changed', { ...inCommission, jointId: J })).toContain(line);
    expect(keysOf('fit-report.changed', { ...inCommission, jointId: J, reportId: J2 })).toContain(line);
    expect(keysOf('consent.changed', inCommission)).toContain(line);
    expect(keysOf('handoff.changed', { ...inCommission, handoffId: J })).toContain(line);
  });
});

describe('the batch', () => {
  it('makes each key stale once for fifty events of one window', () => {
    const invalidateQueries = vi.fn(() => Promise.resolve());
    const add = createBatch({ invalidateQueries });
    for (let count = 0; count < 50; count += 1) add([keys.legs.list(C), keys.bench()]);
    vi.advanceTimersByTime(249);
    expect(invalidateQueries).not.toHaveBeenCalled();
    vi.advanceTimersByTime(1);
    expect(invalidateQueries.mock.calls).toEqual([[{ queryKey: keys.legs.list(C) }], [{ queryKey: keys.bench() }]]);
  });

  it('does not wait for a storm to end: a window begins with its first event', () => {
    const invalidateQueries = vi.fn(() => Promise.resolve());
    const add = createBatch({ invalidateQueries });
    for (let at = 0; at < 1000; at += 100) {
      add([keys.bench()]);
      vi.advanceTimersByTime(100);
    }
    expect(invalidateQueries.mock.calls.length).toBeGreaterThanOrEqual(3);
  });
});

describe('at each connect, the first one too', () => {
  it('asks again for what events would have told, and leaves messages to their thread', () => {
    const client = new QueryClient();
    const live = [keys.me(), keys.bench(), keys.commissions.lists(), keys.standing.detail(C)];
    for (const key of [...live, keys.threads.messages(C, J), keys.shops.members(J), ['open-api']])
      client.setQueryData(key, {});
    followRealtime(client);
    wire.connected();
    expect(staleIn(client)).toEqual(live.map((key) => JSON.stringify(key)));
  });

  it('asks who is reading when the server no longer knows', async () => {
    const client = new QueryClient();
    const queryFn = vi.fn(() => Promise.resolve({ id: J }));
    client.setQueryData(keys.me(), { id: J });
    const stop = new QueryObserver(client, { queryKey: keys.me(), queryFn, staleTime: Infinity }).subscribe(() => {});
    followRealtime(client);
    expect(queryFn).not.toHaveBeenCalled();
    wire.ended();
    await vi.runAllTimersAsync();
    expect(queryFn).toHaveBeenCalledTimes(1);
    stop();
  });
});
