import { linkSync, mkdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { commandLineOf } from './processes.mjs';

/**
 * Runs the work while holding the lock file, so that of several shells only one at a time does it. A lock whose holder
 * is dead is taken over. Fails when the lock cannot be had within the time (milliseconds).
 */
export async function withLock(path, work, { withinMs = 120_000 } = {}) {
  await take(path, Date.now() + withinMs);
  try {
    return await work();
  } finally {
    rmSync(path, { force: true });
  }
}

async function take(path, until) {
  mkdirSync(dirname(path), { recursive: true });
  while (!tryTake(path)) {
    if (isAbandoned(path)) rmSync(path, { force: true });
    else if (Date.now() > until)
      throw new Error(`${path} is held by process ${holderOf(path)}; waited too long`);
    else await pause(50);
  }
}

/** A hard link is made in one step and fails if the name exists: the file never stands there without its holder. */
function tryTake(path) {
  const draft = `${path}.${process.pid}`;
  writeFileSync(draft, String(process.pid));
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

function isAbandoned(path) {
  const holder = holderOf(path);
  return holder !== undefined && commandLineOf(holder) === '' && ageMs(path) > 100;
}

function holderOf(path) {
  try {
    return Number(readFileSync(path, 'utf8'));
  } catch {
    return undefined;
  }
}

function ageMs(path) {
  const made = statSync(path, { throwIfNoEntry: false })?.mtimeMs;
  return made === undefined ? 0 : Date.now() - made;
}
