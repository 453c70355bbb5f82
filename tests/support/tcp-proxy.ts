import { createServer, connect, type Server, type Socket } from 'node:net';

/** A way between client and server that can be slow and can break, as networks do. */
export class TcpProxy {
  readonly #server: Server;
  readonly #pairs = new Set<[Socket, Socket]>();
  readonly #targetPort: number;
  delayMs = 0;

  constructor(targetPort: number) {
    this.#targetPort = targetPort;
    this.#server = createServer((inbound) => this.#join(inbound));
  }

  async listen(): Promise<number> {
    await new Promise<void>((resolve) => this.#server.listen(0, '127.0.0.1', resolve));
    const address = this.#server.address();
    if (address === null || typeof address === 'string') throw new Error('The proxy has no port');
    return address.port;
  }

  #join(inbound: Socket): void {
    const outbound = connect(this.#targetPort, '127.0.0.1');
    const pair: [Socket, Socket] = [inbound, outbound];
    this.#pairs.add(pair);
    const pass = (from: Socket, to: Socket): void => {
      from.on('data', (chunk) => {
        const send = (): void => void (to.destroyed || to.write(chunk));
        if (this.delayMs > 0) setTimeout(send, this.delayMs);
        else send();
      });
      from.on('end', () => to.end());
      from.on('error', () => to.destroy());
      from.on('close', () => {
        to.destroy();
        this.#pairs.delete(pair);
      });
    };
    pass(inbound, outbound);
    pass(outbound, inbound);
  }

  /** Breaks every connection that is open now, without a word to either end. */
  cut(): void {
    for (const [inbound, outbound] of this.#pairs) {
      inbound.destroy();
      outbound.destroy();
    }
  }

  async close(): Promise<void> {
    this.cut();
    await new Promise<void>((resolve) => this.#server.close(() => resolve()));
  }
}
