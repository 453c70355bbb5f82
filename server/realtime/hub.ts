import type { Server as HttpServer } from 'node:http';
import type { RequestHandler } from 'express';
import { Server, type DefaultEventsMap, type Socket } from 'socket.io';
import {
  CLIENT_EVENTS,
  PRESENCE_EVENT,
  REALTIME_EVENTS,
  type Acknowledgement,
  type ClientEventName,
  type RealtimeName,
} from '../../shared/realtime/events.ts';
import { comesFromOwnOrigin } from '../http/middleware/same-origin.ts';
import { keysOf, type EventAudience } from '../outbox/audience.ts';
import type { OutgoingMessage } from '../outbox/relay.ts';
import type { Services } from '../services.ts';
import { forgetHandshakes } from './forget-handshake.ts';
import { handshakeAccountId } from './handshake-session.ts';
import { Presence } from './presence.ts';
import { roomsOf, mayReadThread, personOf } from './socket-rights.ts';

interface SocketData {
  accountId: string;
  displayName: string;
}
type AppServer = Server<DefaultEventsMap, DefaultEventsMap, DefaultEventsMap, SocketData>;
type AppSocket = Socket<DefaultEventsMap, DefaultEventsMap, DefaultEventsMap, SocketData>;

const threadRoom = (threadId: string): string => `thread:${threadId}`;
const keyRoom = (key: string): string => `key:${key}`;

/** The realtime side: rooms by account and shop, presence in threads, and events that the outbox sends. */
export class Hub {
  readonly io: AppServer;
  readonly #services: Services;
  readonly #presence = new Presence();
  readonly #forgetHandshake: ReturnType<typeof forgetHandshakes>;

  constructor(http: HttpServer, services: Services, session: RequestHandler) {
    this.#services = services;
    const { PUBLIC_ORIGIN } = services.env;
    this.io = new Server<DefaultEventsMap, DefaultEventsMap, DefaultEventsMap, SocketData>(http, {
      serveClient: false,
      transports: ['websocket'],
      maxHttpBufferSize: 64 * 1024,
      allowRequest: (req, done) =>
        done(
          null,
          comesFromOwnOrigin({ origin: req.headers.origin, fetchSite: req.headers['sec-fetch-site'] }, PUBLIC_ORIGIN),
        ),
    });
    this.#forgetHandshake = forgetHandshakes(this.io);
    this.io.use((socket, next) => void this.#admit(session, socket, next));
    this.io.on('connection', (socket) => this.#serve(socket));
  }

  /** Outbox handler: works out who hears an event now and sends it to them. */
  readonly sendEvent = async (message: OutgoingMessage): Promise<void> => {
    const name = message.topic.slice('event:'.length) as RealtimeName;
    const { event, audience } = message.payload as { event: Record<string, unknown>; audience: EventAudience };
    const payload = REALTIME_EVENTS[name].parse(event);
    const keys = [...new Set(await keysOf(this.#services.db.manager, audience))];
    if (keys.length === 0) return;
    // Rights first: whoever lost them is out of the rooms before anything else is sent.
    if (name === 'membership.changed') await this.#recheck(keys);
    this.io.to(keys.map(keyRoom)).emit(name, { ...payload, eventId: message.id });
  };

  async close(): Promise<void> {
    await this.io.close();
  }

  async #admit(session: RequestHandler, socket: AppSocket, next: (error?: Error) => void): Promise<void> {
    try {
      const accountId = await handshakeAccountId(session, socket.request);
      const person = accountId ? await personOf(this.#services.db, accountId) : null;
      if (!person) return next(new Error('not-signed-in'));
      socket.data.accountId = person.accountId;
      socket.data.displayName = person.displayName;
      await socket.join(person.rooms.map(keyRoom));
      next();
    } catch (error) {
      this.#services.log.warn({ err: error }, 'socket not admitted');
      next(new Error('busy'));
    }
  }

  #serve(socket: AppSocket): void {
    this.#forgetHandshake(socket);
    this.#on(socket, 'thread.enter', async ({ commissionId, threadId }) => {
      if (!(await mayReadThread(this.#services.db, socket.data.accountId, commissionId, threadId))) return 'not-found';
      if (!socket.connected) return 'not-connected';
      await socket.join(threadRoom(threadId));
      this.#presence.enter(threadId, socket.id, socket.data);
      this.#tellPresence(threadId);
      return null;
    });
    this.#on(socket, 'thread.leave', async ({ threadId }) => {
      await socket.leave(threadRoom(threadId));
      this.#presence.leave(threadId, socket.id);
      this.#tellPresence(threadId);
      return null;
    });
    this.#on(socket, 'thread.typing', ({ threadId, typing }) => {
      if (!socket.rooms.has(threadRoom(threadId))) return Promise.resolve('not-found');
      if (this.#presence.type(threadId, socket.id, typing)) this.#tellPresence(threadId);
      return Promise.resolve(null);
    });
    socket.on('disconnect', () => {
      for (const threadId of this.#presence.leaveAll(socket.id)) this.#tellPresence(threadId);
    });
  }

  /** Parses the payload, runs the act, and acknowledges; a payload that does not parse changes nothing. */
  #on<N extends ClientEventName>(
    socket: AppSocket,
    name: N,
    act: (event: ReturnType<(typeof CLIENT_EVENTS)[N]['parse']>) => Promise<string | null>,
  ): void {
    // Both come from the other side: a payload of any kind, and what may be no function at all.
    const listener = (raw: unknown, acknowledge?: unknown): void => {
      const parsed = CLIENT_EVENTS[name].safeParse(raw);
      const reply = (code: string | null): void => {
        const answer: Acknowledgement = code === null ? { ok: true } : { ok: false, code };
        if (typeof acknowledge === 'function') (acknowledge as (given: Acknowledgement) => void)(answer);
      };
      if (!parsed.success) return reply('input-invalid');
      act(parsed.data as never).then(reply, (error: unknown) => {
        this.#services.log.warn({ err: error, name }, 'socket event failed');
        reply('unexpected');
      });
    };
    (socket as unknown as { on: (event: string, listener: unknown) => void }).on(name, listener);
  }

  #tellPresence(threadId: string): void {
    this.io.to(threadRoom(threadId)).emit(PRESENCE_EVENT, { threadId, people: this.#presence.peopleIn(threadId) });
  }

  /** Puts the sockets behind these keys where their rights now allow; those whose account is gone are cut off. */
  async #recheck(keys: string[]): Promise<void> {
    const sockets = this.io.sockets.sockets.values();
    const concerned = [...sockets].filter((socket) => keys.some((key) => socket.rooms.has(keyRoom(key))));
    for (const socket of concerned) {
      const { accountId } = socket.data;
      const rooms = await roomsOf(this.#services.db, accountId);
      const allowed = new Set(rooms.map(keyRoom));
      for (const room of socket.rooms) if (room.startsWith('key:') && !allowed.has(room)) await socket.leave(room);
      await socket.join([...allowed]);
      for (const threadId of this.#presence.threadsOf(socket.id)) {
        if (await mayReadThread(this.#services.db, accountId, null, threadId)) continue;
        await socket.leave(threadRoom(threadId));
        this.#presence.leave(threadId, socket.id);
        this.#tellPresence(threadId);
      }
    }
  }

  /** Ends the live connections of an account whose sessions ended. */
  disconnectAccount(accountId: string): void {
    this.io.in(keyRoom(accountId)).disconnectSockets(true);
  }
}
