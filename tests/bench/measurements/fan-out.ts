import { once } from 'node:events';
import { setTimeout as pause } from 'node:timers/promises';
import type { Measurement } from '../support/bench.ts';
import { pairedRatio, verdictOf } from '../support/paired.ts';
import { startApplication, startBare, type Running } from '../support/processes.ts';
import { rateWords, ratioWords } from '../support/report.ts';
import { openSockets, type SocketClients } from '../support/socket-clients.ts';
import type { Order } from '../bare/orders.ts';

const SOCKETS = 500;
const FIRST_SOCKETS = 200;
/** By then the server has let go of what connecting or leaving took. */
const SETTLE_MS = 1000;
const EVENT = 'thread.message-added';
/** Events of one slice; at some 20,000 deliveries a second this is one to two seconds. */
const EVENTS_A_SLICE = 60;

async function order({ child }: Running, what: Order): Promise<number> {
  const answer = once(child, 'message') as Promise<[{ done?: number; failed?: string }]>;
  child.send(what);
  const [{ done, failed }] = await answer;
  if (done === undefined) throw new Error(failed ?? 'The order was not done');
  return done;
}

interface Side {
  readonly running: Running;
  readonly clients: SocketClients;
  /** Live memory that one idle socket takes, bytes. */
  readonly bytesPerSocket: number;
}

async function connect(running: Running, headers: Readonly<Record<string, string>>): Promise<Side> {
  // The first sockets load and compile what all share; the difference is what further ones take, and no fixed share.
  const first = await openSockets(running.origin, FIRST_SOCKETS, EVENT, headers);
  await pause(SETTLE_MS);
  const before = await order(running, { order: 'memory' });
  const clients = await openSockets(running.origin, SOCKETS, EVENT, headers);
  await pause(SETTLE_MS);
  const bytesPerSocket = ((await order(running, { order: 'memory' })) - before) / SOCKETS;
  await first.stop();
  await pause(SETTLE_MS);
  return { running, clients, bytesPerSocket };
}

/** One event of the outbox to 500 sockets, the look-up of who hears it included, against one bare room emit. */
export const fanOut: Measurement = {
  title: 'One event to 500 sockets against a bare Socket.IO room',
  async run(bench) {
    const { bigReader, longThread } = await bench.data();
    const undo: (() => Promise<void>)[] = [];
    try {
      const application = await startApplication(bench.databaseUrl, 'tests/bench/bare/hub.ts');
      undo.push(() => application.stop());
      const bare = await startBare('tests/bench/bare/sockets.ts', {});
      undo.push(() => bare.stop());
      const ours = await connect(application, { cookie: bigReader.cookie, origin: application.origin });
      undo.push(() => ours.clients.stop());
      const theirs = await connect(bare, {});
      undo.push(() => theirs.clients.stop());
      const { commissionId, threadId } = longThread;
      const send = async ({ running, clients }: Side): Promise<number> => {
        const from = performance.now();
        const heard = clients.heard(EVENTS_A_SLICE);
        await order(running, {
          order: 'send',
          times: EVENTS_A_SLICE,
          name: EVENT,
          event: { commissionId, threadId, sequence: 1 },
          audience: { to: 'thread', threadId },
          eventId: '1',
        });
        await heard;
        return (EVENTS_A_SLICE * SOCKETS) / ((performance.now() - from) / 1000);
      };
      const ratio = await pairedRatio(
        () => send(ours),
        () => send(theirs),
        bench.rounds,
      );
      const memory = ours.bytesPerSocket / theirs.bytesPerSocket;
      return [
        {
          what: 'fan-out',
          figure: ratioWords(ratio),
          detail: rateWords(ratio, 'deliveries/s'),
          goal: 'at least 0.80',
          verdict: verdictOf(ratio, { atLeast: 0.8 }),
        },
        {
          what: 'live memory of a further idle socket',
          figure: memory.toFixed(2),
          detail: `${(ours.bytesPerSocket / 1000).toFixed(1)} against ${(theirs.bytesPerSocket / 1000).toFixed(1)} kB`,
          goal: 'at most 1.25',
          verdict: verdictOf({ median: memory, min: memory, max: memory }, { atMost: 1.25 }),
        },
      ];
    } finally {
      for (const step of undo.reverse()) await step();
    }
  },
};
