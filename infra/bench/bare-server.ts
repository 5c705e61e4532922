/**
 * The handler to compare with: Express and the driver alone, the same SQL as a list route (session, member, total, rows),
 * no checks, no logging.
 */
import express from 'express';
import { createPool, type RowDataPacket } from 'mysql2/promise';

const env = process.env;
const pool = createPool({
  host: env['BOOKMATCH_DB_HOST'] ?? '',
  port: Number(env['BOOKMATCH_DB_PORT']),
  user: env['BOOKMATCH_DB_USER'] ?? '',
  password: env['BOOKMATCH_DB_PASSWORD'] ?? '',
  database: env['BOOKMATCH_DB_NAME'] ?? '',
  timezone: 'Z',
  connectionLimit: 16,
});
const query = async (sql: string, values: unknown[]) => (await pool.query<RowDataPacket[]>(sql, values))[0];

const app = express();
app.get('/ready', (_request, response) => {
  response.json({});
});
app.get('/shops/:shopId/customers', async (request, response) => {
  const { shopId } = request.params;
  await query('select data from session where sid = ? and expires > ? and created_at > ?', [
    '0',
    new Date(),
    new Date(0),
  ]);
  await query(
    `select m.id, m.role, s.status, s.trial_ends_at from member m join subscription s on s.shop_id = m.shop_id
     where m.shop_id = ? and m.removed_at is null limit 1`,
    [shopId],
  );
  const [counted] = await query(
    'select count(*) total from customer where shop_id = ? and archived_at is null',
    [shopId],
  );
  const rows = await query(
    `select id, kind, name, company, email, phone, city, archived_at archivedAt, created_at createdAt
     from customer where shop_id = ? and archived_at is null order by name, id limit 51`,
    [shopId],
  );
  response.json({ rows: rows.slice(0, 50), next: null, total: counted?.['total'] as number });
});
app.listen(Number(env['BENCH_BARE_PORT']), '127.0.0.1');
