import { linkSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { identityOf, isAlive } from './processes.mjs';

/**
 * Runs the work while holding the lock file, so that of several shells only one at a time does it. Fails when the lock
 * cannot be had within the time (milliseconds).
 */
export async function withLock(path, work, { withinMs = 120_000 } = {}) {
  const until = Date.now() + withinMs;
  let release;
  while (!(release = takeLock(path))) {
    if (Date.now() > until) throw new Error(`${path} is held by process ${holderOf(path)}; waited too long`);
    await pause(50);
  }
  try {
    return await work();
  } finally {
    release();
  }
}

/**
 * Takes the lock if nobody alive holds it; one left behind by a dead process is taken over.
 * @returns the function that gives it back, or undefined when another process has it
 */
export function takeLock(path) {
  mkdirSync(dirname(path), { recursive: true });
  const holder = readHolder(path);
  if (holder !== undefined && !isAlive(holder)) rmSync(path, { force: true });
  return linkInto(path) ? () => rmSync(path, { force: true }) : undefined;
}

/** The number of the process that holds the lock, or undefined. */
export function holderOf(path) {
  const holder = readHolder(path);
  return holder === undefined ? undefined : Number.parseInt(holder, 10);
}

/** A hard link is made in one step and fails if the name exists: the file never stands there without its holder. */
function linkInto(path) {
  const draft = `${path}.${process.pid}`;
  writeFileSync(draft, identityOf(process.pid));
  try {
    linkSync(draft, path);
    return true;
  } catch (fault) {
    if (fault.code !== 'EEXIST') throw fault;
    return false;
  } finally {
    rmSync(draft, { force: true });
  }
}

function readHolder(path) {
  try {
    return readFileSync(path, 'utf8');
  } catch {
    return undefined;
  }
}
