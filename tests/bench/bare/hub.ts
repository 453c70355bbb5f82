import { createServer } from 'node:http';
import { startProcess } from '../../../server/boot.ts';
import { readEnv } from '../../../server/config/env.ts';
import { answerOrders } from './orders.ts';

/** The whole application, with its hub at hand: events are given to it as the outbox relay gives them. */
const running = await startProcess(readEnv(process.env), createServer());
process.on('SIGTERM', () => void running.stop().then(() => process.exit(0)));

answerOrders((order) =>
  running.hub.sendEvent({
    id: order.eventId,
    topic: `event:${order.name}`,
    payload: { event: order.event, audience: order.audience },
    attempts: 1,
  }),
);
