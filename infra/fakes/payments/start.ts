import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { buildApp } from './app.js';
import { newId } from './ids.js';
import { DEFAULT_KEY, type PaymentsFakeOptions } from './options.js';
import { Provider, type ProviderConfig } from './provider.js';
import { readSnapshot } from './state/snapshot.js';
import { emptyState, type State } from './state/state.js';

export interface PaymentsFake {
  url: string;
  port: number;
  close(): Promise<void>;
}

const RETRY_BASE_MS = 1000;

/** Starts the provider; `port` 0 takes any free one. Rejects when the port is taken or the state file is damaged. */
export async function startPaymentsFake(options: PaymentsFakeOptions = {}): Promise<PaymentsFake> {
  const host = options.host ?? '127.0.0.1';
  const state = stateFor(options);
  const config: ProviderConfig = {
    key: options.key ?? DEFAULT_KEY,
    publicUrl: '',
    stateFile: options.stateFile,
    prices: options.prices,
    retryBaseMs: options.retryBaseMs ?? RETRY_BASE_MS,
  };
  const provider = new Provider(config, state);
  const server = createServer(buildApp(provider));
  const port = await listen(server, options.port ?? 0, host).catch(async (error: unknown) => {
    await provider.close();
    throw error;
  });
  const url = `http://${host}:${port}`;
  config.publicUrl = (options.publicUrl ?? url).replace(/\/$/, '');
  provider.outbox.wake();
  return { url, port, close: () => shut(server, provider) };
}

/** What the file kept, with the receivers of this start; requests that were cut short have left their keys free. */
function stateFor(options: PaymentsFakeOptions): State {
  const endpoints = options.webhooks ?? [];
  const kept = options.stateFile === undefined ? null : readSnapshot(options.stateFile);
  if (kept === null) return emptyState(newId('acct_', 16), endpoints);
  kept.endpoints = endpoints;
  for (const [name, record] of Object.entries(kept.keys)) if (record.answer === null) delete kept.keys[name];
  return kept;
}

function listen(server: Server, port: number, host: string): Promise<number> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, () => {
      server.off('error', reject);
      resolve((server.address() as AddressInfo).port);
    });
  });
}

async function shut(server: Server, provider: Provider): Promise<void> {
  const closed = new Promise<void>((resolve) => server.close(() => resolve()));
  server.closeAllConnections();
  await closed;
  await provider.close();
}
