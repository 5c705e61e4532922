import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { CommandFault, runCommand } from './commands.mjs';
import { rootFolder } from './places.mjs';
import { readJson } from './private-file.mjs';

const node = process.execPath;
const limitMs = 20 * 60_000;

/** The script of an installed npm package, by its path in node_modules. */
export function tool(path) {
  return join(rootFolder, 'node_modules', path);
}

/** A check that passes when its command does. Counts as one. */
export function commandCheck(...commands) {
  return async ({ words }) => {
    let output = '';
    try {
      for (const command of commands) {
        output += await runCommand(node, [...command, ...words], { timeoutMs: limitMs });
      }
      return { passed: 1, failed: 0, output };
    } catch (fault) {
      return { passed: 0, failed: 1, output: output + outputOf(fault) };
    }
  };
}

/** A check that runs the Jest tests of a folder and counts them. */
export function jestCheck(folder, workers) {
  return async ({ name, words, resultFolder, testEnvironment }) => {
    const resultFile = join(resultFolder, `${name}.json`);
    const options = [
      '--ci',
      '--forceExit',
      `--maxWorkers=${workers}`,
      '--json',
      `--outputFile=${resultFile}`,
    ];
    const { output, fault } = await attempt(node, [tool('jest/bin/jest.js'), ...options, ...words], {
      cwd: join(rootFolder, folder),
      env: { ...testEnvironment, NODE_ENV: 'test' },
    });
    const result = readJson(resultFile);
    const counts = {
      passed: result?.numPassedTests ?? 0,
      failed: (result?.numFailedTests ?? 0) + (result?.numRuntimeErrorTestSuites ?? 0),
      // A pattern given by hand leaves tests out on purpose.
      skipped: words.length > 0 ? 0 : (result?.numPendingTests ?? 0) + (result?.numTodoTests ?? 0),
    };
    return judge(counts, fault, output);
  };
}

/** A check that runs the browser journeys against a running Bookmatch and counts them. */
export async function runJourneys({ words, resultFolder, environment }) {
  const resultFile = join(resultFolder, 'journeys.json');
  const { output, fault } = await attempt(
    node,
    [tool('@playwright/test/cli.js'), 'test', `--config=${configFile()}`, '--reporter=line,json', ...words],
    {
      cwd: join(rootFolder, 'packages/web'),
      env: { ...environment, CI: 'true', PLAYWRIGHT_JSON_OUTPUT_FILE: resultFile },
    },
  );
  const stats = readJson(resultFile)?.stats ?? {};
  const counts = {
    passed: stats.expected ?? 0,
    // A journey that passes only when tried again has failed once, as it would for a user.
    failed: (stats.unexpected ?? 0) + (stats.flaky ?? 0),
    skipped: words.length > 0 ? 0 : (stats.skipped ?? 0),
  };
  return judge(counts, fault, output);
}

function configFile() {
  const places = ['e2e/playwright.config.ts', 'playwright.config.ts'];
  return places.find((place) => existsSync(join(rootFolder, 'packages/web', place))) ?? places[0];
}

async function attempt(command, words, options) {
  try {
    return { output: await runCommand(command, words, { ...options, timeoutMs: limitMs }) };
  } catch (fault) {
    return { output: outputOf(fault), fault };
  }
}

/** A runner that failed, skipped a test or ran none at all never counts as passed. */
function judge({ passed, failed, skipped }, fault, output) {
  const remarks = [];
  let faults = failed + skipped;
  if (skipped > 0) remarks.push(`${skipped} tests are skipped, and no test may be`);
  if (fault && faults === 0) faults = 1;
  if (passed + faults === 0) {
    remarks.push('no test was run');
    faults = 1;
  }
  return { passed, failed: faults, output: [output, ...remarks].join('\n') };
}

function outputOf(fault) {
  if (!(fault instanceof CommandFault)) throw fault;
  return `${fault.output}\n${fault.message}\n`;
}
