import { spawn } from 'node:child_process';
import { requireProgram } from './programs.mjs';

/**
 * Starts a program of MariaDB whose data flow through us.
 * @returns the process and a promise of its end, which fails with what it said when its code is not 0
 */
export function startPiped(name, words) {
  const child = spawn(requireProgram(name), words, { stdio: ['pipe', 'pipe', 'pipe'] });
  let said = '';
  child.stderr.on('data', (text) => (said += text));
  const ended = new Promise((resolve, reject) => {
    child.once('error', reject);
    child.once('close', (code) => (code === 0 ? resolve() : reject(new Error(`${name}: ${said.trim()}`))));
  });
  // Met where it is waited for: the pipe into it may fail first.
  ended.catch(() => {});
  return { child, ended };
}
