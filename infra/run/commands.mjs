import { spawn } from 'node:child_process';
import { rootFolder } from './places.mjs';

const running = new Set();

/** A command that failed, with everything it printed. */
export class CommandFault extends Error {
  constructor(text, output) {
    super(text);
    this.output = output;
  }
}

/**
 * Runs a command to its end and gives what it printed; throws a CommandFault when it fails.
 *
 * It gets a process group of its own, so that it and all it starts can be ended together.
 *
 * @param mustFinish the command must not be cut short (an installer would leave the machine half changed): a stop waits
 * @param timeoutMs after which it is ended and counts as failed
 */
export function runCommand(command, words, options = {}) {
  const { cwd = rootFolder, env = {}, mustFinish = false, timeoutMs } = options;
  return new Promise((resolve, reject) => {
    const child = spawn(command, words, {
      cwd,
      env: { ...process.env, ...env },
      detached: true,
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    const entry = { child, mustFinish };
    running.add(entry);
    const timer = timeoutMs && setTimeout(() => endGroup(child, 'SIGKILL'), timeoutMs);
    let output = '';
    for (const stream of [child.stdout, child.stderr]) stream.on('data', (text) => (output += text));
    const done = (fault) => {
      clearTimeout(timer);
      running.delete(entry);
      if (fault) reject(new CommandFault(fault, output));
      else resolve(output);
    };
    child.once('error', (fault) => done(`${command}: ${fault.message}`));
    child.once('close', (code, signal) =>
      done(describeEnd(`${command} ${words[0] ?? ''}`.trim(), code, signal)),
    );
  });
}

/** Ends the running commands, but waits for those that must finish. */
export async function endCommands() {
  await Promise.all(
    [...running].map(({ child, mustFinish }) => {
      const closed = new Promise((resolve) => child.once('close', resolve));
      if (!mustFinish) endGroup(child, 'SIGTERM');
      const force = setTimeout(() => !mustFinish && endGroup(child, 'SIGKILL'), 5_000);
      return closed.finally(() => clearTimeout(force));
    }),
  );
}

function describeEnd(name, code, signal) {
  if (code === 0) return undefined;
  return signal ? `${name} was ended by ${signal}` : `${name} ended with code ${code}`;
}

function endGroup(child, signal) {
  try {
    process.kill(-child.pid, signal);
  } catch (fault) {
    if (fault.code !== 'ESRCH') throw fault;
  }
}
