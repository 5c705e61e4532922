import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { ensureBuilt } from './build.mjs';
import { CommandFault } from './commands.mjs';
import { journeysCheck } from './journeys.mjs';
import { rootFolder } from './places.mjs';
import { commandCheck, jestCheck, tool } from './test-runners.mjs';

const tsc = tool('typescript/bin/tsc');
const types = (...projects) => commandCheck(...projects.map((project) => [tsc, '-p', project, '--noEmit']));
const endToEndTypes = 'packages/web/e2e/tsconfig.json';
const has = (path) => existsSync(join(rootFolder, path));

/**
 * Everything `npm test` checks, in a sensible order: what is quick to fail comes first.
 *
 * `weight` says how many cores a check keeps busy, `after` what must have passed before it, `needs` what it runs beside.
 */
export const checks = [
  {
    name: 'format',
    run: commandCheck([tool('prettier/bin/prettier.cjs'), '--check', '.', '--log-level=warn']),
  },
  { name: 'styles', run: commandCheck(['infra/run/check-styles.mjs']) },
  { name: 'build-common', run: buildCheck('common') },
  {
    name: 'imports',
    // The demo reaches the API through what its package offers, which is the built files.
    after: ['build-server'],
    run: commandCheck([
      tool('dependency-cruiser/bin/dependency-cruise.mjs'),
      ...['packages', 'infra', '--config', '.dependency-cruiser.mjs', '--output-type', 'err'],
    ]),
  },
  { name: 'common', run: jestCheck('packages/common', 1) },
  { name: 'types-common', run: types('packages/common/tsconfig.spec.json') },
  { name: 'build-server', after: ['build-common'], run: buildCheck('server') },
  { name: 'build-web', after: ['build-common'], run: buildCheck('web') },
  { name: 'lint', after: ['build-server'], run: commandCheck([tool('eslint/bin/eslint.js'), '.']) },
  { name: 'types-api', after: ['build-common'], run: types('packages/api/tsconfig.spec.json') },
  { name: 'types-infra', after: ['build-server'], run: types('infra/tsconfig.spec.json') },
  {
    name: 'types-web',
    after: ['build-common'],
    run: commandCheck(
      [
        tool('@angular/compiler-cli/bundles/src/bin/ngc.js'),
        '-p',
        'packages/web/tsconfig.app.json',
        '--noEmit',
      ],
      [tsc, '-p', 'packages/web/tsconfig.spec.json', '--noEmit'],
      ...(has(endToEndTypes) ? [[tsc, '-p', endToEndTypes, '--noEmit']] : []),
    ),
  },
  { name: 'infra', needs: ['database'], run: jestCheck('infra', 1) },
  { name: 'web', weight: 2, run: jestCheck('packages/web', 2) },
  // One suite starts the API as a process of its own, which reads the built rules.
  {
    name: 'api',
    weight: 2,
    after: ['build-common'],
    needs: ['database'],
    run: jestCheck('packages/api', 2),
  },
  ...(has('packages/web/e2e')
    ? [
        {
          name: 'journeys',
          weight: 2,
          after: ['build-server', 'build-web'],
          needs: ['chromium', 'database'],
          run: journeysCheck,
        },
      ]
    : []),
];

function buildCheck(name) {
  return async () => {
    try {
      await ensureBuilt(name, { isQuiet: true });
      return { passed: 1, failed: 0, output: '' };
    } catch (fault) {
      if (!(fault instanceof CommandFault)) throw fault;
      return { passed: 0, failed: 1, output: fault.output };
    }
  };
}

/**
 * The checks of these names, with those that must come before them; all without names.
 * Throws when a name is none of ours.
 */
export function chooseChecks(names) {
  const unknown = names.find((name) => !checks.some((check) => check.name === name));
  if (unknown)
    throw new Error(`There is no check ${unknown}; there are ${checks.map(({ name }) => name).join(', ')}.`);
  if (names.length === 0) return checks;
  const chosen = new Set(names);
  // Each one stands after what it needs, so going backwards meets every need of a need.
  for (const { name, after = [] } of checks.toReversed()) {
    if (chosen.has(name)) after.forEach((need) => chosen.add(need));
  }
  return checks.filter(({ name }) => chosen.has(name));
}
