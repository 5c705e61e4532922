import { join } from 'node:path';
import { runCommand } from './commands.mjs';
import { withLock } from './lock.mjs';
import { rootFolder, stateFolder } from './places.mjs';
import { readJson } from './private-file.mjs';
import { step } from './say.mjs';

/** Installs what package-lock.json names if node_modules holds anything else, or nothing. */
export async function ensureDependencies() {
  await withLock(
    join(stateFolder, 'install.lock'),
    async () => {
      if (areInstalled()) return;
      await step('Installing the npm packages', () => runCommand('npm', ['ci', '--no-audit', '--no-fund']));
    },
    { withinMs: 600_000 },
  );
}

/**
 * npm writes down what it installed in node_modules/.package-lock.json, as its last act. Comparing that with the lock
 * needs no mark of our own and also sees an install by hand.
 */
function areInstalled() {
  const wanted = readJson(join(rootFolder, 'package-lock.json'))?.packages;
  const present = readJson(join(rootFolder, 'node_modules/.package-lock.json'))?.packages;
  if (!wanted || !present) return false;
  return Object.entries(wanted)
    .filter(([path, entry]) => path.includes('node_modules/') && !entry.optional && !entry.devOptional)
    .every(([path, entry]) => isSame(entry, present[path]));
}

/** Where a package came from is compared only when the lock says so, as it does for our own packages. */
function isSame(wanted, present) {
  if (!present || present.version !== wanted.version) return false;
  return wanted.resolved === undefined || present.resolved === wanted.resolved;
}
