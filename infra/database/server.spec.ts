import { execFile } from 'node:child_process';
import { chmodSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { type Connection, createConnection, type RowDataPacket } from 'mysql2/promise';

const run = promisify(execFile);
type Account = { user: string; password: string };
type Credentials = { database: string; root: Account; owner: Account; application: Account };

let folder: string;
const open: Connection[] = [];

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'server-spec-'));
});

afterEach(async () => {
  await Promise.allSettled(open.splice(0).map((connection) => connection.end()));
  await run(process.execPath, [join(__dirname, 'stop.mjs'), folder]);
  rmSync(folder, { recursive: true, force: true });
});

async function start(...options: string[]): Promise<{ port: number; started: boolean }> {
  const { stdout } = await run(process.execPath, [join(__dirname, 'start.mjs'), folder, ...options]);
  return JSON.parse(stdout) as { port: number; started: boolean };
}

function credentials(): Credentials {
  return JSON.parse(readFileSync(join(folder, 'credentials.json'), 'utf8')) as Credentials;
}

function pid(): number {
  return (JSON.parse(readFileSync(join(folder, 'server.json'), 'utf8')) as { pid: number }).pid;
}

async function connect(port: number, account: Account, database?: string): Promise<Connection> {
  const connection = await createConnection({ host: '127.0.0.1', port, ...account, database });
  open.push(connection);
  return connection;
}

async function asRoot(port: number): Promise<Connection> {
  return connect(port, credentials().root);
}

async function settings(connection: Connection, names: string[]): Promise<unknown[]> {
  const [[row]] = await connection.query<RowDataPacket[]>(
    `SELECT ${names.map((name) => `@@${name}`).join(', ')}`,
  );
  return names.map((name) => (row as Record<string, unknown>)[`@@${name}`]);
}

it('runs with the settings that keep an acknowledged commit', async () => {
  const root = await asRoot((await start()).port);
  const names = [
    'innodb_flush_log_at_trx_commit',
    'sync_binlog',
    'log_bin',
    'binlog_format',
    'innodb_snapshot_isolation',
  ];
  expect(await settings(root, names)).toEqual([1, 1, 1, 'ROW', 1]);
  const texts = ['bind_address', 'time_zone', 'character_set_server', 'skip_name_resolve', 'local_infile'];
  expect(await settings(root, texts)).toEqual(['127.0.0.1', '+00:00', 'utf8mb4', 1, 0]);
  expect(String(await settings(root, ['sql_mode']))).toContain('STRICT_ALL_TABLES');
});

it('does not wait for the disk when tests ask for that', async () => {
  const root = await asRoot((await start('--fast')).port);
  const names = ['innodb_flush_log_at_trx_commit', 'log_bin', 'innodb_snapshot_isolation'];
  expect(await settings(root, names)).toEqual([2, 0, 1]);
});

it('keeps its passwords where only their owner reads them, and lets nobody in without', async () => {
  const { port } = await start('--fast');
  for (const name of ['credentials.json', 'init.sql'])
    expect(statSync(join(folder, name)).mode & 0o777).toBe(0o600);
  for (const user of ['root', 'bookmatch_owner', 'bookmatch_app', 'mysql', '']) {
    await expect(connect(port, { user, password: '' })).rejects.toThrow('Access denied');
  }
});

it('gives the owner its schema and nothing else', async () => {
  const { port } = await start('--fast');
  const { owner, application, database } = credentials();
  const connection = await connect(port, owner, database);
  await connection.query('CREATE TABLE job (id int PRIMARY KEY)');
  await connection.query(`GRANT SELECT, INSERT ON ${database}.job TO '${application.user}'@'127.0.0.1'`);
  for (const sql of ['CREATE DATABASE other', 'SELECT * FROM mysql.global_priv', "CREATE USER 'x'@'%'"]) {
    await expect(connection.query(sql)).rejects.toThrow(/denied/);
  }
});

it('gives the application only what it was granted: no change of schema, no other schema', async () => {
  const { port } = await start('--fast');
  const { owner, application, database } = credentials();
  const asOwner = await connect(port, owner, database);
  await asOwner.query('CREATE TABLE job (id int PRIMARY KEY)');
  await asOwner.query(`GRANT SELECT, INSERT ON ${database}.job TO '${application.user}'@'127.0.0.1'`);
  await (await asRoot(port)).query('CREATE DATABASE other');
  const connection = await connect(port, application, database);
  await connection.query('INSERT INTO job VALUES (1)');
  for (const sql of [
    'UPDATE job SET id = 2',
    'DROP TABLE job',
    'ALTER TABLE job ADD x int',
    'TRUNCATE job',
    'USE other',
  ]) {
    await expect(connection.query(sql)).rejects.toThrow(/denied/);
  }
});

it('is found running by a second start, on the same port after a stop', async () => {
  const first = await start('--fast');
  expect(await start('--fast')).toEqual({ port: first.port, started: false });
  await run(process.execPath, [join(__dirname, 'stop.mjs'), folder]);
  await expect(connect(first.port, credentials().root)).rejects.toThrow('ECONNREFUSED');
  expect(await start('--fast')).toEqual({ port: first.port, started: true });
});

it('recovers what was committed when it was killed', async () => {
  const { port } = await start();
  const { owner, database } = credentials();
  const connection = await connect(port, owner, database);
  connection.on('error', () => undefined);
  await connection.query('CREATE TABLE job (id int PRIMARY KEY)');
  await connection.query('INSERT INTO job VALUES (7)');
  process.kill(pid(), 'SIGKILL');
  const again = await start();
  expect(again.started).toBe(true);
  const [rows] = await (await connect(again.port, owner, database)).query('SELECT id FROM job');
  expect(rows).toEqual([{ id: 7 }]);
});

it('never signals a process that is not its own, whatever its remembered number says', async () => {
  writeFileSync(join(folder, 'server.json'), JSON.stringify({ port: 1, pid: process.pid }));
  const { started } = await start('--fast');
  expect(started).toBe(true);
  expect(pid()).not.toBe(process.pid);
});

it('says why it cannot start', async () => {
  await start('--fast');
  await run(process.execPath, [join(__dirname, 'stop.mjs'), folder]);
  writeFileSync(join(folder, 'data/ibdata1'), 'damaged');
  chmodSync(join(folder, 'data/ibdata1'), 0o600);
  await expect(start('--fast')).rejects.toThrow(/did not start[\s\S]*ibdata1/);
});
