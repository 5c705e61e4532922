import { execFile } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { gzipSync } from 'node:zlib';
import { type Connection, createConnection, type RowDataPacket } from 'mysql2/promise';

const run = promisify(execFile);
const env = process.env;
const [source, copy] = [`backup_source_${process.pid}`, `backup_copy_${process.pid}`];
let root: Connection;
let folder: string;

beforeAll(async () => {
  root = await createConnection({
    host: env.BOOKMATCH_TEST_DB_HOST,
    port: Number(env.BOOKMATCH_TEST_DB_PORT),
    user: env.BOOKMATCH_TEST_DB_ROOT_USER,
    password: env.BOOKMATCH_TEST_DB_ROOT_PASSWORD,
    multipleStatements: true,
  });
});

beforeEach(async () => {
  folder = mkdtempSync(join(tmpdir(), 'backup-spec-'));
  await root.query(`CREATE DATABASE ${source}; CREATE DATABASE ${copy}; USE ${source}; ${schema}`);
});

afterEach(async () => {
  rmSync(folder, { recursive: true, force: true });
  await root.query(`DROP DATABASE IF EXISTS ${source}; DROP DATABASE IF EXISTS ${copy}`);
});

afterAll(async () => {
  await root.end();
});

/** One of everything the product's schema uses: uuid, exact decimals, composite keys, generated columns, a trigger. */
const schema = `
  CREATE TABLE shop (id uuid PRIMARY KEY, name varchar(80) NOT NULL);
  CREATE TABLE entry (shop_id uuid NOT NULL, id uuid NOT NULL, cents bigint NOT NULL, width_mm decimal(10,3), note text,
    picture blob, kept json, ended_at datetime(3), open_key tinyint AS (IF(ended_at IS NULL, 1, NULL)) STORED,
    PRIMARY KEY (shop_id, id), FOREIGN KEY (shop_id) REFERENCES shop (id));
  CREATE TABLE balance (id int PRIMARY KEY, cents bigint NOT NULL);
  CREATE TRIGGER entry_stays BEFORE DELETE ON entry FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'kept';
  INSERT INTO shop VALUES ('018f0000-0000-7000-8000-000000000001', 'Größe 23 5/8″ 🪵');
  INSERT INTO entry (shop_id, id, cents, width_mm, note, picture, kept, ended_at) VALUES
    ('018f0000-0000-7000-8000-000000000001', '018f0000-0000-7000-8000-000000000002', 9007199254740991, 600.125,
     'it''s a "quote" \\\\ and\\na line', x'00ff0a27', '{"a": [1, null]}', '2026-03-08 07:30:00.123'),
    ('018f0000-0000-7000-8000-000000000001', '018f0000-0000-7000-8000-000000000003', -1, NULL, NULL, NULL, NULL, NULL);
  INSERT INTO balance VALUES (1, 1000), (2, 0);`;

function script(name: string, database: string, ...words: string[]) {
  return run(process.execPath, [join(__dirname, name), ...words], {
    env: {
      ...env,
      BOOKMATCH_DB_HOST: env.BOOKMATCH_TEST_DB_HOST,
      BOOKMATCH_DB_PORT: env.BOOKMATCH_TEST_DB_PORT,
      BOOKMATCH_DB_NAME: database,
      BOOKMATCH_DB_OWNER_USER: env.BOOKMATCH_TEST_DB_ROOT_USER,
      BOOKMATCH_DB_OWNER_PASSWORD: env.BOOKMATCH_TEST_DB_ROOT_PASSWORD,
    },
  });
}

async function rows(sql: string): Promise<RowDataPacket[]> {
  const [found] = await root.query<RowDataPacket[]>(sql);
  return found;
}

async function contentOf(database: string) {
  const tables = ['shop', 'entry', 'balance'];
  const made = await Promise.all(tables.map((table) => rows(`SHOW CREATE TABLE ${database}.${table}`)));
  const held = await Promise.all(
    tables.map((table) => rows(`SELECT * FROM ${database}.${table} ORDER BY id`)),
  );
  return { made, held };
}

it('brings back every table and row as it was', async () => {
  const file = join(folder, 'shop.sql.gz');
  await script('backup.mjs', source, file);
  const { stdout } = await script('restore.mjs', copy, file);
  expect(stdout).toContain('3 tables restored');
  const restored = await contentOf(copy);
  expect(restored).toEqual(await contentOf(source));
  expect(restored.held[1]).toHaveLength(2);
  await expect(root.query(`DELETE FROM ${copy}.entry`)).rejects.toThrow('kept');
});

it('sees one instant although others go on writing', async () => {
  const file = join(folder, 'moving.sql.gz');
  let isWriting = true;
  let moves = 0;
  const writer = (async () => {
    while (isWriting) {
      await root.query(
        `START TRANSACTION; UPDATE ${source}.balance SET cents = cents - 1 WHERE id = 1;
         UPDATE ${source}.balance SET cents = cents + 1 WHERE id = 2; COMMIT`,
      );
      moves += 1;
    }
  })();
  await script('backup.mjs', source, file);
  isWriting = false;
  await writer;
  await script('restore.mjs', copy, file);
  expect(moves).toBeGreaterThan(0);
  const [sum] = await rows(`SELECT SUM(cents) AS cents FROM ${copy}.balance`);
  expect(Number(sum?.cents)).toBe(1000);
});

it('writes a file only its owner can read, and none over another', async () => {
  const file = join(folder, 'shop.sql.gz');
  await script('backup.mjs', source, file);
  expect(statSync(file).mode & 0o777).toBe(0o600);
  await expect(script('backup.mjs', source, file)).rejects.toThrow('exists already');
});

it('leaves no file behind when the backup fails', async () => {
  const file = join(folder, 'none.sql.gz');
  await expect(script('backup.mjs', 'no_such_schema', file)).rejects.toThrow('Unknown database');
  expect(statSync(file, { throwIfNoEntry: false })).toBeUndefined();
  expect(statSync(`${file}.part`, { throwIfNoEntry: false })).toBeUndefined();
});

it('never restores over a schema that holds tables', async () => {
  const file = join(folder, 'shop.sql.gz');
  await script('backup.mjs', source, file);
  const before = await contentOf(source);
  await expect(script('restore.mjs', source, file)).rejects.toThrow('holds 3 tables');
  expect(await contentOf(source)).toEqual(before);
});

it('says so when the backup is damaged', async () => {
  const file = join(folder, 'shop.sql.gz');
  await script('backup.mjs', source, file);
  writeFileSync(file, readFileSync(file).subarray(0, 400));
  await expect(script('restore.mjs', copy, file)).rejects.toThrow('unexpected end of file');
  writeFileSync(file, gzipSync('CREATE TABLE a (id int);'));
  await expect(script('restore.mjs', copy, file)).rejects.toThrow('not a whole backup');
  expect(await rows(`SHOW TABLES IN ${copy}`)).toEqual([]);
});

it('says what the database refused', async () => {
  const file = join(folder, 'wrong.sql.gz');
  writeFileSync(
    file,
    gzipSync('CREATE TABLE a (id int); INSERT INTO nowhere VALUES (1);\n-- Dump completed\n'),
  );
  await expect(script('restore.mjs', copy, file)).rejects.toThrow("nowhere' doesn't exist");
});
