import { createServer } from 'node:http';
import { compose } from './compose.js';
import { ENTITIES } from './entities.js';
import { readConfig } from './platform/config/config.js';
import { openPlatform } from './platform/platform.js';

const SHUTDOWN_MS = 15_000;

const config = readConfig(process.env);
const platform = await openPlatform(config, ENTITIES);
const product = compose(platform);
const server = createServer(
  { requestTimeout: 60_000, headersTimeout: 20_000, keepAliveTimeout: 65_000 },
  product.app,
);

server.listen(config.port, config.host, () => {
  product.outbox.start();
  product.setOpen(true);
  platform.log.info({ host: config.host, port: config.port }, 'listening');
});

for (const signal of ['SIGTERM', 'SIGINT'] as const) process.once(signal, () => void shutDown(signal));

/** Takes no new requests, finishes those under way and the outbox message in hand, then closes the database. */
async function shutDown(signal: string): Promise<void> {
  platform.log.info({ signal }, 'shutting down');
  product.setOpen(false);
  setTimeout(() => process.exit(1), SHUTDOWN_MS).unref();
  const closed = new Promise((resolve) => server.close(resolve));
  server.closeIdleConnections();
  await closed;
  await product.close();
  await platform.close();
  platform.log.info('stopped');
}
