import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { startServer } from '../database/server.mjs';
import { runCommand } from './commands.mjs';
import { endLeftovers, rememberService } from './leftovers.mjs';
import { rootFolder } from './places.mjs';
import { choosePorts } from './ports-of-stack.mjs';
import { step } from './say.mjs';
import { readOrMakeSecrets } from './secrets.mjs';
import { startService, waitUntilReady } from './service.mjs';
import {
  apiEnvironment,
  mailFakeEnvironment,
  migrationEnvironment,
  paymentsFakeEnvironment,
} from './stack-environment.mjs';

const compiledScripts = {
  api: join(rootFolder, 'packages/api/dist/main.js'),
  migrate: join(rootFolder, 'packages/api/dist/migrate.js'),
  demo: join(rootFolder, 'infra/dist/demo/main.js'),
  mail: join(rootFolder, 'infra/dist/fakes/mail/main.js'),
  payments: join(rootFolder, 'infra/dist/fakes/payments/main.js'),
};

/**
 * Starts everything Bookmatch needs on this machine, in order: database, migrations, fakes, demo data, API. The API and
 * infra must be built. Each thing started is put into `undo` before the next one starts.
 *
 * @param folder where all of it keeps its things
 * @param webReady a promise that the browser application is built; waited for before the API starts
 * @param onCrash called with `{ name, reason, logFile }` when one of them ends by itself
 * @returns the addresses people and tests need
 */
export async function startStack({
  folder,
  webPort,
  durability,
  mode,
  withDemo,
  webReady,
  isQuiet,
  undo,
  onCrash,
}) {
  await endLeftovers(folder);
  const database = await startDatabase({ folder, durability, undo, onCrash });
  const ports = await choosePorts(folder, webPort);
  const settings = { folder, ports, database, secrets: readOrMakeSecrets(folder), mode };
  const env = apiEnvironment(settings);
  await runScript(compiledScripts.migrate, { ...env, ...migrationEnvironment(database) }, undo);
  const start = (name, script, serviceEnv, address) =>
    startOne({ folder, name, script, env: serviceEnv, address, undo, onCrash });
  await Promise.all([
    start('mail', compiledScripts.mail, mailFakeEnvironment(settings), `http://127.0.0.1:${ports.inbox}/`),
    start('payments', compiledScripts.payments, paymentsFakeEnvironment(settings)),
  ]);
  if (withDemo && existsSync(compiledScripts.demo)) {
    const makeDemo = () => runScript(compiledScripts.demo, env, undo);
    await (isQuiet ? makeDemo() : step('Making sure the demo shop is there', makeDemo));
  }
  await webReady;
  await start('api', compiledScripts.api, env, `http://127.0.0.1:${ports.web}/api/ready`);
  return {
    address: `http://localhost:${ports.web}`,
    inbox: `http://127.0.0.1:${ports.inbox}`,
    payments: `http://127.0.0.1:${ports.payments}`,
    env,
    database,
  };
}

async function startDatabase({ folder, durability, undo, onCrash }) {
  undo.check();
  const database = await startServer(join(folder, 'database'), { durability });
  let isStopping = false;
  database.child.once('exit', () => {
    if (!isStopping) onCrash({ name: 'database', reason: 'ended', logFile: database.logFile });
  });
  await undo.add(async () => {
    isStopping = true;
    await database.stop();
  });
  return database;
}

async function startOne({ folder, name, script, env, address, undo, onCrash }) {
  undo.check();
  const service = startService({ name, script, env, logFile: join(folder, `${name}.log`), onCrash });
  rememberService(folder, service);
  await undo.add(() => service.stop());
  if (address) await waitUntilReady(service, address);
}

async function runScript(script, env, undo) {
  undo.check();
  await runCommand(process.execPath, ['--enable-source-maps', script], { env });
}
