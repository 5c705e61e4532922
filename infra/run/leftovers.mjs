import { join } from 'node:path';
import { stopServer } from '../database/server.mjs';
import { endProcess, isOurs } from './processes.mjs';
import { readJson, writePrivateJson } from './private-file.mjs';

const fileIn = (folder) => join(folder, 'services.json');

/** Writes down a started service, so that a later run can end it if this one is killed. */
export function rememberService(folder, { pid, script }) {
  writePrivateJson(fileIn(folder), [...(readJson(fileIn(folder)) ?? []), { pid, script }]);
}

/** Ends what a killed run left running in this folder: services first, the database they use last. */
export async function endLeftovers(folder) {
  for (const { pid, script } of (readJson(fileIn(folder)) ?? []).reverse()) {
    if (isOurs(pid, script)) await endProcess(pid, script);
  }
  writePrivateJson(fileIn(folder), []);
  await stopServer(join(folder, 'database'));
}
