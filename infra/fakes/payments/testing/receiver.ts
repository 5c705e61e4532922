import { createServer, type IncomingMessage, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';

/** One webhook as it came in: the raw text and the signature header, for the SDK to check. */
export interface Received {
  payload: string;
  signature: string;
  type: string;
  id: string;
}

/** A shop's webhook address: keeps all it gets and answers with `status`, or with those of `statuses` first. */
export class Receiver {
  readonly received: Received[] = [];
  status = 200;
  statuses: number[] = [];

  private constructor(private readonly server: Server) {}

  static async start(): Promise<Receiver> {
    const server = createServer();
    const receiver = new Receiver(server);
    server.on('request', (request, response) => {
      void bodyOf(request).then((payload) => {
        receiver.keep(payload, String(request.headers['stripe-signature']));
        response.writeHead(receiver.statuses.shift() ?? receiver.status).end();
      });
    });
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    return receiver;
  }

  get url(): string {
    return `http://127.0.0.1:${(this.server.address() as AddressInfo).port}/hook`;
  }

  types(): string[] {
    return this.received.map((one) => one.type);
  }

  /** Waits until so many are in. Rejects after 5 seconds, naming what came. */
  async waitFor(count: number): Promise<void> {
    const end = Date.now() + 5000;
    while (this.received.length < count) {
      if (Date.now() > end)
        throw new Error(`${this.received.length} of ${count}: ${this.types().join(', ')}`);
      await new Promise((resolve) => setTimeout(resolve, 10));
    }
  }

  async close(): Promise<void> {
    const closed = new Promise<void>((resolve) => this.server.close(() => resolve()));
    this.server.closeAllConnections();
    await closed;
  }

  private keep(payload: string, signature: string): void {
    const { id, type } = JSON.parse(payload) as { id: string; type: string };
    this.received.push({ payload, signature, id, type });
  }
}

async function bodyOf(request: IncomingMessage): Promise<string> {
  const parts: Buffer[] = [];
  for await (const part of request) parts.push(part as Buffer);
  return Buffer.concat(parts).toString('utf8');
}
