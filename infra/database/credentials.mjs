import { randomBytes } from 'node:crypto';
import { readJson, writePrivateJson } from '../run/private-file.mjs';

/**
 * The accounts of one private server: root administers it, the owner may change the schema, the application may only
 * use it. Passwords are random, made once and kept in a file that only this account can read.
 */
export function readOrMakeCredentials(path) {
  const kept = readJson(path);
  if (isWhole(kept)) return kept;
  const made = {
    database: 'bookmatch',
    root: { user: 'root', password: randomPassword() },
    owner: { user: 'bookmatch_owner', password: randomPassword() },
    application: { user: 'bookmatch_app', password: randomPassword() },
  };
  writePrivateJson(path, made);
  return made;
}

function isWhole(kept) {
  return Boolean(kept?.database && kept.root?.password && kept.owner?.password && kept.application?.password);
}

function randomPassword() {
  return randomBytes(24).toString('base64url');
}
