import { existsSync } from 'node:fs';
import { join } from 'node:path';

/** Debian keeps servers in sbin, which an ordinary account often has not in its path. */
const folders = [
  ...(process.env.PATH ?? '').split(':'),
  '/usr/local/sbin',
  '/usr/sbin',
  '/usr/local/bin',
  '/usr/bin',
];

/** The full path of a program of MariaDB (`mariadbd`, `mariadb-install-db`, `mariadb-dump`), or undefined. */
export function findProgram(name) {
  return folders
    .filter(Boolean)
    .map((folder) => join(folder, name))
    .find((path) => existsSync(path));
}

/** Like findProgram, but says what to install when the program is missing. */
export function requireProgram(name) {
  const path = findProgram(name);
  if (!path) throw new Error(`${name} is missing: apt-get install --no-install-recommends mariadb-server`);
  return path;
}
