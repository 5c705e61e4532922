import type { DataSource } from 'typeorm';
import { APPEND_ONLY_TABLES, ENTITIES } from '../src/entities.js';
import { MIGRATIONS } from '../src/migrations/all-migrations.js';
import { createDataSource } from '../src/platform/database/data-source.js';
import { createTestDatabase, type TestDatabase } from './harness/test-database.js';

/** Tables that belong to no shop, or hold rows of shops and of none. */
const GLOBAL_TABLES = new Set([
  'audit_entry',
  'idempotency_key',
  'migration',
  'outbox_message',
  'person',
  'person_token',
  'rate_limit',
  'session',
  'shop',
  'typeorm_metadata',
  'webhook_event',
]);

/** Indexes of tenant tables that do not start with the shop, each for a look-up that finds the shop on the way. */
const FINDS_THE_SHOP = new Set([
  'member.ix_member_person', // a person's memberships at sign-in
  'subscription.uq_subscription_provider', // the shop behind a webhook
  'subscription.uq_subscription_customer', // the same
  'customer_link.ix_customer_link_id', // the shop behind a customer's link
  'invitation.uq_invitation_token', // the shop behind an invitation
]);

type IndexRow = { tableName: string; indexName: string; columnName: string; position: number };

describe('the schema', () => {
  let database: TestDatabase;
  let owner: DataSource;
  beforeAll(async () => {
    database = await createTestDatabase();
    owner = await createDataSource(database.owner, ENTITIES, MIGRATIONS).initialize();
  });
  afterAll(async () => {
    await owner.destroy();
    await database.drop();
  });

  const columns = () =>
    owner.query<IndexRow[]>(
      `select table_name tableName, index_name indexName, column_name columnName, seq_in_index position
       from information_schema.statistics where table_schema = database() order by table_name, index_name, seq_in_index`,
    );
  const tables = async () =>
    (
      await owner.query<{ name: string }[]>(
        'select table_name name from information_schema.tables where table_schema = database()',
      )
    ).map(({ name }) => name);

  it('is what the entities say: the drift check finds nothing', async () => {
    const { upQueries } = await owner.driver.createSchemaBuilder().log();
    expect(upQueries.map(({ query }) => query)).toEqual([]);
  });

  it('goes down to nothing, migration by migration, and up again', async () => {
    for (const _ of MIGRATIONS) await owner.undoLastMigration({ transaction: 'none' });
    expect((await tables()).filter((name) => name !== 'migration' && name !== 'typeorm_metadata')).toEqual(
      [],
    );
    await owner.runMigrations({ transaction: 'none' });
    const { upQueries } = await owner.driver.createSchemaBuilder().log();
    expect(upQueries).toEqual([]);
  });

  it('keys every tenant table by shop and id', async () => {
    const primary = (await columns()).filter(({ indexName }) => indexName === 'PRIMARY');
    for (const table of (await tables()).filter((name) => !GLOBAL_TABLES.has(name))) {
      const key = primary.filter(({ tableName }) => tableName === table).map(({ columnName }) => columnName);
      expect([table, ...key.slice(0, 1)]).toEqual([table, 'shop_id']);
    }
  });

  it('starts every index of a tenant table with the shop, but for the few that find the shop', async () => {
    const first = (await columns()).filter(({ position }) => Number(position) === 1);
    const others = first
      .filter(({ tableName, columnName }) => !GLOBAL_TABLES.has(tableName) && columnName !== 'shop_id')
      .map(({ tableName, indexName }) => `${tableName}.${indexName}`);
    expect(others.filter((name) => !FINDS_THE_SHOP.has(name))).toEqual([]);
  });

  it('carries the shop in every foreign key between tenant tables', async () => {
    const keys = await owner.query<{ name: string; target: string; columns: string }[]>(
      `select constraint_name name, referenced_table_name target, group_concat(column_name order by ordinal_position) columns
       from information_schema.key_column_usage
       where table_schema = database() and referenced_table_name is not null
       group by constraint_name, referenced_table_name, table_name`,
    );
    expect(keys.length).toBeGreaterThan(0);
    const between = keys.filter(({ target }) => !GLOBAL_TABLES.has(target));
    expect(between.filter((key) => !key.columns.startsWith('shop_id,')).map(({ name }) => name)).toEqual([]);
  });

  it('refuses a row that points at another shop', async () => {
    const [one, two] = ['0193e000-0000-7000-8000-000000000001', '0193e000-0000-7000-8000-000000000002'];
    await owner.query('set foreign_key_checks = 1');
    const shop = (id: string, slug: string) =>
      owner.query(
        `insert into shop (id, created_at, version, updated_at, slug, name, phone, email, address, time_zone, unit_system,
         currency, tax_rule, default_tax_rate, estimate_terms, estimate_valid_days, invoice_due_days,
         default_billing_schedule, card_payments)
         values (?, now(), 1, now(), ?, ?, '', '', '{}', 'UTC', 'inch', 'USD', 'on-price', 0, '', 30, 14, '[]', 'not-set-up')`,
        [id, slug, slug],
      );
    await shop(one, 'one');
    await shop(two, 'two');
    await owner.query(
      `insert into customer (shop_id, id, created_at, version, updated_at, kind, name, company, email, phone,
       billing_address, city, tax_exempt, exemption_certificate, notes)
       values (?, ?, now(), 1, now(), 'homeowner', 'A', '', '', '', '{}', '', 0, '', '')`,
      [one, one],
    );
    const site = owner.query(
      `insert into site (shop_id, id, created_at, version, updated_at, customer_id, name, address, notes)
       values (?, ?, now(), 1, now(), ?, 'Site', '{}', '')`,
      [two, two, one],
    );
    await expect(site).rejects.toMatchObject({ errno: 1452 });
  });

  it('gives the application no right to change the schema, the trail or another schema', async () => {
    const application = await createDataSource(database.application, []).initialize();
    try {
      for (const table of APPEND_ONLY_TABLES) {
        await expect(application.query(`delete from ${table}`)).rejects.toMatchObject({ errno: 1142 });
        await expect(application.query(`update ${table} set shop_id = null`)).rejects.toMatchObject({
          errno: 1142,
        });
      }
      await expect(application.query('alter table customer add column more int')).rejects.toMatchObject({
        errno: 1142,
      });
      await expect(application.query('select * from mysql.user')).rejects.toMatchObject({ errno: 1142 });
      await expect(application.query("select load_file('/etc/passwd') as content")).resolves.toEqual([
        { content: null },
      ]);
    } finally {
      await application.destroy();
    }
  });
});
