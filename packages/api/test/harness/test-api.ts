import { randomBytes } from 'node:crypto';
import { mkdtemp, rm } from 'node:fs/promises';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Role } from '@bookmatch/common/access/roles';
import { startMailFake, type MailFake } from '../../../../infra/fakes/mail/mail-fake.js';
import { startPaymentsFake, type PaymentsFake } from '../../../../infra/fakes/payments/start.js';
import { compose, type Product } from '../../src/compose.js';
import { ENTITIES } from '../../src/entities.js';
import { Person } from '../../src/features/accounts/accounts-public.js';
import { hashPassword } from '../../src/features/accounts/passwords.js';
import { Member } from '../../src/features/shops/shops-public.js';
import type { Config } from '../../src/platform/config/config.js';
import { openPlatform, type Platform } from '../../src/platform/platform.js';
import { Client } from './client.js';
import { TestClock } from './test-clock.js';
import { createTestDatabase, type TestDatabase } from './test-database.js';

export const PASSWORD = 'plenty of sawdust';
const WEBHOOK_SECRET = 'whsec_test_of_bookmatch';

/** A shop in a test, with its owner signed in. */
export type TestShop = {
  id: string;
  slug: string;
  /** The owner's browser, with paths below the shop. */
  owner: Client;
  /** Adds a member and signs them in. */
  join(role: Role): Promise<{ client: Client; memberId: string; personId: string; email: string }>;
};

/** The whole API on a database of its own, with both fakes. */
export class TestApi {
  private shops = 0;
  private people = 0;

  private constructor(
    readonly platform: Platform,
    readonly product: Product,
    readonly clock: TestClock,
    readonly mail: MailFake,
    readonly payments: PaymentsFake,
    readonly server: Server,
    readonly database: TestDatabase,
    private readonly filesDir: string,
  ) {}

  static async open(options: { now?: string; limitScale?: number } = {}): Promise<TestApi> {
    const database = await createTestDatabase();
    const clock = new TestClock(options.now);
    const server = createServer();
    const port = await listen(server);
    const mail = await startMailFake();
    const payments = await startPaymentsFake({
      webhooks: [
        { url: `http://127.0.0.1:${port}/api/webhooks/payments`, secret: WEBHOOK_SECRET, sends: 'all' },
      ],
      retryBaseMs: 50,
    });
    const filesDir = await mkdtemp(join(tmpdir(), 'bookmatch-files-'));
    const config = testConfig({ port, database, mail, payments, filesDir });
    const platform = await openPlatform(config, ENTITIES, {
      clock: clock.read,
      limitScale: options.limitScale ?? 100,
    });
    const product = compose(platform);
    server.on('request', product.app);
    product.setOpen(true);
    return new TestApi(platform, product, clock, mail, payments, server, database, filesDir);
  }

  async close(): Promise<void> {
    this.server.closeAllConnections();
    await new Promise((resolve) => this.server.close(resolve));
    await this.product.close();
    await this.platform.close();
    await this.payments.close();
    await this.mail.stop();
    await this.database.drop();
    await rm(this.filesDir, { recursive: true, force: true });
  }

  /** A browser nobody is signed in at. */
  browser(): Client {
    return new Client(this.server, this.platform.config.origin);
  }

  /** Sends what waits in the outbox, then answers the letters to an address, oldest first. */
  async lettersTo(email: string) {
    await this.product.outbox.drain();
    return this.mail.mailbox.list({ to: email }).toReversed();
  }

  /** Signs a shop up as its owner would, through the letter. */
  async signUp(
    overrides: { shopName?: string; timeZone?: string; unitSystem?: 'inch' | 'metric' } = {},
  ): Promise<TestShop> {
    this.shops += 1;
    const email = `owner${this.shops}@shop.test`;
    const browser = this.browser();
    await browser.post('/account/sign-up', {
      name: `Owner ${this.shops}`,
      email,
      password: PASSWORD,
      shopName: `Test shop ${this.shops}`,
      timeZone: 'America/Chicago',
      unitSystem: 'inch',
      ...overrides,
    });
    const [letter] = await this.lettersTo(email);
    const token = /token=([\w-]+)/.exec(letter?.text ?? '')?.[1];
    const { body } = await browser.post('/account/confirm-email', { token });
    const [membership] = (body as { memberships: { shopId: string; slug: string }[] }).memberships;
    if (!membership) throw new Error(`The sign-up failed: ${JSON.stringify(body)}`);
    const { shopId, slug } = membership;
    return {
      id: shopId,
      slug,
      owner: browser.below(`/api/shops/${shopId}`),
      join: (role) => this.join(shopId, role),
    };
  }

  /** Makes a member straight in the database and signs them in: what invitations do is tested by itself. */
  private async join(shopId: string, role: Role) {
    this.people += 1;
    const email = `${role}${this.people}@shop.test`;
    const stamp = { author: { kind: 'system' as const }, requestId: 'test', now: this.clock.read() };
    const passwordHash = await hashPassword(PASSWORD);
    const { memberId, personId } = await this.platform.work.transaction(stamp, async (scope) => {
      const person = await scope.global(Person).insert({
        id: scope.newId(),
        email,
        name: `${role} ${this.people}`,
        passwordHash,
        emailConfirmedAt: scope.now,
      });
      const member = await scope.forShop(shopId).rows(Member).insert({
        id: scope.newId(),
        personId: person.id,
        role,
        laborCostCentsPerHour: null,
        removedAt: null,
      });
      return { memberId: member.id, personId: person.id };
    });
    const client = await this.signIn(email);
    return { client: client.below(`/api/shops/${shopId}`), memberId, personId, email };
  }

  async signIn(email: string, password = PASSWORD): Promise<Client> {
    const browser = this.browser();
    const answer = await browser.post('/account/sign-in', { email, password });
    if (answer.status !== 200) throw new Error(`Could not sign in: ${answer.text}`);
    return browser;
  }
}

function listen(server: Server): Promise<number> {
  return new Promise((resolve) => {
    server.listen(0, '127.0.0.1', () => resolve((server.address() as AddressInfo).port));
  });
}

type Places = {
  port: number;
  database: TestDatabase;
  mail: MailFake;
  payments: PaymentsFake;
  filesDir: string;
};

function testConfig({ port, database, mail, payments, filesDir }: Places): Config {
  return {
    mode: 'test',
    host: '127.0.0.1',
    port,
    origin: `http://127.0.0.1:${port}`,
    trustedProxies: 0,
    webRoot: '',
    secret: randomBytes(32).toString('hex'),
    logLevel: process.env['BOOKMATCH_LOG_LEVEL'] ?? 'fatal',
    database: database.application,
    filesDir,
    mail: {
      host: '127.0.0.1',
      port: mail.smtpPort,
      user: '',
      password: '',
      tls: false,
      from: 'post@bookmatch.test',
    },
    payments: {
      key: 'sk_test_bookmatch',
      webhookSecret: WEBHOOK_SECRET,
      price: 'price_bookmatch_member_month',
      api: payments.url,
    },
  };
}
