import { createHash } from 'node:crypto';
import { readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { rootFolder } from './places.mjs';

const madeByTools = new Set([
  'node_modules',
  'dist',
  '.angular',
  'coverage',
  'test-results',
  'playwright-report',
]);
const notBuilt = new Set(['infra/run', 'infra/database', 'packages/web/e2e']);

/**
 * A fingerprint of the content of files and folders, given by their paths from the root. Tests and what a build makes
 * are left out; a path that does not exist counts as empty.
 */
export function fingerprint(paths) {
  const hash = createHash('sha256');
  for (const path of paths.flatMap(filesUnder)) {
    hash
      .update(`${path}\0`)
      .update(readFileSync(join(rootFolder, path)))
      .update('\0');
  }
  return hash.digest('hex');
}

function filesUnder(path) {
  const entry = statSync(join(rootFolder, path), { throwIfNoEntry: false });
  if (!entry) return [];
  if (!entry.isDirectory()) return isBuilt(path) ? [] : [path];
  return readdirSync(join(rootFolder, path))
    .filter((name) => !madeByTools.has(name) && !notBuilt.has(`${path}/${name}`))
    .sort()
    .flatMap((name) => filesUnder(`${path}/${name}`));
}

function isBuilt(path) {
  return path.endsWith('.tsbuildinfo') || path.endsWith('.spec.ts');
}
