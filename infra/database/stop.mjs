/**
 * Stops the private database server of a folder if it runs; its data stay:
 *
 *   node infra/database/stop.mjs <folder>
 */
import { resolve } from 'node:path';
import { plainly } from './plainly.mjs';
import { stopServer } from './server.mjs';

const [folder] = process.argv.slice(2);
if (!folder) {
  console.error('Usage: node infra/database/stop.mjs <folder>');
  process.exit(2);
}
await plainly(() => stopServer(resolve(folder)));
