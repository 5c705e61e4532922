/**
 * Starts a private database server that keeps everything in one folder, or finds it running:
 *
 *   node infra/database/start.mjs <folder> [--fast]
 *
 * Prints its port as JSON. The accounts are in <folder>/credentials.json. With --fast it does not wait for the disk,
 * which is right for tests only.
 */
import { resolve } from 'node:path';
import { plainly } from './plainly.mjs';
import { startServer } from './server.mjs';

const [folder, option] = process.argv.slice(2);
if (!folder || (option && option !== '--fast')) {
  console.error('Usage: node infra/database/start.mjs <folder> [--fast]');
  process.exit(2);
}
await plainly(async () => {
  const { port, started } = await startServer(resolve(folder), { durability: option ? 'fast' : 'durable' });
  console.log(JSON.stringify({ port, started }));
});
