import { setImmediate as nextTurn } from 'node:timers/promises';

/** What the measurement asks of a socket server by message: send one event a number of times, or say its memory. */
export interface SendOrder {
  readonly order: 'send';
  readonly times: number;
  readonly name: string;
  readonly event: Readonly<Record<string, unknown>>;
  readonly audience: Readonly<Record<string, unknown>>;
  readonly eventId: string;
}
export type Order = SendOrder | { readonly order: 'memory' };

/** Bytes that live objects take after a full collection, buffers included. */
const liveBytes = (): number => {
  global.gc?.();
  const { heapUsed, external } = process.memoryUsage();
  return heapUsed + external;
};

/** Serves orders one after another; each is answered when it is done. */
export function answerOrders(send: (order: SendOrder) => Promise<void>): void {
  process.on('message', (order: Order) => {
    const done = async (): Promise<number> => {
      if (order.order === 'memory') return liveBytes();
      for (let turn = 0; turn < order.times; turn += 1) {
        await send(order);
        // Events come one by one and not in one breath, where a socket would send several as one.
        await nextTurn();
      }
      return order.times;
    };
    done().then(
      (value) => process.send?.({ done: value }),
      (error: unknown) => process.send?.({ failed: String(error) }),
    );
  });
}
