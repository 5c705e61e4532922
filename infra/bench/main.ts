/**
 * The speed table. Runs beside a database that holds the demo shop: copies it 200 times, makes one copy large, starts the
 * API and a bare handler as processes of their own, and prints what guard asks for as ratios of this run.
 */
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { createConnection, type Connection, type RowDataPacket } from 'mysql2/promise';
import { cloneShop, tenantTables } from './clone-shop.js';
import { inflate } from './inflate.js';
import { measure, median, type Measured } from './load.js';
import { startServer, type Server } from './processes.js';
import { signIn } from './sign-in.js';

const SHOPS = 200;
const LARGE = { timeEntries: 100_000, invoices: 5_000 };
const env = process.env;
const file = (path: string) => fileURLToPath(new URL(path, import.meta.url));
const signIns = JSON.parse(readFileSync(file('../../demo/sign-ins.json'), 'utf8')) as {
  role: string;
  email: string;
  password: string;
}[];

const sql = await createConnection({
  host: env['BOOKMATCH_DB_HOST'] ?? '',
  port: Number(env['BOOKMATCH_DB_PORT']),
  user: env['BENCH_DB_USER'] ?? '',
  password: env['BENCH_DB_PASSWORD'] ?? '',
  database: env['BOOKMATCH_DB_NAME'] ?? '',
});
const { small, large } = await seed(sql);
const barePort = Number(env['BOOKMATCH_PORT']) + 1;
const bare = await startServer(
  file('./bare-server.js'),
  { BENCH_BARE_PORT: String(barePort) },
  `http://127.0.0.1:${barePort}/ready`,
);
const origin = env['BOOKMATCH_ORIGIN'] ?? '';
const api = await startServer(file('../../../packages/api/dist/main.js'), {}, `${origin}/api/ready`);
try {
  const cookies = new Map<string, string>();
  for (const { role: title, email, password } of signIns) {
    const role = title.toLowerCase().replace(' ', '-');
    if (!cookies.has(role)) cookies.set(role, await signIn(origin, email, password));
  }
  const owner = cookies.get('owner') ?? '';
  console.log(await compareWithBare(api, bare, small, owner));
  console.log(await routesOfTheLargeShop(api, large, cookies));
} finally {
  await Promise.all([api.stop(), bare.stop()]);
  await sql.end();
}

/** The demo shop is the pattern; one copy stays as it is, one grows. Members of the demo are members of all copies. */
async function seed(connection: Connection): Promise<{ small: string; large: string }> {
  const tables = await tenantTables(connection);
  const [[pattern]] = await connection.query<RowDataPacket[]>(
    'select id from shop order by created_at limit 1',
  );
  const from = String(pattern?.['id']);
  const ids = Array.from(
    { length: SHOPS },
    (_, index) => `0193e000-0000-7000-8000-${String(index + 1).padStart(12, '0')}`,
  );
  await connection.query('set foreign_key_checks = 0');
  for (const id of ids) await cloneShop(connection, tables, from, id);
  const [small = '', large = ''] = ids;
  await inflate(connection, tables, large, LARGE);
  await connection.query('set foreign_key_checks = 1');
  await connection.query('analyze table time_entry, invoice, job, customer, member, session');
  return { small, large };
}

/** The same list, alternately from us and from the bare handler, so that the machine's moods hit both. */
async function compareWithBare(ours: Server, other: Server, shopId: string, cookie: string): Promise<string> {
  const load = { path: `/api/shops/${shopId}/customers`, cookie };
  const bareLoad = { path: `/shops/${shopId}/customers` };
  await measure(ours, load, 16, 2_000);
  await measure(other, bareLoad, 16, 2_000);
  const rounds: { mine: Measured; theirs: Measured; single: Measured }[] = [];
  for (let round = 0; round < 5; round += 1)
    rounds.push({
      mine: await measure(ours, load, 16, 2_000),
      theirs: await measure(other, bareLoad, 16, 2_000),
      single: await measure(ours, load, 1, 400),
    });
  const ratio = (pick: (measured: Measured) => number) =>
    median(rounds.map(({ mine, theirs }) => pick(mine) / pick(theirs)));
  return [
    '| list route against a bare Express handler with the same SQL | measured | must |',
    '| --- | --- | --- |',
    `| Node CPU a request | ${ratio((m) => m.cpuMicrosecondsPerRequest).toFixed(2)} × | 2.0 × |`,
    `| requests a second at 16 connections, median of 5 | ${ratio((m) => m.requestsPerSecond).toFixed(2)} | 0.5 |`,
    `| median at 1 connection | ${median(rounds.map(({ single }) => single.medianMs)).toFixed(1)} ms | 1.5 ms |`,
    `| p99 at 16 connections | ${median(rounds.map(({ mine }) => mine.p99Ms)).toFixed(0)} ms | 50 ms |`,
    '',
  ].join('\n');
}

async function routesOfTheLargeShop(
  server: Server,
  shopId: string,
  cookies: Map<string, string>,
): Promise<string> {
  const [[job]] = await sql.query<RowDataPacket[]>(
    'select id from job where shop_id = ? order by number limit 1',
    [shopId],
  );
  const routes: [role: string, path: string][] = [
    ['owner', '/today'],
    ['bookkeeper', '/today'],
    ['lead-hand', '/today'],
    ['crew', '/today'],
    ['owner', `/jobs/${String(job?.['id'])}`],
    ['owner', '/jobs'],
    ['owner', '/invoices'],
    ['owner', '/invoices/aging'],
    ['owner', '/time/weeks'],
    ['owner', '/time/entries'],
    ['owner', '/ledger/trial-balance'],
    ['owner', '/find?q=oak'],
  ];
  const lines = [
    `| ${LARGE.timeEntries} time entries, ${LARGE.invoices} invoices | median | p99 | must |`,
    '| --- | --- | --- | --- |',
  ];
  for (const [role, path] of routes) {
    const load = { path: `/api/shops/${shopId}${path}`, cookie: cookies.get(role) ?? '' };
    await measure(server, load, 1, 20);
    const { medianMs, p99Ms } = await measure(server, load, 4, 200);
    const shown = path.replace(/\/[0-9a-f-]{36}/, '/:id');
    lines.push(`| ${role} \`${shown}\` | ${medianMs.toFixed(1)} ms | ${p99Ms.toFixed(0)} ms | 300 ms |`);
  }
  return lines.join('\n');
}
