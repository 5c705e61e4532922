import { chmodSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';

/** Writes a file only its owner can read. It appears whole or not at all: a killed run leaves no half file. */
export function writePrivateFile(path, text) {
  mkdirSync(dirname(path), { recursive: true });
  const draft = `${path}.${process.pid}.new`;
  writeFileSync(draft, text, { mode: 0o600 });
  chmodSync(draft, 0o600);
  renameSync(draft, path);
}

/** Writes a value as JSON into a file only its owner can read. */
export function writePrivateJson(path, value) {
  writePrivateFile(path, `${JSON.stringify(value, null, 2)}\n`);
}

/** The JSON value in the file; undefined when the file is missing or damaged, so that it is simply made anew. */
export function readJson(path) {
  try {
    return JSON.parse(readFileSync(path, 'utf8'));
  } catch {
    return undefined;
  }
}
