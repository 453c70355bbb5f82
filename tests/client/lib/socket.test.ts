import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

type Listener = (...values: unknown[]) => void;

/** Stands in for the library: what it is told to do, and what it may be made to report. */
const library = vi.hoisted(() => {
  class FakeSocket {
    active = false;
    connected = false;
    connects = 0;
    readonly options: Record<string, unknown>;
    readonly listeners = new Map<string, (...values: unknown[]) => void>();
    any: (...values: unknown[]) => void = () => {};
    constructor(options: Record<string, unknown>) {
      this.options = options;
    }
    on(name: string, listener: (...values: unknown[]) => void): void {
      this.listeners.set(name, listener);
    }
    onAny(listener: (...values: unknown[]) => void): void {
      this.any = listener;
    }
    connect(): void {
      this.connects += 1;
    }
    disconnect(): void {
      this.connected = false;
    }
    report(name: string, ...values: unknown[]): void {
      this.listeners.get(name)?.(...values);
    }
  }
  const made: FakeSocket[] = [];
  return {
    made,
    io: (options: Record<string, unknown>) => {
      const socket = new FakeSocket(options);
      made.push(socket);
      return socket;
    },
  };
});
vi.mock('socket.io-client', () => ({ io: library.io }));

const open = async () => {
  const connection = await import('../../../src/lib/socket.ts');
  await connection.openRealtime();
  const socket = library.made.at(-1);
  if (!socket) throw new Error('Nothing was opened');
  return { connection, socket };
};

beforeEach(() => {
  vi.resetModules();
  vi.useFakeTimers();
  library.made.length = 0;
});
afterEach(() => void vi.useRealTimers());

describe('the one connection', () => {
  it('is opened once, by websocket only, and comes back at times of its own', async () => {
    const { connection, socket } = await open();
    await connection.openRealtime();
    expect(library.made).toHaveLength(1);
    expect(socket.options['transports']).toEqual(['websocket']);
    expect(socket.options['randomizationFactor']).toBeGreaterThan(0);
  });

  it('says whether it is up, and tells each connect', async () => {
    const { connection, socket } = await open();
    const heard = vi.fn<Listener>();
    connection.onConnected(heard);
    expect(connection.connectionState.get()).toBe(false);
    socket.report('connect');
    expect(connection.connectionState.get()).toBe(true);
    socket.report('disconnect', 'transport close');
    expect(connection.connectionState.get()).toBe(false);
    socket.report('connect');
    expect(heard).toHaveBeenCalledTimes(2);
  });

  it('gives each event to those who asked for it, as long as they ask', async () => {
    const { connection, socket } = await open();
    const legs = vi.fn<Listener>();
    const parts = vi.fn<Listener>();
    const stop = connection.onRealtime('legs.changed', legs);
    connection.onRealtime('parts.changed', parts);
    socket.any('legs.changed', { commissionId: 'c' });
    socket.any('no.such.event', { commissionId: 'c' });
    stop();
    socket.any('legs.changed', { commissionId: 'c' });
    expect(legs.mock.calls).toEqual([[{ commissionId: 'c' }]]);
    expect(parts).not.toHaveBeenCalled();
  });

  it('is tried again after the server cut it, a little later', async () => {
    const { socket } = await open();
    socket.report('disconnect', 'io server disconnect');
    expect(socket.connects).toBe(0);
    vi.advanceTimersByTime(1200);
    expect(socket.connects).toBe(1);
  });

  it('is left to the library after a lost network: it tries again by itself', async () => {
    const { socket } = await open();
    socket.active = true;
    socket.report('disconnect', 'transport close');
    socket.report('connect_error', new Error('websocket error'));
    vi.advanceTimersByTime(60_000);
    expect(socket.connects).toBe(0);
  });

  it('is tried again after a busy server refused it, which the library does not do', async () => {
    const { connection, socket } = await open();
    const ended = vi.fn<Listener>();
    connection.onSessionEnded(ended);
    socket.report('connect_error', new Error('busy'));
    vi.advanceTimersByTime(8000);
    expect(socket.connects).toBe(1);
    expect(ended).not.toHaveBeenCalled();
  });

  it('tells that the session ended when the server knows nobody behind it', async () => {
    const { connection, socket } = await open();
    const ended = vi.fn<Listener>();
    connection.onSessionEnded(ended);
    socket.report('connect_error', new Error('not-signed-in'));
    expect(ended).toHaveBeenCalledOnce();
  });

  it('stays closed once the person left, and is a new one for the next', async () => {
    const { connection, socket } = await open();
    socket.report('disconnect', 'io server disconnect');
    connection.closeRealtime();
    vi.advanceTimersByTime(60_000);
    expect(socket.connects).toBe(0);
    await connection.openRealtime();
    expect(library.made).toHaveLength(2);
  });

  it('tells nothing while it is down, and says so', async () => {
    const { connection } = await open();
    await expect(connection.tell('thread.leave', { threadId: 't' })).resolves.toEqual({
      ok: false,
      code: 'not-connected',
    });
  });
});
