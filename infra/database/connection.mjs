import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { writePrivateFile } from '../run/private-file.mjs';

/** The schema and the owner's account from the environment, the same variables the migrations read. */
export function connectionFromEnvironment(env = process.env) {
  const needed = ['BOOKMATCH_DB_NAME', 'BOOKMATCH_DB_OWNER_USER', 'BOOKMATCH_DB_OWNER_PASSWORD'];
  const missing = needed.filter((name) => !env[name]);
  if (missing.length > 0) throw new Error(`Please set ${missing.join(', ')}.`);
  return {
    host: env.BOOKMATCH_DB_HOST || '127.0.0.1',
    port: Number(env.BOOKMATCH_DB_PORT || 3306),
    database: env.BOOKMATCH_DB_NAME,
    user: env.BOOKMATCH_DB_OWNER_USER,
    password: env.BOOKMATCH_DB_OWNER_PASSWORD,
  };
}

/**
 * Calls the work with an option file for MariaDB's programs that holds the account. A password among the arguments
 * would be seen by everyone who may list processes.
 */
export async function withOptionFile({ host, port, user, password }, work) {
  const folder = mkdtempSync(join(tmpdir(), 'bookmatch-'));
  const path = join(folder, 'client.cnf');
  const lines = [
    '[client]',
    'protocol=tcp',
    `host=${host}`,
    `port=${port}`,
    `user=${user}`,
    `password=${quote(password)}`,
  ];
  try {
    writePrivateFile(path, `${lines.join('\n')}\ndefault-character-set=utf8mb4\n`);
    return await work(`--defaults-file=${path}`);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

function quote(text) {
  return `"${text.replaceAll('\\', '\\\\').replaceAll('"', '\\"')}"`;
}
