import type { Socket } from 'socket.io-client';
import {
  PRESENCE_EVENT,
  REALTIME_EVENTS,
  type Acknowledgement,
  type ClientEventName,
  type ClientEvents,
  type RealtimeEvents,
  type RealtimeName,
  type ThreadPresence,
} from '../../shared/realtime/events.ts';

type Listener<T> = (value: T) => void;

const events = new Map<RealtimeName, Set<Listener<never>>>();
const connected = new Set<() => void>();
const states = new Set<Listener<boolean>>();
const presence = new Set<Listener<ThreadPresence>>();
const refused = new Set<() => void>();
let socket: Socket | null = null;
let isUp = false;

/** Waits before connecting again where the library does not do it, in milliseconds; spread, so that not all come at once. */
const AFTER_CUT_MS = { least: 300, most: 1200 };
const AFTER_REFUSAL_MS = { least: 2000, most: 8000 };

const setUp = (up: boolean): void => {
  isUp = up;
  for (const listener of states) listener(up);
};

const spread = ({ least, most }: typeof AFTER_CUT_MS): number => least + Math.random() * (most - least);

/** Opens the one connection of this page; the library is loaded only then. Calling again does nothing. */
export async function openRealtime(): Promise<void> {
  if (socket) return;
  const library = await import('socket.io-client').catch(() => null);
  if (socket) return;
  if (!library) {
    setTimeout(() => void openRealtime(), spread(AFTER_REFUSAL_MS));
    return;
  }
  // The server's own jitter: a restart must not bring every browser back in the same instant.
  const made = library.io({
    transports: ['websocket'],
    reconnectionDelay: 500,
    reconnectionDelayMax: 8000,
    randomizationFactor: 0.6,
  });
  socket = made;
  const again = (wait: typeof AFTER_CUT_MS): void => {
    setTimeout(() => {
      if (socket === made) made.connect();
    }, spread(wait));
  };
  made.on('connect', () => {
    setUp(true);
    for (const listener of connected) listener();
  });
  made.on('disconnect', (reason) => {
    setUp(false);
    // The server cuts connections whose rights changed; the library does not come back from that by itself. The short
    // wait lets the answer of the act that cut us arrive first, with the session that takes the old one's place.
    if (reason === 'io server disconnect') again(AFTER_CUT_MS);
  });
  made.on('connect_error', (error) => {
    setUp(false);
    // While it is active the library tries again by itself; it gives up where the server answered with a refusal.
    if (made.active) return;
    if (error.message === 'not-signed-in') for (const listener of refused) listener();
    again(AFTER_REFUSAL_MS);
  });
  made.onAny((name: string, payload: unknown) => {
    if (name === PRESENCE_EVENT) for (const listener of presence) listener(payload as ThreadPresence);
    else if (name in REALTIME_EVENTS)
      for (const listener of events.get(name as RealtimeName) ?? []) (listener as Listener<unknown>)(payload);
  });
}

/** Ends the connection, at sign-out: another person may sign in on this page. */
export function closeRealtime(): void {
  socket?.disconnect();
  socket = null;
  setUp(false);
}

const subscribe = <T>(listeners: Set<T>, listener: T): (() => void) => {
  listeners.add(listener);
  return () => void listeners.delete(listener);
};

export function onRealtime<N extends RealtimeName>(name: N, listener: Listener<RealtimeEvents[N]>): () => void {
  const listeners = (events.get(name) ?? new Set()) as unknown as Set<Listener<RealtimeEvents[N]>>;
  events.set(name, listeners);
  return subscribe(listeners, listener);
}

/** Called at each connect: what happened in between was not heard and has to be asked for. */
export const onConnected = (listener: () => void): (() => void) => subscribe(connected, listener);

/** Called when the server knows nobody behind this connection any more: the session ended, here or elsewhere. */
export const onSessionEnded = (listener: () => void): (() => void) => subscribe(refused, listener);

export const onPresence = (listener: Listener<ThreadPresence>): (() => void) => subscribe(presence, listener);

/** For `useSyncExternalStore`: whether the connection is up. */
export const connectionState = {
  subscribe: (listener: () => void): (() => void) => subscribe(states, listener as Listener<boolean>),
  get: (): boolean => isUp,
};

/** Tells the server something that lives only as long as the connection does; without one it is dropped. */
export async function tell<N extends ClientEventName>(name: N, event: ClientEvents[N]): Promise<Acknowledgement> {
  if (!socket?.connected) return { ok: false, code: 'not-connected' };
  return (await socket
    .timeout(5000)
    .emitWithAck(name, event)
    .catch(() => ({ ok: false, code: 'not-answered' }))) as Acknowledgement;
}
