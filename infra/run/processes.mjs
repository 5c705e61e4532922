import { readFileSync } from 'node:fs';
import { setTimeout as pause } from 'node:timers/promises';

/**
 * The command line of a running process, its arguments joined by blanks, or '' when there is none. A zombie has an
 * empty command line and so counts as gone.
 */
export function commandLineOf(pid) {
  return readProc(`${pid}/cmdline`).replaceAll('\0', ' ').trim();
}

/**
 * A text that no other process, past or future, shares: numbers of processes are given out again, also after a restart
 * of the machine. '' when there is no such process or it is a zombie.
 */
export function identityOf(pid) {
  if (commandLineOf(pid) === '') return '';
  return `${pid} ${statusFields(pid)[19]} ${readProc('sys/kernel/random/boot_id').trim()}`;
}

/** The number of the process that started this one; NaN when there is no such process. */
export function parentOf(pid) {
  return Number(statusFields(pid)[1]);
}

/** The fields of /proc/<pid>/stat after the program's name, which stands in parentheses and may hold blanks. */
function statusFields(pid) {
  return readProc(`${pid}/stat`).split(') ').at(-1)?.split(' ') ?? [];
}

/** Whether the process of this identity still runs. */
export function isAlive(identity) {
  return identity !== '' && identityOf(Number.parseInt(identity, 10)) === identity;
}

/**
 * Whether the process is the one we started: a remembered number alone never justifies a signal, its command line must
 * also hold the mark, which is a path inside this clone.
 */
export function isOurs(pid, mark) {
  return Number.isInteger(pid) && pid > 1 && `${commandLineOf(pid)} `.includes(mark);
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

function readProc(name) {
  try {
    return readFileSync(`/proc/${name}`, 'utf8');
  } catch {
    return '';
  }
}
