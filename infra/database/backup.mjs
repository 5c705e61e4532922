/**
 * Writes a backup of the schema into one compressed file, as it stood at one instant, while the shop works on:
 *
 *   node infra/database/backup.mjs <file.sql.gz>
 *
 * Reads BOOKMATCH_DB_HOST, _PORT, _NAME, _OWNER_USER and _OWNER_PASSWORD. The file appears only when it is complete.
 */
import { createWriteStream, existsSync, mkdirSync, renameSync, rmSync, statSync } from 'node:fs';
import { dirname, resolve } from 'node:path';
import { pipeline } from 'node:stream/promises';
import { createGzip } from 'node:zlib';
import { connectionFromEnvironment, withOptionFile } from './connection.mjs';
import { LastBytes } from './last-bytes.mjs';
import { plainly } from './plainly.mjs';
import { startPiped } from './piped-program.mjs';

const [given] = process.argv.slice(2);
if (!given) {
  console.error('Usage: node infra/database/backup.mjs <file.sql.gz>');
  process.exit(2);
}
const target = resolve(given);
if (existsSync(target)) {
  console.error(`${target} exists already and is left as it is.`);
  process.exit(1);
}
await plainly(() => backUp(connectionFromEnvironment(), target));

async function backUp(connection, path) {
  const draft = `${path}.part`;
  mkdirSync(dirname(path), { recursive: true });
  try {
    await withOptionFile(connection, (optionFile) => dump(optionFile, connection.database, draft));
    renameSync(draft, path);
    console.log(`${path}: ${statSync(path).size} bytes`);
  } finally {
    rmSync(draft, { force: true });
  }
}

async function dump(optionFile, database, path) {
  // One transaction sees one instant; nothing is locked, and rows go out as they are read.
  const how = [
    '--single-transaction',
    '--quick',
    '--hex-blob',
    '--triggers',
    '--routines',
    '--tz-utc',
    '--skip-dump-date',
  ];
  const { child, ended } = startPiped('mariadb-dump', [optionFile, ...how, database]);
  const end = new LastBytes();
  await pipeline(child.stdout, end, createGzip(), createWriteStream(path, { mode: 0o600 }));
  await ended;
  if (!end.isCompleteDump) throw new Error('The backup was cut short.');
}
