/**
 * `npm test`: makes what is missing and checks everything. Ends with the line `N passed, N failed`; the exit code is 0
 * only when nothing failed.
 *
 *   node infra/run/test.mjs                                    everything
 *   node infra/run/test.mjs --only api,web                     only these, with what they need
 *   node infra/run/test.mjs --only api -- customers            the rest goes to the tool as it is
 */
import { availableParallelism } from 'node:os';
import { join } from 'node:path';
import { startServer } from '../database/server.mjs';
import { chooseChecks } from './checks.mjs';
import { chromium, ensureFromDebian, mariadb } from './debian.mjs';
import { ensureDependencies } from './dependencies.mjs';
import { runUntilStopped } from './run-until-stopped.mjs';
import { say, seconds } from './say.mjs';
import { runSideBySide } from './schedule.mjs';
import { environmentOf } from './test-database.mjs';
import { makeTestFolder } from './test-folders.mjs';

const { names, words } = readArguments(process.argv.slice(2));

/** A run cut short has proved nothing, so it never ends with 0. */
await runUntilStopped(checkEverything, { codeWhenAsked: 130 });

async function checkEverything({ undo, onCrash }) {
  const begun = performance.now();
  const chosen = chooseChecks(names);
  const needs = new Set(chosen.flatMap(({ needs: some = [] }) => some));
  await prepare(needs);
  const folder = await makeTestFolder(undo);
  const surroundings = { folder, resultFolder: folder, undo, testEnvironment: {} };
  if (needs.has('database')) surroundings.testEnvironment = await startDatabase(folder, undo, onCrash);
  const cores = Math.min(4, Math.max(2, availableParallelism()));
  const results = await runSideBySide(chosen, cores, (check, done) => runOne(check, done, surroundings));
  say(`\nTook ${seconds(performance.now() - begun)}.`);
  return summary([...results.values()]);
}

async function prepare(needs) {
  const programs = [
    ...(needs.has('database') ? [mariadb] : []),
    ...(needs.has('chromium') ? [chromium] : []),
  ];
  await Promise.all([ensureDependencies(), ensureFromDebian(...programs)]);
}

/** A server for this run alone, so that it can be thrown away afterwards. */
async function startDatabase(folder, undo, onCrash) {
  undo.check();
  const server = await startServer(join(folder, 'database'), { durability: 'fast' });
  let isStopping = false;
  server.child.once('exit', () => {
    if (!isStopping) onCrash({ name: 'test database', reason: 'ended', logFile: server.logFile });
  });
  await undo.add(async () => {
    isStopping = true;
    await server.stop();
  });
  return environmentOf(server);
}

async function runOne(check, done, surroundings) {
  if (surroundings.undo.hasBegun)
    return { passed: 0, failed: 1, output: 'Not run, because the tests were stopped.' };
  const failedNeed = (check.after ?? []).find((name) => done.get(name)?.failed > 0);
  const begun = performance.now();
  const result = failedNeed
    ? { passed: 0, failed: 1, output: `Not run, because ${failedNeed} failed.` }
    : await attempt(check, surroundings);
  if (!surroundings.undo.hasBegun) tell(check, result, performance.now() - begun);
  return result;
}

async function attempt(check, surroundings) {
  try {
    // What is meant for one tool means nothing to those that must run before it.
    return await check.run({
      ...surroundings,
      name: check.name,
      words: names.includes(check.name) ? words : [],
    });
  } catch (fault) {
    return { passed: 0, failed: 1, output: fault.stack };
  }
}

function tell({ name }, { passed, failed, output }, tookMs) {
  const counts = passed + failed > 1 ? `${passed} passed, ${failed} failed` : '';
  say(
    `${failed > 0 ? 'FAILED' : 'ok    '}  ${name.padEnd(13)} ${seconds(tookMs).padStart(8)}  ${counts}`.trimEnd(),
  );
  if (failed > 0) say(`${output.trim().split('\n').slice(-400).join('\n')}\n`);
}

function summary(results) {
  const passed = results.reduce((sum, result) => sum + result.passed, 0);
  const failed = results.reduce((sum, result) => sum + result.failed, 0);
  return { code: failed > 0 || passed === 0 ? 1 : 0, lastLine: `${passed} passed, ${failed} failed` };
}

function readArguments(given) {
  const split = given.indexOf('--');
  const own = split < 0 ? given : given.slice(0, split);
  const [option, list, ...more] = own;
  const isUnderstood = own.length === 0 || (option === '--only' && list && more.length === 0);
  if (!isUnderstood) {
    console.error(
      'Usage: npm test, or node infra/run/test.mjs --only <check>,<check> [-- words for the tool]',
    );
    process.exit(2);
  }
  return { names: list?.split(',') ?? [], words: split < 0 ? [] : given.slice(split + 1) };
}
