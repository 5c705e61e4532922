import type { Job, JobRow } from '@bookmatch/common/jobs/jobs-contract';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

type Member = Awaited<ReturnType<TestShop['join']>>;

describe('jobs', () => {
  let api: TestApi;
  let shop: TestShop;
  let crew: Member;
  let leadHand: Member;
  let bookkeeper: Member;
  let customerId: string;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
    crew = await shop.join('crew');
    leadHand = await shop.join('lead-hand');
    bookkeeper = await shop.join('bookkeeper');
    const customer = await shop.owner.post('/customers', { kind: 'homeowner', name: 'Orla Fenwick' });
    customerId = (customer.body as { id: string }).id;
  });
  afterAll(() => api.close());

  const make = async (fields: object = {}) => {
    const answer = await shop.owner.post('/jobs', { title: 'Mudroom lockers', customerId, ...fields });
    if (answer.status !== 201) throw new Error(answer.text);
    return answer.body as Job;
  };
  const operations = async () =>
    ((await shop.owner.get('/operations')).body as { rows: { id: string; name: string; version: number }[] })
      .rows;

  describe('made by hand', () => {
    it('take a number, the plan, and a billing schedule that adds up to the price', async () => {
      const [measure, cut] = await operations();
      await shop.owner.patch(`/operations/${cut!.id}`, { defaultRateCentsPerHour: 4_500 }, cut!.version);
      const job = await make({
        contractNetCents: 100_001,
        contractTaxCents: 8_250,
        operations: [
          { operationId: cut!.id, plannedMinutes: 90 },
          { operationId: measure!.id, plannedMinutes: 30 },
        ],
        plannedCosts: [{ category: 'material', plannedCents: 21_800 }],
      });
      const { body } = await shop.owner.get(`/jobs/${job.id}`);
      const read = body as Job;
      expect(read).toMatchObject({
        stage: 'accepted',
        estimate: null,
        customer: { id: customerId, name: 'Orla Fenwick' },
        plannedMinutes: 120,
        clockedMinutes: 0,
        operations: [
          { name: 'Measure and draw', plannedMinutes: 30, plannedCostCents: 0 },
          { name: 'Cut sheet goods', plannedMinutes: 90, plannedCostCents: 6_750, clockedMinutes: 0 },
        ],
        money: {
          contractNetCents: 100_001,
          contractTotalCents: 108_251,
          plannedCostCents: 28_550,
          actualCostCents: 0,
          expectedCostCents: 28_550,
          percentComplete: '0',
          costs: [
            { category: 'material', plannedCents: 21_800, actualCents: 0 },
            { category: 'labor', plannedCents: 6_750, actualCents: 0 },
          ],
          billedCents: 0,
        },
      });
      expect(read.stageHistory).toMatchObject([{ stage: 'accepted', by: 'Owner 1' }]);
      const planned = read.money!.billing.map((stage) => stage.plannedCents);
      expect(planned.length).toBeGreaterThan(0);
      expect(planned.reduce((sum, cents) => sum + cents, 0)).toBe(108_251);
    });

    it('bill nothing when they have no price', async () => {
      expect((await make()).money).toMatchObject({
        billing: [],
        contractTotalCents: 0,
        percentComplete: null,
      });
    });

    it('are refused with the field named: another customer’s site, an unknown operation, a schedule that is short', async () => {
      const other = (await shop.owner.post('/customers', { kind: 'designer', name: 'Someone' })).body as {
        id: string;
      };
      const site = (await shop.owner.post(`/customers/${other.id}/sites`, { name: 'Lake' })).body as {
        id: string;
      };
      const paths = async (fields: object) => {
        const answer = await shop.owner.post('/jobs', { title: 'Refused', customerId, ...fields });
        expect([409, 422]).toContain(answer.status);
        return (answer.body as { fields?: { path: string }[] }).fields?.map(({ path }) => path);
      };
      expect(await paths({ siteId: site.id })).toEqual(['siteId']);
      expect(await paths({ customerId: site.id })).toEqual(['customerId']);
      expect(await paths({ operations: [{ operationId: site.id, plannedMinutes: 5 }] })).toEqual([
        'operations.0.operationId',
      ]);
      expect(await paths({ title: '', number: 7, installOn: 'soon' })).toEqual(
        expect.arrayContaining(['title', 'number', 'installOn']),
      );
      const half = [{ name: 'Half', share: { percent: '50' }, deposit: false, due: 'by-hand' }];
      expect(await paths({ contractNetCents: 100, billingSchedule: half })).toBeUndefined();
      const list = (await shop.owner.get('/jobs', { q: 'Refused' })).body as { total: number };
      expect(list.total).toBe(0);
    });

    it('get distinct numbers without gaps when many are made at once', async () => {
      const before = (await make()).number;
      const made = await Promise.all(Array.from({ length: 20 }, () => make({ title: 'Batch' })));
      const numbers = made.map((job) => job.number).sort((a, b) => a - b);
      expect(numbers).toEqual(Array.from({ length: 20 }, (_, index) => before + 1 + index));
    });

    it('are one when the same request comes again', async () => {
      const body = { title: 'Only once', customerId };
      const answers = await Promise.all(
        Array.from({ length: 6 }, () => shop.owner.post('/jobs', body, { key: 'the-same-job' })),
      );
      expect(new Set(answers.map(({ body: made }) => (made as Job).id)).size).toBe(1);
    });
  });

  describe('as each role sees them', () => {
    const MONEY = /cents|money|price|cost|contract|billed|paid/i;
    const keysOf = (value: unknown): string[] =>
      value !== null && typeof value === 'object'
        ? Object.entries(value).flatMap(([key, inner]) => [key, ...keysOf(inner)])
        : [];
    let open: Job;
    let closedToCrew: Job;
    beforeAll(async () => {
      const [first] = await operations();
      const plan = {
        contractNetCents: 5_000,
        operations: [{ operationId: first!.id, plannedMinutes: 60 }],
        plannedCosts: [{ category: 'material', plannedCents: 900 }],
      };
      open = await make({ title: 'Seen by all', ...plan });
      closedToCrew = await make({ title: 'Seen by some', openToCrew: false, ...plan });
    });

    it('have no money key at all for crew and lead hand, in the page and in the list', async () => {
      for (const { client } of [crew, leadHand]) {
        const page = await client.get(`/jobs/${open.id}`);
        expect(page.status).toBe(200);
        expect(keysOf(page.body).filter((key) => MONEY.test(key))).toEqual([]);
        expect((page.body as Job).operations).toHaveLength(1);
        const list = (await client.get('/jobs', { q: 'Seen by all' })).body as { rows: JobRow[] };
        expect(list.rows).toHaveLength(1);
        expect(keysOf(list).filter((key) => MONEY.test(key))).toEqual([]);
        const csv = await client.get('/jobs/export');
        expect(csv.text.split('\r\n')[0]).toBe(
          'Job,Title,Customer,City,Stage,Install,Planned hours,Clocked hours',
        );
      }
    });

    it('have it for bookkeeper and owner', async () => {
      for (const client of [bookkeeper.client, shop.owner]) {
        expect(((await client.get(`/jobs/${open.id}`)).body as Job).money?.contractTotalCents).toBe(5_000);
        const list = (await client.get('/jobs', { q: 'Seen by all' })).body as { rows: JobRow[] };
        expect(list.rows[0]).toMatchObject({
          contractTotalCents: 5_000,
          plannedCostCents: 900,
          actualCostCents: 0,
        });
        expect((await client.get('/jobs/export')).text).toMatch(/Contract with tax/);
      }
    });

    it('are hidden from crew who are not assigned: not in the list, its count, the file, or by id', async () => {
      const titles = async (member: Member, q = 'Seen by') => {
        const { rows, total } = (await member.client.get('/jobs', { q })).body as {
          rows: JobRow[];
          total: number;
        };
        expect(total).toBe(rows.length);
        return rows.map((row) => row.title).sort();
      };
      expect(await titles(crew)).toEqual(['Seen by all']);
      expect((await crew.client.get(`/jobs/${closedToCrew.id}`)).status).toBe(404);
      expect((await crew.client.get(`/jobs/${closedToCrew.id}/files`)).status).toBe(404);
      expect((await crew.client.get('/jobs/export')).text).not.toMatch(/Seen by some/);

      await shop.owner.post(
        `/jobs/${closedToCrew.id}/assign`,
        { memberIds: [crew.memberId] },
        { version: 1 },
      );
      expect(await titles(crew)).toEqual(['Seen by all', 'Seen by some']);
      expect((await crew.client.get(`/jobs/${closedToCrew.id}`)).status).toBe(200);
      const mine = (await crew.client.get('/jobs', { assigned: 'me' })).body as { rows: JobRow[] };
      expect(mine.rows.map((row) => row.title)).toEqual(['Seen by some']);
      expect(mine.rows[0]?.assignedMemberIds).toEqual([crew.memberId]);

      const another = await shop.join('crew');
      expect(await titles(another)).toEqual(['Seen by all']);
      expect(await titles(leadHand)).toEqual(['Seen by all', 'Seen by some']);
    });

    it('are changed by owner and lead hand only, and made by the owner only', async () => {
      const job = await make();
      const change = (member: { client: TestShop['owner'] }, version: number) =>
        member.client.patch(`/jobs/${job.id}`, { notes: `as of ${version}` }, version);
      expect((await change(crew, 1)).status).toBe(403);
      expect((await change(bookkeeper, 1)).status).toBe(403);
      expect((await change(leadHand, 1)).status).toBe(200);
      expect((await change({ client: shop.owner }, 2)).status).toBe(200);
      for (const { client } of [crew, bookkeeper, leadHand])
        expect((await client.post('/jobs', { title: 'No', customerId })).status).toBe(403);
    });

    it('are not there for a stranger', async () => {
      const stranger = await api.signUp();
      expect((await stranger.owner.get(`/jobs/${open.id}`)).status).toBe(404);
      const inShop = stranger.owner.below(`/api/shops/${shop.id}`);
      for (const path of [
        `/jobs/${open.id}`,
        '/jobs',
        '/jobs/export',
        `/jobs/${open.id}/files`,
        `/jobs/${open.id}/costs`,
      ])
        expect((await inShop.get(path)).status).toBe(404);
      const theirs = (await stranger.owner.post('/jobs', { title: 'Taken', customerId })).status;
      expect(theirs).toBe(422);
    });
  });

  describe('changed', () => {
    it('keep what was not sent, and refuse a version that has passed and fields that are not theirs', async () => {
      const job = await make({ notes: 'Left of the door', installOn: '2026-07-01' });
      const changed = await shop.owner.patch(`/jobs/${job.id}`, { installOn: '2026-07-08' }, 1);
      expect(changed.body).toMatchObject({ installOn: '2026-07-08', notes: 'Left of the door', version: 2 });
      expect((await shop.owner.patch(`/jobs/${job.id}`, { notes: '' }, 1)).status).toBe(412);
      expect((await shop.owner.send('patch', `/jobs/${job.id}`, { notes: '' })).status).toBe(428);
      for (const field of [{ stage: 'closed' }, { contractNetCents: 1 }, { shopId: shop.id }, { version: 9 }])
        expect((await shop.owner.patch(`/jobs/${job.id}`, field, 2)).status).toBe(422);
      const list = (await shop.owner.get('/jobs', { installFrom: '2026-07-08', installTo: '2026-07-08' }))
        .body;
      expect(list).toMatchObject({ rows: [{ id: job.id, installOn: '2026-07-08' }], total: 1 });
    });

    it('take members of the shop only, and keep one assignment a member', async () => {
      const job = await make();
      const stranger = await api.signUp();
      const alien = await stranger.join('crew');
      const assign = (memberIds: string[], version: number) =>
        shop.owner.post(`/jobs/${job.id}/assign`, { memberIds }, { version });
      expect((await assign([alien.memberId], 1)).status).toBe(422);
      const both = await assign([crew.memberId, leadHand.memberId, crew.memberId], 1);
      expect((both.body as Job).assignedMembers.map((member) => member.memberId)).toEqual([
        crew.memberId,
        leadHand.memberId,
      ]);
      expect((await assign([], 1)).status).toBe(412);
      expect(((await assign([leadHand.memberId], 2)).body as Job).assignedMembers).toHaveLength(1);
    });

    it('let one of two at the same time through', async () => {
      const job = await make();
      const answers = await Promise.all(
        [0, 1].map((turn) =>
          shop.owner.post(
            `/jobs/${job.id}/assign`,
            { memberIds: turn ? [crew.memberId] : [] },
            { version: 1 },
          ),
        ),
      );
      expect(answers.map(({ status }) => status).sort()).toEqual([200, 412]);
    });
  });

  describe('in lists', () => {
    it('are paged by keyset without losing or repeating one, by each key and in both directions', async () => {
      for (const installOn of ['2026-08-02', '2026-08-01', null, null, '2026-08-02'])
        await make({ title: `Paged ${installOn}`, installOn });
      for (const key of ['number', 'title', 'installOn', 'createdAt'])
        for (const sort of [key, `-${key}`]) {
          const seen: string[] = [];
          let after: string | undefined;
          do {
            const { body } = await shop.owner.get('/jobs', {
              q: 'Paged',
              sort,
              limit: '2',
              ...(after ? { after } : {}),
            });
            const page = body as { rows: JobRow[]; next: string | null };
            seen.push(...page.rows.map(({ id }) => id));
            after = page.next ?? undefined;
          } while (after);
          expect(seen).toHaveLength(5);
          expect(new Set(seen).size).toBe(5);
        }
      const soonest = (await shop.owner.get('/jobs', { q: 'Paged', sort: 'installOn' })).body as {
        rows: JobRow[];
      };
      expect(soonest.rows.map((row) => row.installOn)).toEqual([
        '2026-08-01',
        '2026-08-02',
        '2026-08-02',
        null,
        null,
      ]);
    });

    it('are found by title, customer and number, % standing for itself', async () => {
      const job = await make({ title: 'Nook at 100% walnut' });
      const found = async (q: string) =>
        ((await shop.owner.get('/jobs', { q })).body as { rows: JobRow[] }).rows;
      expect(await found('100%')).toHaveLength(1);
      expect(await found('1__%')).toHaveLength(0);
      expect((await found(String(job.number)))[0]?.id).toBe(job.id);
      expect((await found('Fenwick')).length).toBeGreaterThan(5);
    });

    it('refuse unknown keys, sorts and stages', async () => {
      const refused: Record<string, string>[] = [
        { sort: 'customerId' },
        { stage: 'lost' },
        { assigned: 'you' },
        { shopId: shop.id },
      ];
      for (const query of refused) expect((await shop.owner.get('/jobs', query)).status).toBe(400);
    });

    it('cost few queries whatever their length', async () => {
      const { driver } = api.platform.dataSource;
      const queries: string[] = [];
      const runner = Object.getPrototypeOf(driver.createQueryRunner('master')) as {
        query(sql: string, ...rest: unknown[]): unknown;
      };
      const original = runner.query;
      runner.query = function counted(this: unknown, sql: string, ...rest: unknown[]) {
        queries.push(sql);
        return original.call(this, sql, ...rest);
      };
      try {
        await shop.owner.get('/jobs', { limit: '40' });
      } finally {
        runner.query = original;
      }
      expect(queries.length).toBeLessThanOrEqual(4);
    });

    it('are exported whole, with formulas made harmless', async () => {
      await make({ title: '=HYPERLINK("http://evil.test")' });
      const answer = await shop.owner.get('/jobs/export', { q: 'HYPERLINK' });
      expect(answer.headers['content-type']).toBe('text/csv; charset=utf-8');
      expect(answer.headers['content-disposition']).toMatch(/^attachment; .*jobs\.csv/);
      expect(answer.text.split('\r\n')[1]).toMatch(/,"'=HYPERLINK/);
      const all = await shop.owner.get('/jobs/export');
      const total = ((await shop.owner.get('/jobs')).body as { total: number }).total;
      expect(all.text.trimEnd().split('\r\n')).toHaveLength(total + 1);
    });
  });
});
