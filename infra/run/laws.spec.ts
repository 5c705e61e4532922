import { execFile } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';

/**
 * A law that does not fire is none. Here a small house is built that breaks each of them once, beside code that keeps
 * them, and the linters are set on it.
 */
const root = join(__dirname, '../..');
let house: string;

beforeAll(() => {
  house = mkdtempSync(join(tmpdir(), 'laws-'));
  const copied = [
    'eslint.config.mjs',
    '.dependency-cruiser.mjs',
    'tsconfig.base.json',
    ...['common', 'api'].flatMap((name) => [
      `packages/${name}/tsconfig.json`,
      `packages/${name}/tsconfig.spec.json`,
    ]),
    ...['', '.app', '.spec'].map((kind) => `packages/web/tsconfig${kind}.json`),
  ];
  for (const path of copied) cpSync(join(root, path), join(house, path));
  symlinkSync(join(root, 'node_modules'), join(house, 'node_modules'));
  writeFileSync(join(house, 'package.json'), '{ "type": "module" }');
  for (const [path, lines] of Object.entries(files)) write(path, lines);
});

afterAll(() => rmSync(house, { recursive: true, force: true }));

const common = 'packages/common/src';
const api = 'packages/api/src';
const web = 'packages/web/src/app';

const files: Record<string, string[]> = {
  [`${common}/money/bad.ts`]: [
    "import { readFileSync } from 'node:fs';",
    "import { z } from 'zod';",
    "import { platform } from '../../../api/src/platform/platform.js';",
    "import { builder } from '../testing/builder.js';",
    'export const bad = [readFileSync, z, platform, builder, Date.now(), new Date(), Math.random()];',
  ],
  [`${common}/money/good.ts`]: ['export const day = (iso: string): number => new Date(iso).getTime();'],
  [`${common}/money/one.ts`]: ["import { two } from './two.js';", 'export const one = (): number => two();'],
  [`${common}/money/two.ts`]: ["import { one } from './one.js';", 'export const two = (): number => one();'],
  [`${common}/testing/builder.ts`]: ['export const builder = 1;'],
  [`${api}/compose.ts`]: ['export const compose = 1;'],
  [`${api}/platform/platform.ts`]: [
    "import { leads } from '../features/leads/leads-public.js';",
    'export const platform = leads;',
  ],
  [`${api}/features/leads/leads-public.ts`]: ['export const leads = 1;'],
  [`${api}/features/leads/lead-service.ts`]: ['export const service = 1;'],
  [`${api}/features/jobs/bad-imports.ts`]: [
    "import { compose } from '../../compose.js';",
    "import { service } from '../leads/lead-service.js';",
    "import { part } from '../../../../web/src/app/ui/part.js';",
    "import { gone } from './gone.js';",
    'export const bad: unknown[] = [compose, service, part, gone];',
  ],
  [`${api}/features/jobs/bad-code.ts`]: [
    "import { type EntityManager } from 'typeorm';",
    'export async function bad(manager: EntityManager): Promise<void> {',
    "  manager.getRepository('job');",
    "  await manager.query('select 1');",
    '  Promise.resolve(1);',
    '  const loose: any = 1;',
    "  if (loose) throw new Error('no');",
    '}',
    "export function pick(kind: 'a' | 'b'): number {",
    "  switch (kind) { case 'a': return 1; }",
    '  return 0;',
    '}',
    '[1].forEach(async () => { await Promise.resolve(); });',
  ],
  [`${api}/features/jobs/good.ts`]: [
    "import { Column, Entity, ForeignKey, Index, PrimaryColumn, Unique } from 'typeorm';",
    "import { leads } from '../leads/leads-public.js';",
    'export const good = [Column, Entity, ForeignKey, Index, PrimaryColumn, Unique, leads];',
  ],
  [`${web}/platform/session/session-state.ts`]: [
    "import { shell } from '../../shell/shell';",
    'export const session = shell;',
  ],
  [`${web}/shell/shell.ts`]: ['export const shell = 1;'],
  [`${web}/ui/part.ts`]: [
    "import { Store } from '@ngrx/store';",
    "import { session } from '../platform/session/session-state';",
    'export const part = [Store, session];',
  ],
  [`${web}/leads/leads-public.ts`]: ['export const leads = 1;'],
  [`${web}/leads/lead-screen.ts`]: [
    "import { Component } from '@angular/core';",
    "import { readFileSync } from 'node:fs';",
    "import { z } from 'zod';",
    "import { compose } from '../../../../api/src/compose';",
    `@Component({ selector: 'bm-lead', template: '<img src="a.png" /><p (click)="go()">x</p>' })`,
    'export class LeadScreen { go(): unknown { return [readFileSync, z, compose]; } }',
  ],
  [`${web}/jobs/job-screen.ts`]: [
    "import { LeadScreen } from '../leads/lead-screen';",
    "import { leads } from '../leads/leads-public';",
    "import { shell } from '../shell/shell';",
    'export const job = [LeadScreen, leads, shell];',
  ],
  [`${web}/jobs/job.html`]: ['<label>Name</label>'],
};

function write(path: string, lines: string[]): void {
  mkdirSync(join(house, dirname(path)), { recursive: true });
  writeFileSync(join(house, path), `${lines.join('\n')}\n`);
}

/** What a linter prints; both end with an error code here. */
function lint(script: string, ...words: string[]): Promise<string> {
  return new Promise((resolve) => {
    const command = [join(root, 'node_modules', script), ...words];
    execFile(process.execPath, command, { cwd: house, maxBuffer: 1e8 }, (_fault, stdout) => resolve(stdout));
  });
}

it('refuses every import against the arrows', async () => {
  const words = ['packages', '--config', '.dependency-cruiser.mjs', '--output-type', 'json'];
  const report = JSON.parse(await lint('dependency-cruiser/bin/dependency-cruise.mjs', ...words)) as {
    summary: { violations: { from: string; rule: { name: string } }[] };
  };
  const fired = report.summary.violations.map(
    ({ from, rule }) => `${from.replace('packages/', '')} ${rule.name}`,
  );
  expect([...new Set(fired)].sort()).toEqual([
    'api/src/features/jobs/bad-imports.ts api-knows-no-web',
    'api/src/features/jobs/bad-imports.ts api-slice-by-its-public-file',
    'api/src/features/jobs/bad-imports.ts feature-knows-no-composition',
    'api/src/features/jobs/bad-imports.ts found',
    'api/src/platform/platform.ts platform-knows-no-feature',
    'common/src/money/bad.ts common-is-pure',
    'common/src/money/bad.ts common-slices-stand-apart-from-tests',
    'common/src/money/bad.ts common-stands-alone',
    'common/src/money/one.ts no-cycle',
    'web/src/app/jobs/job-screen.ts web-slice-by-its-public-file',
    'web/src/app/leads/lead-screen.ts web-has-no-node',
    'web/src/app/leads/lead-screen.ts web-knows-no-server',
    'web/src/app/platform/session/session-state.ts web-ground-knows-no-slice',
    'web/src/app/ui/part.ts web-ui-knows-no-state',
  ]);
});

it('refuses every way around the laws in code and templates', async () => {
  const report = JSON.parse(await lint('eslint/bin/eslint.js', 'packages', '--format', 'json')) as {
    filePath: string;
    messages: { line: number; ruleId: string }[];
  }[];
  const fired = report.flatMap(({ filePath, messages }) =>
    messages.map(({ line, ruleId }) => `${filePath.split('/').at(-1)}:${line} ${ruleId.split('/').at(-1)}`),
  );
  expect([...new Set(fired)].sort()).toEqual([
    'bad-code.ts:1 no-restricted-imports',
    'bad-code.ts:10 switch-exhaustiveness-check',
    'bad-code.ts:13 no-misused-promises',
    'bad-code.ts:3 no-restricted-syntax',
    'bad-code.ts:4 no-restricted-syntax',
    'bad-code.ts:5 no-floating-promises',
    'bad-code.ts:6 no-explicit-any',
    'bad-code.ts:7 no-restricted-syntax',
    'bad.ts:2 no-restricted-syntax',
    'bad.ts:5 no-restricted-syntax',
    'job.html:1 label-has-associated-control',
    'lead-screen.ts:3 no-restricted-syntax',
    'lead-screen.ts:5 alt-text',
    'lead-screen.ts:5 click-events-have-key-events',
    'lead-screen.ts:5 interactive-supports-focus',
    'lead-screen.ts:5 prefer-on-push-component-change-detection',
  ]);
});
