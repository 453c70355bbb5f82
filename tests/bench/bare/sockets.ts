import { createServer } from 'node:http';
import { Server } from 'socket.io';
import { answerOrders } from './orders.ts';
import type { BareSocketSettings } from './settings.ts';

/** Socket.IO by itself: everyone in one room, the same payload, no session and no look-up of who hears it. */
const settings = JSON.parse(process.env['BARE_SETTINGS'] ?? '') as BareSocketSettings;
const http = createServer((_req, res) => res.end('{}'));
const io = new Server(http, { serveClient: false, transports: ['websocket'] });
io.on('connection', (socket) => void socket.join('all'));
http.listen(settings.port, '127.0.0.1');
process.on('SIGTERM', () => process.exit(0));

answerOrders((order) => {
  io.to('all').emit(order.name, { ...order.event, eventId: order.eventId });
  return Promise.resolve();
});
