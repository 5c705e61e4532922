/**
 * `npm start`: makes what is missing, starts Bookmatch on this machine and keeps it running until Ctrl-C.
 *
 * PORT is the port of the web address: 4310 unless said otherwise, the next free one if it is taken.
 */
import { join } from 'node:path';
import { ensureBuilt } from './build.mjs';
import { ensureFromDebian, mariadb } from './debian.mjs';
import { ensureDependencies } from './dependencies.mjs';
import { holderOf, takeLock } from './lock.mjs';
import { stateFolder } from './places.mjs';
import { runUntilStopped } from './run-until-stopped.mjs';
import { say } from './say.mjs';
import { signInLines } from './sign-ins.mjs';
import { startStack } from './stack.mjs';

const folder = join(stateFolder, 'start');
const defaultPort = 4310;

await runUntilStopped(async ({ undo, onCrash }) => {
  const begun = performance.now();
  await takePlace(undo);
  await Promise.all([ensureDependencies(), ensureFromDebian(mariadb)]);
  undo.check();
  await ensureBuilt('common');
  const webReady = ensureBuilt('web');
  // Its failure is met where it is waited for; until then it must not end the process.
  webReady.catch(() => {});
  await ensureBuilt('server');
  const options = { durability: 'durable', mode: 'development', withDemo: true };
  const stack = await startStack({ folder, webPort: wantedPort(), ...options, webReady, undo, onCrash });
  tell(stack, performance.now() - begun);
});

async function takePlace(undo) {
  const lock = join(folder, 'running.lock');
  const release = takeLock(lock);
  if (!release)
    throw new Error(`Bookmatch is already running from this folder, as process ${holderOf(lock)}.`);
  await undo.add(release);
}

function wantedPort() {
  const port = Number(process.env.PORT || defaultPort);
  if (Number.isInteger(port) && port > 0 && port < 65_536) return port;
  throw new Error(`PORT must be a port number, not ${process.env.PORT}.`);
}

function tell({ address, inbox }, tookMs) {
  const signIns = signInLines();
  say('');
  if (signIns.length > 0) say(['Demo sign-ins:', ...signIns, ''].join('\n'));
  say(`Mail it sends:  ${inbox}`);
  say(`Logs:           ${folder}`);
  say(`Bookmatch:      ${address}   (ready after ${Math.round(tookMs / 100) / 10} s; Ctrl-C stops it)`);
}
