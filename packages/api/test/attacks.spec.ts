import { createHmac, randomUUID } from 'node:crypto';
import { request as httpRequest } from 'node:http';
import type { AddressInfo } from 'node:net';
import { gzipSync } from 'node:zlib';
import { PREFIXES, writes, type Route } from '../src/platform/http/route.js';
import { TestApi, type TestShop } from './harness/test-api.js';

/** Attacks on the API as a whole. Names in brackets are tests of the OWASP Web Security Testing Guide, from memory. */
describe('attacks', () => {
  let api: TestApi;
  let shop: TestShop;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
  });
  afterAll(() => api.close());

  const SOME_ID = '0193e000-0000-7000-8000-00000000abcd';
  const shopRoutes = () => api.product.routes.filter((route) => route.kind === 'shop');
  const addressOf = (route: Route) =>
    PREFIXES.shop.replace(':shopId', shop.id) + route.path.replace(/:\w+/g, SOME_ID);

  /** A request as bytes, past every client's good manners. */
  async function raw(options: {
    method?: string;
    path: string;
    headers?: Record<string, string>;
    body?: Buffer | string;
  }) {
    const { port } = api.server.address() as AddressInfo;
    return new Promise<{ status: number; headers: Record<string, unknown>; text: string }>(
      (resolve, reject) => {
        const { method = 'GET', path, headers = {}, body } = options;
        const call = httpRequest({ host: '127.0.0.1', port, method, path, headers }, (answer) => {
          const parts: Buffer[] = [];
          answer.on('data', (part: Buffer) => parts.push(part));
          answer.on('end', () =>
            resolve({
              status: answer.statusCode ?? 0,
              headers: answer.headers,
              text: Buffer.concat(parts).toString(),
            }),
          );
        });
        call.on('error', reject);
        call.end(body);
      },
    );
  }

  /** The headers of the owner's own browser. */
  async function ownHeaders(more: Record<string, string> = {}): Promise<Record<string, string>> {
    const { cookie, token } = await shop.owner.credentials();
    return {
      cookie,
      origin: api.platform.config.origin,
      'x-csrf-token': token,
      'idempotency-key': randomUUID(),
      'content-type': 'application/json',
      ...more,
    };
  }
  const customersPath = () => `/api/shops/${shop.id}/customers`;
  const customer = JSON.stringify({ kind: 'homeowner', name: 'Sent from elsewhere' });

  describe('from another site [WSTG-SESS-05]', () => {
    it.each([
      ['a foreign origin', { origin: 'https://elsewhere.test' }],
      ['no origin', { origin: '' }],
      ['the origin null', { origin: 'null' }],
      ['a token that is not the cookie', { 'x-csrf-token': 'made.up' }],
      ['no token', { 'x-csrf-token': '' }],
    ])('refuses a change with %s', async (_what, headers) => {
      const answer = await raw({
        method: 'POST',
        path: customersPath(),
        headers: await ownHeaders(headers),
        body: customer,
      });
      expect([answer.status, JSON.parse(answer.text)]).toEqual([
        403,
        expect.objectContaining({ code: 'cross-site' }),
      ]);
    });

    it('takes no token that it did not sign, even when cookie and header agree', async () => {
      const { cookie } = await shop.owner.credentials();
      const planted = `${cookie.replace(/bookmatch-csrf=[^;]+;?\s*/, '')}; bookmatch-csrf=planted.planted`;
      const headers = await ownHeaders({ cookie: planted, 'x-csrf-token': 'planted.planted' });
      const answer = await raw({ method: 'POST', path: customersPath(), headers, body: customer });
      expect(answer.status).toBe(403);
    });

    it('never writes on a GET', async () => {
      const trail = 'select count(*) total from audit_entry';
      const [before] = await api.platform.dataSource.query<{ total: number }[]>(trail);
      for (const route of shopRoutes().filter((one) => !writes(one))) await shop.owner.get(addressOf(route));
      const [after] = await api.platform.dataSource.query<{ total: number }[]>(trail);
      expect(after).toEqual(before);
    });
  });

  describe('by the body [WSTG-INPV]', () => {
    const post = async (body: Buffer | string, headers: Record<string, string> = {}) =>
      raw({ method: 'POST', path: customersPath(), headers: await ownHeaders(headers), body });

    it('refuses what is no JSON with a problem document', async () => {
      const answer = await post('{"kind": "homeowner", ');
      expect([answer.status, answer.headers['content-type']]).toEqual([
        400,
        'application/problem+json; charset=utf-8',
      ]);
      expect(answer.text).not.toContain('homeowner');
    });

    it('refuses JSON of 20,000 depths, oversize and compressed bodies at once', async () => {
      expect((await post(`{"name":${'['.repeat(20_000)}${']'.repeat(20_000)}}`)).status).toBe(422);
      expect((await post(JSON.stringify({ name: 'x'.repeat(600_000) }))).status).toBe(413);
      const bomb = gzipSync(JSON.stringify({ name: 'x'.repeat(10_000_000) }));
      expect((await post(bomb, { 'content-encoding': 'gzip' })).status).toBe(415);
    });

    it('takes no key that reaches into prototypes', async () => {
      for (const key of ['__proto__', 'constructor', 'prototype'])
        expect((await post(`{"kind":"homeowner","name":"A","${key}":{"role":"owner"}}`)).status).toBe(422);
      expect(({} as { role?: string }).role).toBeUndefined();
    });

    it('takes no fields that only the server sets', async () => {
      for (const key of ['shopId', 'id', 'version', 'role', 'createdAt', 'archivedAt', 'rateCents'])
        expect((await post(JSON.stringify({ kind: 'homeowner', name: 'A', [key]: SOME_ID }))).status).toBe(
          422,
        );
    });

    it('reads no body of another type', async () => {
      for (const type of [
        'text/plain',
        'application/x-www-form-urlencoded',
        'application/xml',
        'multipart/form-data',
      ])
        expect((await post(customer, { 'content-type': type })).status).toBeGreaterThanOrEqual(400);
    });

    it('answers every wrong shape on every route with a refusal, never a fault', async () => {
      const shapes: unknown[] = [
        [],
        [[]],
        { a: { b: {} } },
        { id: null },
        { name: 1e308, to: [], lines: {} },
      ];
      const faults: string[] = [];
      for (const route of shopRoutes().filter(writes))
        for (const shape of shapes) {
          const answer = await shop.owner.send(route.method as 'post', addressOf(route), shape as object, {
            key: randomUUID(),
            version: 1,
          });
          if (answer.status >= 500)
            faults.push(`${route.method} ${route.path} ${JSON.stringify(shape)}: ${answer.text}`);
        }
      expect(faults).toEqual([]);
    });
  });

  describe('by the query [WSTG-INPV-05]', () => {
    const BAD = [
      "' or 1=1 --",
      'name;drop table customer',
      '-(select 1)',
      '1e3',
      '../../etc/passwd',
      '%',
      '_',
      '\u0000',
    ];
    it('takes SQL and patterns in any parameter of any list as text or refuses them', async () => {
      const faults: string[] = [];
      for (const route of shopRoutes().filter((one) => !writes(one) && one.query))
        for (const key of ['q', 'sort', 'after', 'limit', 'stage', 'kind', 'customerId'])
          for (const value of BAD) {
            const { status } = await shop.owner.get(addressOf(route), { [key]: value });
            const allowed = key === 'q' ? [200, 400, 404] : [200, 400, 404];
            if (!allowed.includes(status)) faults.push(`${route.path}?${key}=${value}: ${status}`);
          }
      expect(faults).toEqual([]);
    });

    it('refuses a parameter that is given twice or nested', async () => {
      expect((await shop.owner.get(`${customersPath()}?q=a&q=b`)).status).toBe(400);
      expect((await shop.owner.get(`${customersPath()}?q[like]=a`)).status).toBe(400);
      expect((await shop.owner.get(`${customersPath()}?unknown=1`)).status).toBe(400);
    });
  });

  describe('by the address [WSTG-CLNT-04]', () => {
    it('redirects nowhere', async () => {
      for (const path of [
        '//elsewhere.test',
        '//elsewhere.test/%2e%2e',
        '/api//elsewhere.test',
        '/%2F%2Felsewhere.test',
      ]) {
        const answer = await raw({ path });
        expect([path, answer.status >= 400, answer.headers['location']]).toEqual([path, true, undefined]);
      }
    });

    it('reads no file outside of what it serves', async () => {
      for (const path of [
        '/../package.json',
        '/..%2f..%2fpackage.json',
        '/%2e%2e/%2e%2e/etc/passwd',
        '/api/docs/..%2fpackage.json',
      ])
        expect((await raw({ path })).text).not.toMatch(/"private": true|root:x/);
    });

    it('answers an address it cannot decode with a refusal', async () => {
      expect((await raw({ path: `${customersPath()}/%E0%A4%A`, headers: await ownHeaders() })).status).toBe(
        400,
      );
    });
  });

  describe('by what it tells [WSTG-CONF]', () => {
    it('sends the headers that keep a browser from helping an attacker', async () => {
      const { headers } = await raw({ path: '/api/openapi.json' });
      expect(headers['x-powered-by']).toBeUndefined();
      expect(headers['x-content-type-options']).toBe('nosniff');
      expect(headers['content-security-policy']).toContain("script-src 'self'");
      expect(headers['content-security-policy']).not.toMatch(/script-src[^;]*unsafe/);
      expect(headers['content-security-policy']).toContain("frame-ancestors 'none'");
    });

    it('says nothing of its insides in a refusal, and lets no answer be kept', async () => {
      const answer = await raw({
        path: `/api/shops/${shop.id}/customers/${SOME_ID}`,
        headers: await ownHeaders(),
      });
      expect(answer.text).not.toMatch(/select |typeorm|\.ts|node_modules| at /i);
      expect(answer.headers['cache-control']).toBe('no-store');
    });

    it('gives a session cookie that scripts cannot read', async () => {
      const browser = api.browser();
      const answer = await browser.post('/account/sign-in', {
        email: 'owner1@shop.test',
        password: 'plenty of sawdust',
      });
      const session = (answer.headers['set-cookie'] as unknown as string[]).find((line) =>
        line.startsWith('bookmatch='),
      );
      expect(session).toMatch(/HttpOnly/);
      expect(session).toMatch(/SameSite=Lax/);
    });
  });

  describe('by letter and by sheet', () => {
    it('keeps line breaks out of what becomes a header', async () => {
      const name = 'Ines\r\nBcc: everybody@elsewhere.test';
      expect((await shop.owner.post('/customers', { kind: 'homeowner', name })).status).toBe(422);
    });

    it('neutralizes cells that a spreadsheet would run', async () => {
      const made = await shop.owner.post('/customers', {
        kind: 'homeowner',
        name: '=HYPERLINK("http://elsewhere.test")',
      });
      const { id } = made.body as { id: string };
      await shop.owner.post('/jobs', { title: '@SUM(1+1)*cmd|/c calc', customerId: id });
      const { text } = await shop.owner.get('/jobs/export');
      expect(text).toContain(`"'=HYPERLINK`);
      expect(text).not.toMatch(/(^|,)"?[=@]/m);
    });
  });

  describe("in the payment provider's name", () => {
    const secret = () => api.platform.config.payments.webhookSecret;
    const body = JSON.stringify({
      id: `evt_${randomUUID()}`,
      object: 'event',
      type: 'charge.succeeded',
      data: { object: {} },
    });
    const deliver = (sent: string, seconds: number, key: string, signed = sent) => {
      const signature = createHmac('sha256', key).update(`${seconds}.${signed}`).digest('hex');
      const headers = {
        'content-type': 'application/json',
        'stripe-signature': `t=${seconds},v1=${signature}`,
      };
      return raw({ method: 'POST', path: '/api/webhooks/payments', headers, body: sent });
    };
    const now = () => Math.floor(Date.now() / 1000);

    it('takes an event that is signed and fresh', async () => {
      expect((await deliver(body, now(), secret())).status).toBe(200);
    });

    it.each([
      ['forged', () => deliver(body, now(), 'whsec_of_somebody_else')],
      ['changed on the way', () => deliver(body.replace('charge', 'refund'), now(), secret(), body)],
      ['an hour old', () => deliver(body, now() - 3_600, secret())],
      ['of the future', () => deliver(body, now() + 3_600, secret())],
      ['stamped with words', () => deliver(body, Number.NaN, secret())],
      ['empty', () => deliver('', now(), secret())],
    ])('refuses an event that is %s', async (_what, send) => {
      expect((await send()).status).toBe(400);
    });
  });
});
