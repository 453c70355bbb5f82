import { io } from 'socket.io-client';

interface WorkerSettings {
  readonly origin: string;
  readonly sockets: number;
  readonly event: string;
  readonly headers: Readonly<Record<string, string>>;
}

/** Opens sockets a few at a time, then counts events and says the sum often enough and not for each. */
const { origin, sockets, event, headers } = JSON.parse(process.env['WORKER_SETTINGS'] ?? '') as WorkerSettings;
const AT_ONCE = 10;
const TELL_MS = 5;
let heard = 0;
let told = 0;

const open = (): Promise<void> =>
  new Promise((resolve, reject) => {
    const socket = io(origin, {
      transports: ['websocket'],
      forceNew: true,
      reconnection: false,
      extraHeaders: { ...headers },
    });
    socket.on(event, () => (heard += 1));
    socket.once('connect', () => resolve());
    socket.once('connect_error', reject);
  });

try {
  for (let opened = 0; opened < sockets; opened += AT_ONCE)
    await Promise.all(Array.from({ length: Math.min(AT_ONCE, sockets - opened) }, open));
  process.send?.({ open: sockets });
} catch (error) {
  process.send?.({ failed: String(error) });
}

setInterval(() => {
  if (told === heard) return;
  told = heard;
  process.send?.({ heard });
}, TELL_MS);
process.on('SIGTERM', () => process.exit(0));
