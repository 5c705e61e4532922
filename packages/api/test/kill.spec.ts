import { randomUUID } from 'node:crypto';
import { mkdtemp, rm } from 'node:fs/promises';
import { createServer } from 'node:net';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { createConnection, type Connection, type RowDataPacket } from 'mysql2/promise';
import { startMailFake, type MailFake } from '../../../infra/fakes/mail/mail-fake.js';
import { ApiProcess } from './harness/api-process.js';
import { Client } from './harness/client.js';
import { createTestDatabase, type TestDatabase } from './harness/test-database.js';
import { PASSWORD } from './harness/test-api.js';

const INVOICES = 12;
const HALF_CENTS = 5_000;

/** A payment as the browser sends it: the same key until an answer has come. */
type Attempt = { invoice: string; key: string };

describe('a process that is killed while payments are recorded', () => {
  let database: TestDatabase;
  let mail: MailFake;
  let api: ApiProcess;
  let sql: Connection;
  let filesDir: string;
  let owner: Client;
  beforeAll(async () => {
    database = await createTestDatabase();
    mail = await startMailFake();
    filesDir = await mkdtemp(join(tmpdir(), 'bookmatch-kill-'));
    sql = await createConnection({ ...connectionOf(database), dateStrings: true });
    const port = await freePort();
    const origin = `http://127.0.0.1:${port}`;
    api = new ApiProcess(environment({ port, origin, database, mail, filesDir }), origin);
    await api.start();
    owner = await signUp(origin, mail);
  }, 60_000);
  afterAll(async () => {
    await api.stop();
    await sql.end();
    await mail.stop();
    await database.drop();
    await rm(filesDir, { recursive: true, force: true });
  });

  it('loses and doubles nothing: what was sent again counts once, and the ledger balances', async () => {
    const invoices = await issueInvoices(owner);
    const attempts: Attempt[] = invoices.flatMap((invoice) =>
      [1, 2].map(() => ({ invoice, key: randomUUID() })),
    );

    const sending = Promise.allSettled(attempts.map((attempt) => pay(owner, attempt)));
    await paymentsAtLeast(sql, 4);
    await api.kill();
    const answers = await sending;
    expect(answers.some(({ status }) => status === 'rejected')).toBe(true);

    await api.start();
    for (const attempt of attempts) expect([200, 201]).toContain(await pay(owner, attempt));

    const [payments] = await sql.query<RowDataPacket[]>(
      'select invoice_id invoice, amount_cents cents from payment',
    );
    expect(payments).toHaveLength(attempts.length);
    for (const invoice of invoices) {
      const { body } = await owner.get(`/invoices/${invoice}`);
      expect(body).toMatchObject({ paidCents: 2 * HALF_CENTS, balanceCents: 0, status: 'paid' });
    }
    const [unbalanced] = await sql.query<RowDataPacket[]>(
      `select entry_id from ledger_line group by shop_id, entry_id
       having sum(case side when 'debit' then amount_cents else -amount_cents end) <> 0`,
    );
    expect(unbalanced).toEqual([]);
    const [[posted]] = await sql.query<RowDataPacket[]>(
      `select count(*) total, sum(line.amount_cents) cents from ledger_entry entry
       join ledger_line line on line.shop_id = entry.shop_id and line.entry_id = entry.id and line.side = 'debit'
       where entry.kind = 'payment'`,
    );
    expect([Number(posted?.['total']), Number(posted?.['cents'])]).toEqual([
      attempts.length,
      attempts.length * HALF_CENTS,
    ]);
  }, 120_000);

  it('stops in order when asked: what it had in hand is answered', async () => {
    const [invoice = ''] = await issueInvoices(owner, 1);
    // The row is held, so that the payment is surely in hand when the process is asked to stop.
    await sql.beginTransaction();
    await sql.query('select id from invoice where id = ? for update', [invoice]);
    const sending = pay(owner, { invoice, key: randomUUID() });
    await pause(500);
    const stopping = api.stop();
    await pause(300);
    await sql.rollback();
    expect(await sending).toBeLessThan(300);
    await stopping;
    await expect(owner.get(`/invoices/${invoice}`)).rejects.toThrow();
  }, 60_000);
});

async function issueInvoices(owner: Client, count = INVOICES): Promise<string[]> {
  const customer = (await owner.post('/customers', { kind: 'homeowner', name: 'Ines Calder' })).body as {
    id: string;
  };
  const ids: string[] = [];
  for (let index = 0; index < count; index += 1) {
    const lines = [
      {
        id: randomUUID(),
        description: 'Repair',
        quantity: '1',
        unitPriceCents: 2 * HALF_CENTS,
        taxable: false,
      },
    ];
    const draft = await owner.post('/invoices', {
      from: 'lines',
      customerId: customer.id,
      lines,
      taxRate: '0',
      memo: '',
    });
    const { id, version } = draft.body as { id: string; version: number };
    const issued = await owner.post(`/invoices/${id}/issue`, {}, { version });
    if (issued.status >= 300) throw new Error(issued.text);
    ids.push(id);
  }
  return ids;
}

/** Records half of the invoice as paid; reads the current version first, as a person who tries again would. */
async function pay(owner: Client, { invoice, key }: Attempt): Promise<number> {
  for (;;) {
    const { version } = (await owner.get(`/invoices/${invoice}`)).body as { version: number };
    const body = { method: 'check', amountCents: HALF_CENTS, receivedOn: today(), reference: 'No. 7' };
    const { status } = await owner.post(`/invoices/${invoice}/payments`, body, { version, key });
    if (status !== 412) return status;
  }
}

const today = () => new Date().toLocaleDateString('en-CA', { timeZone: 'UTC' });

async function paymentsAtLeast(sql: Connection, count: number): Promise<void> {
  for (let tries = 0; tries < 1_000; tries += 1) {
    const [[row]] = await sql.query<RowDataPacket[]>('select count(*) total from payment');
    if (Number(row?.['total']) >= count) return;
    await pause(2);
  }
  throw new Error('No payment was recorded.');
}

async function signUp(origin: string, mail: MailFake): Promise<Client> {
  const browser = new Client(origin, origin);
  await browser.post('/account/sign-up', {
    name: 'Owner',
    email: 'owner@shop.test',
    password: PASSWORD,
    shopName: 'Killed shop',
    timeZone: 'UTC',
    unitSystem: 'inch',
  });
  let token: string | undefined;
  for (let tries = 0; token === undefined && tries < 200; tries += 1) {
    await pause(50);
    token = /token=([\w-]+)/.exec(mail.mailbox.list({ to: 'owner@shop.test' })[0]?.text ?? '')?.[1];
  }
  const { body } = await browser.post('/account/confirm-email', { token });
  const [membership] = (body as { memberships: { shopId: string }[] }).memberships;
  return browser.below(`/api/shops/${membership?.shopId ?? ''}`);
}

function connectionOf({ owner }: TestDatabase) {
  return {
    host: owner.host,
    port: owner.port,
    user: owner.user,
    password: owner.password,
    database: owner.name,
  };
}

function freePort(): Promise<number> {
  return new Promise((resolve) => {
    const server = createServer().listen(0, '127.0.0.1', () => {
      const { port } = server.address() as AddressInfo;
      server.close(() => resolve(port));
    });
  });
}

type Places = { port: number; origin: string; database: TestDatabase; mail: MailFake; filesDir: string };

function environment({ port, origin, database, mail, filesDir }: Places): Record<string, string> {
  const { host, port: databasePort, name, user, password } = database.application;
  return {
    BOOKMATCH_MODE: 'test',
    BOOKMATCH_PORT: String(port),
    BOOKMATCH_ORIGIN: origin,
    BOOKMATCH_SECRET: randomUUID() + randomUUID(),
    BOOKMATCH_LOG_LEVEL: 'fatal',
    BOOKMATCH_DB_HOST: host,
    BOOKMATCH_DB_PORT: String(databasePort),
    BOOKMATCH_DB_NAME: name,
    BOOKMATCH_DB_USER: user,
    BOOKMATCH_DB_PASSWORD: password,
    BOOKMATCH_FILES_DIR: filesDir,
    BOOKMATCH_MAIL_HOST: '127.0.0.1',
    BOOKMATCH_MAIL_PORT: String(mail.smtpPort),
    BOOKMATCH_MAIL_TLS: 'off',
    BOOKMATCH_MAIL_FROM: 'post@bookmatch.test',
    BOOKMATCH_PAYMENTS_KEY: 'sk_test_bookmatch',
    BOOKMATCH_PAYMENTS_WEBHOOK_SECRET: 'whsec_test_of_bookmatch',
    BOOKMATCH_PAYMENTS_PRICE: 'price_bookmatch_member_month',
    BOOKMATCH_PAYMENTS_API: 'http://127.0.0.1:9',
  };
}
