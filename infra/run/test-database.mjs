import { join } from 'node:path';
import { startServer, stopServer } from '../database/server.mjs';
import { withLock } from './lock.mjs';
import { stateFolder } from './places.mjs';

const folder = join(stateFolder, 'test-database');
const lock = join(stateFolder, 'test-database.lock');

/** Starts the shared test database or finds it running. Safe to call from several shells at once. */
export async function startTestDatabase() {
  return environmentOf(await withLock(lock, () => startServer(folder, { durability: 'fast' })));
}

/** Stops the shared test database; its data stay. */
export async function stopTestDatabase() {
  await withLock(lock, () => stopServer(folder));
}

/** What tests read to reach a server: a root account on it, since every test file makes a database of its own. */
export function environmentOf({ port, credentials }) {
  return {
    BOOKMATCH_TEST_DB_HOST: '127.0.0.1',
    BOOKMATCH_TEST_DB_PORT: String(port),
    BOOKMATCH_TEST_DB_ROOT_USER: credentials.root.user,
    BOOKMATCH_TEST_DB_ROOT_PASSWORD: credentials.root.password,
  };
}
