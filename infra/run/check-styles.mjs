/**
 * Holds the styling law: the browser application is styled by the theme's tokens alone. Piercing a component
 * (`::ng-deep`) and naming Material's internal classes break at its next version, so both are refused.
 */
import { readdirSync, readFileSync } from 'node:fs';
import { join, relative } from 'node:path';
import { rootFolder } from './places.mjs';

const refused = [
  { pattern: /::ng-deep/, why: 'pierces a component' },
  { pattern: /\.(mat-mdc|mdc)-/, why: "names a class inside Material's components" },
];

const folder = join(rootFolder, 'packages/web/src');
const files = readdirSync(folder, { recursive: true, encoding: 'utf8' })
  .filter((name) => /\.(scss|css|ts)$/.test(name) && !name.endsWith('.spec.ts'))
  .map((name) => join(folder, name));
const faults = files.flatMap(faultsIn);

for (const fault of faults) console.error(fault);
console.log(`${files.length} files looked at, ${faults.length} faults`);
process.exitCode = faults.length > 0 ? 1 : 0;

function faultsIn(path) {
  const lines = withoutComments(readFileSync(path, 'utf8')).split('\n');
  return lines.flatMap((line, index) =>
    refused
      .filter(({ pattern }) => pattern.test(line))
      .map(({ why }) => `${relative(rootFolder, path)}:${index + 1} ${why}: ${line.trim()}`),
  );
}

/** Comments are blanked, their line breaks kept so that line numbers stay true. */
function withoutComments(text) {
  return text.replace(/\/\*[\s\S]*?\*\/|^\s*\/\/.*$/gm, (comment) => comment.replace(/[^\n]/g, ' '));
}
