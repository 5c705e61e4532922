/**
 * `npm run bench`: a database of its own with 200 shops, one of them large, then the speed table. Not a test: it takes
 * minutes, and its figures are ratios of one run.
 *
 *   node infra/run/bench.mjs              everything
 *   node infra/run/bench.mjs lists        only the parts named
 */
import { join } from 'node:path';
import { startServer } from '../database/server.mjs';
import { ensureBuilt } from './build.mjs';
import { runCommand } from './commands.mjs';
import { mariadb, ensureFromDebian } from './debian.mjs';
import { ensureDependencies } from './dependencies.mjs';
import { rootFolder } from './places.mjs';
import { choosePorts } from './ports-of-stack.mjs';
import { runUntilStopped } from './run-until-stopped.mjs';
import { readOrMakeSecrets } from './secrets.mjs';
import { apiEnvironment, migrationEnvironment } from './stack-environment.mjs';
import { makeTestFolder } from './test-folders.mjs';

await runUntilStopped(bench);

async function bench({ undo }) {
  await Promise.all([ensureDependencies(), ensureFromDebian(mariadb)]);
  await ensureBuilt('common');
  await ensureBuilt('server');
  const folder = await makeTestFolder(undo);
  const database = await startServer(join(folder, 'database'), { durability: 'durable' });
  await undo.add(() => database.stop());
  const ports = await choosePorts(folder, 4510);
  const env = apiEnvironment({
    folder,
    ports,
    database,
    secrets: readOrMakeSecrets(folder),
    mode: 'development',
  });
  const { owner } = database.credentials;
  const script = (name, more = {}) => runProgram(name, { ...env, BOOKMATCH_LOG_LEVEL: 'info', ...more });
  await script('packages/api/dist/migrate.js', migrationEnvironment(database));
  await script('infra/dist/demo/main.js');
  const output = await script('infra/dist/bench/main.js', {
    BENCH_DB_USER: owner.user,
    BENCH_DB_PASSWORD: owner.password,
    BENCH_PARTS: process.argv.slice(2).join(','),
  });
  return { code: 0, lastLine: output.trimEnd() };
}

function runProgram(path, env) {
  return runCommand(process.execPath, ['--enable-source-maps', join(rootFolder, path)], { env });
}
