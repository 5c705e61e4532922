import { readFileSync } from 'node:fs';
import { setTimeout as pause } from 'node:timers/promises';

/**
 * The command line of a running process, its arguments joined by blanks, or '' when there is none. A zombie has an
 * empty command line and so counts as gone.
 */
export function commandLineOf(pid) {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').replaceAll('\0', ' ').trim();
  } catch {
    return '';
  }
}

/**
 * Whether the process is the one we started. Numbers of dead processes are given out again, so a remembered number
 * alone never justifies a signal: its command line must also hold the mark, which is a path inside this clone.
 */
export function isOurs(pid, mark) {
  return Number.isInteger(pid) && pid > 1 && commandLineOf(pid).includes(mark);
}

/** Asks the process to end, waits, and ends it by force if it does not. Times in milliseconds. */
export async function endProcess(pid, mark, { graceMs = 20_000 } = {}) {
  signal(pid, mark, 'SIGTERM');
  if (await waitUntilGone(pid, mark, graceMs)) return;
  signal(pid, mark, 'SIGKILL');
  await waitUntilGone(pid, mark, 5_000);
}

function signal(pid, mark, name) {
  if (!isOurs(pid, mark)) return;
  try {
    process.kill(pid, name);
  } catch (fault) {
    if (fault.code !== 'ESRCH') throw fault;
  }
}

async function waitUntilGone(pid, mark, withinMs) {
  const until = Date.now() + withinMs;
  while (isOurs(pid, mark)) {
    if (Date.now() > until) return false;
    await pause(20);
  }
  return true;
}
