import { existsSync, readdirSync, rmSync } from 'node:fs';
import { join, relative } from 'node:path';

const compiled = /(\.d\.ts|\.js)(\.map)?$/;

/**
 * Readies a folder of compiled files for the compiler, which itself neither removes the output of a source that is gone
 * nor notices that somebody emptied the folder.
 */
export function tidyCompiledFiles({ packageFolder, sourceFolder, outputFolder }) {
  if (!existsSync(outputFolder)) rmSync(join(packageFolder, 'tsconfig.tsbuildinfo'), { force: true });
  else removeOrphans(sourceFolder, outputFolder);
}

function removeOrphans(sourceFolder, outputFolder) {
  const entries = readdirSync(outputFolder, { recursive: true, withFileTypes: true });
  for (const entry of entries) {
    const path = join(entry.parentPath ?? entry.path, entry.name);
    if (!entry.isFile() || !compiled.test(entry.name)) continue;
    const source = join(sourceFolder, relative(outputFolder, path).replace(compiled, '.ts'));
    if (!existsSync(source)) rmSync(path, { force: true });
  }
}
