import { spawn, type ChildProcess } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { setTimeout as pause } from 'node:timers/promises';

/** Linux counts a process's time in hundredths of a second. */
const TICKS_PER_SECOND = 100;

export type Server = { child: ChildProcess; address: string; stop(): Promise<void> };

/** Starts a server program and waits until it answers. What it logs goes nowhere, as in production behind a collector. */
export async function startServer(script: string, env: NodeJS.ProcessEnv, address: string): Promise<Server> {
  const child = spawn(process.execPath, [script], {
    env: { ...process.env, ...env },
    stdio: ['ignore', 'ignore', 'inherit'],
  });
  for (let tries = 0; !(await answers(address)); tries += 1) {
    if (child.exitCode !== null || tries > 300) throw new Error(`${script} did not start.`);
    await pause(100);
  }
  return {
    child,
    address: new URL(address).origin,
    stop: () =>
      new Promise((resolve) => {
        child.once('exit', () => resolve());
        child.kill('SIGTERM');
      }),
  };
}

async function answers(address: string): Promise<boolean> {
  return fetch(address).then(
    (response) => response.ok,
    () => false,
  );
}

/** The CPU time a process has used since its start, user and system, in microseconds. */
export function cpuMicroseconds(pid: number): number {
  const fields = readFileSync(`/proc/${pid}/stat`, 'utf8').split(') ')[1]?.split(' ') ?? [];
  return ((Number(fields[11]) + Number(fields[12])) / TICKS_PER_SECOND) * 1_000_000;
}

/** The memory a process holds now, in bytes. */
export function residentBytes(pid: number): number {
  return Number(readFileSync(`/proc/${pid}/statm`, 'utf8').split(' ')[1]) * 4096;
}
