import { join } from 'node:path';
import { rootFolder } from './places.mjs';
import { readJson } from './private-file.mjs';

/**
 * The demo sign-ins as lines of a table, one a role; none when there is no demo shop. The file is a list of
 * `{ role, email, password, shop }`.
 */
export function signInLines() {
  const signIns = readJson(join(rootFolder, 'infra/demo/sign-ins.json'));
  if (!Array.isArray(signIns)) return [];
  const rows = signIns.map(({ role, email, password, shop = '' }) => [role, email, password, shop]);
  const widths = [0, 1, 2].map((column) => Math.max(...rows.map((row) => row[column].length)));
  return rows.map((row) =>
    `  ${row.map((cell, column) => cell.padEnd(widths[column] ?? 0)).join('  ')}`.trimEnd(),
  );
}
