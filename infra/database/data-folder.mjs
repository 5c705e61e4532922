import { execFile } from 'node:child_process';
import { existsSync, mkdirSync, readdirSync, renameSync, rmSync } from 'node:fs';
import { basename, dirname, join } from 'node:path';
import { promisify } from 'node:util';
import { requireProgram } from './programs.mjs';
import { runAs } from './settings.mjs';

const run = promisify(execFile);

/** Makes the data folder of a new server if there is none. It is made beside and renamed: whole or not there at all. */
export async function ensureDataFolder(dataFolder) {
  removeDrafts(dataFolder);
  if (existsSync(dataFolder)) return false;
  const draft = `${dataFolder}.new-${process.pid}`;
  mkdirSync(draft, { recursive: true, mode: 0o700 });
  await install(draft);
  renameSync(draft, dataFolder);
  return true;
}

async function install(folder) {
  await run(requireProgram('mariadb-install-db'), [
    '--no-defaults',
    `--datadir=${folder}`,
    '--auth-root-authentication-method=normal',
    '--skip-test-db',
    '--skip-name-resolve',
    ...runAs(),
  ]);
}

function removeDrafts(dataFolder) {
  const parent = dirname(dataFolder);
  if (!existsSync(parent)) return;
  for (const name of readdirSync(parent)) {
    if (name.startsWith(`${basename(dataFolder)}.new-`))
      rmSync(join(parent, name), { recursive: true, force: true });
  }
}
