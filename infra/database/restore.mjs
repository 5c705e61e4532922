/**
 * Brings a backup back into a schema that is empty:
 *
 *   node infra/database/restore.mjs <file.sql.gz>
 *
 * Reads BOOKMATCH_DB_HOST, _PORT, _NAME, _OWNER_USER and _OWNER_PASSWORD. A schema that holds tables is never touched.
 * Afterwards run the migrations: they also grant the application's account its share again.
 */
import { createReadStream } from 'node:fs';
import { pipeline } from 'node:stream/promises';
import { text } from 'node:stream/consumers';
import { createGunzip } from 'node:zlib';
import { connectionFromEnvironment, withOptionFile } from './connection.mjs';
import { LastBytes } from './last-bytes.mjs';
import { plainly } from './plainly.mjs';
import { startPiped } from './piped-program.mjs';

const [file] = process.argv.slice(2);
if (!file) {
  console.error('Usage: node infra/database/restore.mjs <file.sql.gz>');
  process.exit(2);
}
const connection = connectionFromEnvironment();
await plainly(() => withOptionFile(connection, restore));

async function restore(optionFile) {
  const before = await tableNames(optionFile);
  if (before.length > 0)
    throw new Error(`${connection.database} holds ${before.length} tables and is left as it is.`);
  await requireWhole();
  await readBack(optionFile);
  console.log(`${connection.database}: ${(await tableNames(optionFile)).length} tables restored`);
}

async function tableNames(optionFile) {
  const words = [optionFile, '--batch', '--skip-column-names', '--execute=SHOW TABLES', connection.database];
  const { child, ended } = startPiped('mariadb', words);
  child.stdin.end();
  const names = await text(child.stdout);
  await ended;
  return names.split('\n').filter(Boolean);
}

/** Reads the file to its end first, so that a damaged one restores nothing instead of a part. */
async function requireWhole() {
  const end = new LastBytes();
  await pipeline(createReadStream(file), createGunzip(), end.resume());
  if (!end.isCompleteDump) throw new Error(`${file} is not a whole backup.`);
}

async function readBack(optionFile) {
  const { child, ended } = startPiped('mariadb', [optionFile, connection.database]);
  child.stdout.resume();
  // When the client gives up, the pipe only breaks: what it said is the better message.
  const [piped] = await Promise.allSettled([pipeline(createReadStream(file), createGunzip(), child.stdin)]);
  await ended;
  if (piped.status === 'rejected') throw piped.reason;
}
