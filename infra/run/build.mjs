import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { runCommand } from './commands.mjs';
import { tidyCompiledFiles } from './compiled-files.mjs';
import { withLock } from './lock.mjs';
import { rootFolder, stateFolder } from './places.mjs';
import { step } from './say.mjs';
import { fingerprint } from './sources.mjs';

const shared = ['package-lock.json', 'tsconfig.base.json'];
const commonSources = [...shared, 'packages/common/src', 'packages/common/tsconfig.json'];

/** What is built: its sources, the file that says it was, and how. The later two need the first. */
export const builds = {
  common: {
    title: 'the common rules',
    sources: commonSources,
    stamp: 'packages/common/dist/.built',
    run: () => compile(['packages/common'], [{ folder: 'packages/common', source: 'src' }]),
  },
  server: {
    title: 'the API',
    sources: [...commonSources, 'packages/api/src', 'packages/api/tsconfig.json', 'infra'],
    stamp: 'packages/api/dist/.built',
    run: () =>
      compile(
        ['packages/api', 'infra'],
        [
          { folder: 'packages/api', source: 'src' },
          { folder: 'infra', source: '.' },
        ],
      ),
  },
  web: {
    title: 'the browser application',
    sources: [...commonSources, 'packages/web'],
    stamp: 'packages/web/dist/.built',
    run: () => runCommand('npm', ['run', 'build', '--workspace', 'packages/web'], { env: { CI: 'true' } }),
  },
};

/** Builds what its sources have changed since; gives whether there was anything to do. */
export async function ensureBuilt(name, { isQuiet = false } = {}) {
  const lock = join(stateFolder, `build-${name}.lock`);
  return withLock(lock, () => buildIfChanged(builds[name], isQuiet), { withinMs: 600_000 });
}

async function buildIfChanged({ title, sources, stamp, run }, isQuiet) {
  const path = join(rootFolder, stamp);
  const wanted = fingerprint(sources);
  if (existsSync(path) && readFileSync(path, 'utf8') === wanted) return false;
  await (isQuiet ? run() : step(`Building ${title}`, run));
  mkdirSync(dirname(path), { recursive: true });
  // Written last: a build cut short is done again. The sources may have changed meanwhile, then it is done again too.
  writeFileSync(path, wanted);
  return true;
}

async function compile(projects, packages) {
  for (const { folder, source } of packages) {
    const packageFolder = join(rootFolder, folder);
    tidyCompiledFiles({
      packageFolder,
      sourceFolder: join(packageFolder, source),
      outputFolder: join(packageFolder, 'dist'),
    });
  }
  await runCommand(process.execPath, ['node_modules/typescript/bin/tsc', '-b', ...projects]);
}
