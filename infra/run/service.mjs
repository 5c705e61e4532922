import { spawn } from 'node:child_process';
import { closeSync, mkdirSync, openSync, readFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { rootFolder } from './places.mjs';
import { endProcess } from './processes.mjs';

/**
 * Starts a Node program that runs until it is stopped. It has a session of its own, so that a Ctrl-C at the terminal
 * does not reach all at once but we can stop one after the other; what it prints goes to its log file.
 *
 * @param script absolute path of the program, also the mark by which the process is recognized later
 * @param onCrash called with the service when it ends without being stopped
 */
export function startService({ name, script, env, logFile, onCrash }) {
  mkdirSync(dirname(logFile), { recursive: true, mode: 0o700 });
  const log = openSync(logFile, 'w', 0o600);
  const child = spawn(process.execPath, ['--enable-source-maps', script], {
    cwd: rootFolder,
    env: { ...process.env, ...env },
    detached: true,
    stdio: ['ignore', log, log],
  });
  closeSync(log);
  const service = { name, pid: child.pid, script, logFile, ended: false, stop };
  let isStopping = false;
  child.once('exit', (code, signal) => {
    service.ended = true;
    if (!isStopping)
      onCrash({ ...service, reason: signal ? `was ended by ${signal}` : `ended with code ${code}` });
  });
  return service;

  async function stop() {
    isStopping = true;
    if (!service.ended) await endProcess(child.pid, script);
  }
}

/** Waits until the address answers with success; fails when the service ended or the time (milliseconds) ran out. */
export async function waitUntilReady(service, address, { withinMs = 60_000 } = {}) {
  const until = Date.now() + withinMs;
  while (!(await answers(address))) {
    if (service.ended) throw new Error(`${service.name} did not start.\n${lastLines(service.logFile)}`);
    if (Date.now() > until)
      throw new Error(`${service.name} is not ready at ${address}.\n${lastLines(service.logFile)}`);
    await pause(50);
  }
}

async function answers(address) {
  try {
    return (await fetch(address, { signal: AbortSignal.timeout(2_000) })).ok;
  } catch {
    return false;
  }
}

/** The end of a log file, for telling what went wrong. */
export function lastLines(path, count = 25) {
  try {
    return readFileSync(path, 'utf8').trimEnd().split('\n').slice(-count).join('\n');
  } catch {
    return '';
  }
}
