import { join } from 'node:path';
import { freePortFrom, rememberedOrFreePort } from './ports.mjs';
import { readJson, writePrivateJson } from './private-file.mjs';

/**
 * The ports of everything but the database, the same as last time where they are still free.
 * @param webPort the port people type; the next free one is taken when somebody has it
 */
export async function choosePorts(folder, webPort) {
  const file = join(folder, 'ports.json');
  const last = readJson(file) ?? {};
  const ports = {
    web: await freePortFrom(webPort),
    payments: await rememberedOrFreePort(last.payments),
    smtp: await rememberedOrFreePort(last.smtp),
    inbox: await rememberedOrFreePort(last.inbox),
  };
  writePrivateJson(file, ports);
  return ports;
}
