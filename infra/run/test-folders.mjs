import { existsSync, mkdirSync, readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { stopServer } from '../database/server.mjs';
import { endLeftovers } from './leftovers.mjs';
import { takeLock } from './lock.mjs';
import { stateFolder } from './places.mjs';

const prefix = 'test-run-';

/**
 * Makes a folder for this run of the tests alone and removes it when undone. What killed runs left is removed first,
 * their servers ended.
 */
export async function makeTestFolder(undo) {
  await removeAbandoned();
  const folder = join(stateFolder, `${prefix}${process.pid}`);
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  takeLock(join(folder, 'running.lock'));
  await undo.add(() => rmSync(folder, { recursive: true, force: true }));
  return folder;
}

async function removeAbandoned() {
  if (!existsSync(stateFolder)) return;
  for (const name of readdirSync(stateFolder).filter((one) => one.startsWith(prefix))) {
    const folder = join(stateFolder, name);
    if (!takeLock(join(folder, 'running.lock'))) continue;
    await endLeftovers(join(folder, 'journeys'));
    await stopServer(join(folder, 'database'));
    rmSync(folder, { recursive: true, force: true });
  }
}
