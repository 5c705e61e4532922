import { spawn } from 'node:child_process';
import { closeSync, mkdirSync, openSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { rememberedOrFreePort } from '../run/ports.mjs';
import { readJson, writePrivateFile, writePrivateJson } from '../run/private-file.mjs';
import { endProcess, isOurs } from '../run/processes.mjs';
import { accountStatements } from './accounts.mjs';
import { readOrMakeCredentials } from './credentials.mjs';
import { ensureDataFolder } from './data-folder.mjs';
import { greets, waitForGreeting } from './greeting.mjs';
import { requireProgram } from './programs.mjs';
import { serverArguments } from './settings.mjs';

/** Where one private server keeps its things: all in one folder that nobody else uses. */
export function serverFiles(folder) {
  return {
    dataFolder: join(folder, 'data'),
    credentials: join(folder, 'credentials.json'),
    initFile: join(folder, 'init.sql'),
    state: join(folder, 'server.json'),
    log: join(folder, 'server.log'),
  };
}

/**
 * Starts the private server of a folder, or finds it running. The folder, the data, the accounts and the port are made
 * when missing; the port is remembered. A server killed last time recovers by itself.
 *
 * @param durability 'durable' or 'fast', see settings.mjs
 * @returns `{ port, pid, credentials, started }`, and when it was started now also `{ child, logFile, stop }`
 */
export async function startServer(folder, { durability }) {
  const files = serverFiles(folder);
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const credentials = readOrMakeCredentials(files.credentials);
  const running = await runningServer(folder);
  if (running) return { ...running, credentials, started: false };
  await endLeftover(files);
  await ensureDataFolder(files.dataFolder);
  writePrivateFile(files.initFile, `${accountStatements(credentials).join('\n')}\n`);
  const port = await rememberedOrFreePort(readJson(files.state)?.port);
  const child = await launch(files, port, durability);
  return {
    port,
    pid: child.pid,
    child,
    logFile: files.log,
    credentials,
    started: true,
    stop: () => stopServer(folder),
  };
}

/** The running server of the folder as `{ port, pid }`, or undefined. Only a process on this very data folder counts. */
export async function runningServer(folder) {
  const files = serverFiles(folder);
  const { port, pid } = readJson(files.state) ?? {};
  if (!isOurs(pid, markOf(files)) || !(await greets(port))) return undefined;
  return { port, pid };
}

/** Stops the server of the folder if it runs; its data stay. */
export async function stopServer(folder) {
  const files = serverFiles(folder);
  await endLeftover(files);
}

/** A server that runs but does not answer (its state was lost, or it hangs) would keep the data folder locked. */
async function endLeftover(files) {
  const mark = markOf(files);
  for (const pid of new Set([readJson(files.state)?.pid, pidInDataFolder(files)])) {
    if (isOurs(pid, mark)) await endProcess(pid, mark, { graceMs: 60_000 });
  }
}

function pidInDataFolder(files) {
  return Number(readJson(join(files.dataFolder, 'mariadbd.pid')));
}

function markOf(files) {
  return `--datadir=${files.dataFolder} `;
}

async function launch(files, port, durability) {
  const log = openSync(files.log, 'w', 0o600);
  const options = serverArguments({ ...files, port, durability });
  // Its own session: a Ctrl-C at the terminal must not reach the database before those who still write to it.
  const child = spawn(requireProgram('mariadbd'), options, { detached: true, stdio: ['ignore', log, log] });
  closeSync(log);
  let gone = false;
  child.once('exit', () => (gone = true));
  child.once('error', () => (gone = true));
  child.unref();
  writePrivateJson(files.state, { port, pid: child.pid });
  if (await waitForGreeting(port, { withinMs: 120_000, hasGivenUp: () => gone })) return child;
  throw new Error(`The database did not start. The end of ${files.log}:\n${lastLines(files.log)}`);
}

function lastLines(path, count = 15) {
  return readFileSync(path, 'utf8').trimEnd().split('\n').slice(-count).join('\n');
}
