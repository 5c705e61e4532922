/**
 * Runs a command beside the private test database of this clone:
 *
 *   node infra/run/with-database.mjs -- npx jest path/to/file
 *   node infra/run/with-database.mjs --stop
 *
 * The server is started if it does not run, shared by all who call this, and left running.
 */
import { spawn } from 'node:child_process';
import { startTestDatabase, stopTestDatabase } from './test-database.mjs';

const [first, ...rest] = process.argv.slice(2);

if (first === '--stop') {
  await stopTestDatabase();
} else if (first === '--' && rest.length > 0) {
  process.exitCode = await runBeside(await startTestDatabase(), rest);
} else {
  console.error('Usage: node infra/run/with-database.mjs -- <command> [arguments] | --stop');
  process.exitCode = 2;
}

function runBeside(environment, [command, ...words]) {
  return new Promise((resolve) => {
    const child = spawn(command, words, { stdio: 'inherit', env: { ...process.env, ...environment } });
    for (const name of ['SIGINT', 'SIGTERM']) process.on(name, () => child.kill(name));
    child.once('error', (fault) => {
      console.error(`${command}: ${fault.message}`);
      resolve(127);
    });
    child.once('exit', (code, signal) => resolve(signal ? 1 : code));
  });
}
