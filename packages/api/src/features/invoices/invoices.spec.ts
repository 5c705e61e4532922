import { Books } from '../../../test/harness/books.js';
import { QueryNoter } from '../../../test/harness/query-noter.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

const NO_ID = '0193e000-0000-7000-8000-00000000abcd';

describe('invoices', () => {
  let api: TestApi;
  let shop: TestShop;
  let books: Books;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
    books = new Books(api, shop);
  });
  afterAll(() => api.close());

  describe('a draft', () => {
    it('takes a billing stage over as it was accepted, net and tax', async () => {
      const job = await books.job();
      const draft = await books.draftStage(job, 0);
      expect(draft).toMatchObject({
        number: null,
        status: 'draft',
        standing: 'draft',
        kind: 'deposit',
        billingStage: { name: 'Deposit' },
        taxRate: null,
        netCents: 40_000,
        taxCents: 3300,
        totalCents: 43_300,
        balanceCents: 0,
        issueRefusals: [],
      });
      expect(draft.lines).toMatchObject([{ quantity: '1', amountCents: 40_000 }]);
      expect((await books.draftStage(job, 1)).kind).toBe('progress');
      expect((await books.draftStage(job, 2)).kind).toBe('final');
    });

    it('bills a stage once, also when two do it at once, and again after the draft is deleted', async () => {
      const job = await books.job();
      const body = { from: 'stage', jobId: job.id, billingStageId: books.stages(job)[0] };
      const answers = await Promise.all(Array.from({ length: 8 }, () => shop.owner.post('/invoices', body)));
      expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409, 409, 409, 409, 409, 409]);
      const made = answers.find(({ status }) => status === 201)?.body as { id: string; version: number };
      expect(answers.find(({ status }) => status === 409)?.body).toMatchObject({
        facts: { invoiceId: made.id },
      });
      expect((await shop.owner.delete(`/invoices/${made.id}`, made.version)).status).toBe(204);
      expect((await shop.owner.get(`/invoices/${made.id}`)).status).toBe(404);
      expect((await shop.owner.post('/invoices', body)).status).toBe(201);
    });

    it('computes lines and tax once on the sum of the taxable lines', async () => {
      const draft = await books.draft({ taxRate: '0.0825' }, [
        { quantity: '2.5', unitPriceCents: 999, taxable: true },
        { quantity: '1', unitPriceCents: -500, taxable: true },
        { quantity: '3', unitPriceCents: 100, taxable: false },
      ]);
      // 2498 - 500 = 1998 taxable, times 0.0825 = 164.835
      expect(draft).toMatchObject({ netCents: 2298, taxCents: 165, totalCents: 2463 });
    });

    it('changes its lines, keeps the ones that stay, and refuses a stale version', async () => {
      const draft = await books.draft({}, [{ description: 'First' }, { description: 'Second' }]);
      const [first] = draft.lines;
      const { amountCents: _, ...kept } = first!;
      const lines = [books.line({ description: 'New', unitPriceCents: 500 }), { ...kept, quantity: '2' }];
      const changed = await shop.owner.patch(
        `/invoices/${draft.id}`,
        { lines, memo: 'Thank you.' },
        draft.version,
      );
      expect(changed.body).toMatchObject({
        version: draft.version + 1,
        memo: 'Thank you.',
        totalCents: 20_500,
        lines: [{ description: 'New' }, { id: first!.id, description: 'First', amountCents: 20_000 }],
      });
      const stale = await shop.owner.patch(`/invoices/${draft.id}`, { memo: 'Again' }, draft.version);
      expect(stale.status).toBe(412);
      expect((await shop.owner.send('patch', `/invoices/${draft.id}`, { memo: 'x' })).status).toBe(428);
    });

    it('does not let two edits of one version both go through, also where the sum stays the same', async () => {
      const draft = await books.draft();
      const [{ amountCents: _, ...line }] = draft.lines as [(typeof draft.lines)[0]];
      const edit = (description: string, version: number) =>
        shop.owner.patch(`/invoices/${draft.id}`, { lines: [{ ...line, description }] }, version);
      const first = await edit('Two drawers', draft.version);
      expect(first.body).toMatchObject({ version: draft.version + 1, totalCents: draft.totalCents });
      expect((await edit('A shelf', draft.version)).status).toBe(412);
      expect(
        (await shop.owner.post(`/invoices/${draft.id}/issue`, {}, { version: draft.version })).status,
      ).toBe(412);
      expect((await books.read(draft.id)).lines).toMatchObject([{ description: 'Two drawers' }]);
      const same = await edit('Two drawers', draft.version + 1);
      expect(same.body).toMatchObject({ version: draft.version + 1 });
    });

    it('does not take over a line of another invoice', async () => {
      const other = await books.draft();
      const { amountCents: _, ...line } = other.lines[0]!;
      const mine = await books.draft();
      const answer = await shop.owner.patch(`/invoices/${mine.id}`, { lines: [line] }, mine.version);
      expect(answer.status).toBe(409);
      expect((await books.read(other.id)).lines).toHaveLength(1);
    });

    it('keeps the amounts of a stage as agreed', async () => {
      const draft = await books.draftStage(await books.job(), 0);
      const lines = [books.line({ unitPriceCents: 1 })];
      expect((await shop.owner.patch(`/invoices/${draft.id}`, { lines }, draft.version)).status).toBe(409);
      const memo = await shop.owner.patch(`/invoices/${draft.id}`, { memo: 'As agreed' }, draft.version);
      expect(memo.status).toBe(200);
    });

    it('refuses what is not a customer, a job or a stage of this shop, and a job of somebody else', async () => {
      const stranger = new Books(api, await api.signUp());
      const foreign = await stranger.job();
      const post = (body: object) => shop.owner.post('/invoices', body);
      const lines = { from: 'lines', taxRate: '0', lines: [] };
      expect((await post({ ...lines, customerId: await stranger.anyCustomer() })).status).toBe(404);
      const customerId = await books.customer();
      expect((await post({ ...lines, customerId, jobId: foreign.id })).status).toBe(404);
      expect((await post({ ...lines, customerId, jobId: (await books.job()).id })).status).toBe(422);
      const [stage] = stranger.stages(foreign);
      expect((await post({ from: 'stage', jobId: foreign.id, billingStageId: stage })).status).toBe(404);
      const job = await books.job();
      expect((await post({ from: 'stage', jobId: job.id, billingStageId: stage })).status).toBe(404);
    });

    it('refuses unknown fields, bad numbers and amounts beyond all bounds', async () => {
      const customerId = await books.anyCustomer();
      const post = (fields: object, line: object = {}) =>
        shop.owner.post('/invoices', {
          ...{ from: 'lines', customerId, taxRate: '0', lines: [{ ...books.line(), ...line }] },
          ...fields,
        });
      for (const answer of [
        await post({ number: 7 }),
        await post({ status: 'paid' }),
        await post({ taxRate: '8.25' }),
        await post({}, { quantity: '1e3' }),
        await post({}, { unitPriceCents: 1.5 }),
        await post({}, { quantity: '100000', unitPriceCents: 100_000_000 }),
        await post({}, { description: '' }),
      ])
        expect(answer.status).toBe(422);
    });
  });

  describe('issuing', () => {
    it('gives number and dates, freezes the draft and books the sale', async () => {
      const before = await books.balances();
      const draft = await books.draft({ taxRate: '0.1' }, [{ unitPriceCents: 50_000, taxable: true }]);
      const issued = await books.issue(draft);
      expect(issued).toMatchObject({
        status: 'issued',
        standing: 'due',
        issuedOn: '2026-06-01',
        dueOn: '2026-06-15',
        balanceCents: 55_000,
      });
      expect(issued.number).toBeGreaterThanOrEqual(2001);
      const after = await books.balances();
      const change = (code: string) => (after[code] ?? 0) - (before[code] ?? 0);
      expect(['1200', '4000', '2200'].map(change)).toEqual([55_000, 50_000, 5000]);
      const path = `/invoices/${issued.id}`;
      expect((await shop.owner.patch(path, { memo: 'Later' }, issued.version)).status).toBe(409);
      expect((await shop.owner.delete(path, issued.version)).status).toBe(409);
      expect((await shop.owner.post(`${path}/issue`, {}, { version: issued.version })).status).toBe(409);
    });

    it('refuses an empty draft, one that comes to nothing, and a due date that has passed', async () => {
      const empty = await books.draft({ lines: [] });
      expect(empty.issueRefusals).toHaveLength(1);
      const issue = ({ id, version }: { id: string; version: number }) =>
        shop.owner.post(`/invoices/${id}/issue`, {}, { version });
      expect((await issue(empty)).status).toBe(409);
      expect((await issue(await books.draft({}, [{ unitPriceCents: 0 }]))).status).toBe(409);
      const late = await books.draft();
      await shop.owner.patch(`/invoices/${late.id}`, { dueOn: '2026-05-31' }, late.version);
      expect((await issue({ ...late, version: late.version + 1 })).status).toBe(409);
    });

    it('numbers 50 at once without a gap or a double', async () => {
      const apart = new Books(api, await api.signUp());
      const drafts = [];
      for (let index = 0; index < 50; index += 1) drafts.push(await apart.draft());
      const issued = await Promise.all(drafts.map((draft) => apart.issue(draft)));
      const numbers = issued.map(({ number }) => number).sort((a, b) => (a ?? 0) - (b ?? 0));
      expect(numbers).toEqual(Array.from({ length: 50 }, (_, index) => 2001 + index));
      const { body } = await apart.client.get('/ledger/entries', { limit: '200', sort: 'number' });
      const entries = (body as { rows: { number: number }[] }).rows.map(({ number }) => number);
      expect(entries).toEqual(Array.from({ length: 50 }, (_, index) => 1 + index));
    });

    it('issues one draft once, however often it is pressed', async () => {
      const draft = await books.draft();
      const press = () => shop.owner.post(`/invoices/${draft.id}/issue`, {}, { version: draft.version });
      const answers = await Promise.all(Array.from({ length: 20 }, press));
      expect(answers.filter(({ status }) => status === 200)).toHaveLength(1);
      for (const { status } of answers) expect([200, 409, 412]).toContain(status);
    });

    it('leaves no gap when an issue is undone half way', async () => {
      const first = await books.issued();
      const draft = await books.draft();
      const stale = await shop.owner.post(`/invoices/${draft.id}/issue`, {}, { version: draft.version + 5 });
      expect(stale.status).toBe(412);
      expect((await books.issue(draft)).number).toBe((first.number ?? 0) + 1);
    });

    it('counts the days of the shop, not of UTC', async () => {
      const pacific = new Books(api, await api.signUp({ timeZone: 'Pacific/Auckland' }));
      expect((await pacific.issued()).issuedOn).toBe('2026-06-02');
    });
  });

  describe('deposits', () => {
    it('are owed to the customer until the last stage is invoiced, in whatever order', async () => {
      const apart = new Books(api, await api.signUp());
      const job = await apart.job();
      const [deposit, ready, final] = [
        await apart.draftStage(job, 0),
        await apart.draftStage(job, 1),
        await apart.draftStage(job, 2),
      ];
      await apart.issue(deposit);
      expect(await apart.balances()).toEqual({ '1200': 43_300, '2300': 43_300 });
      await apart.issue(final);
      expect(await apart.balances()).toMatchObject({ '2300': 43_300 });
      await apart.issue(ready);
      expect(await apart.balances()).toEqual({ '1200': 108_250, '2200': 8250, '4000': 100_000 });
    });

    it('turn into sales once when both last stages are issued at the same moment', async () => {
      const apart = new Books(api, await api.signUp());
      const job = await apart.job();
      await apart.issue(await apart.draftStage(job, 0));
      const last = [await apart.draftStage(job, 1), await apart.draftStage(job, 2)];
      await Promise.all(last.map((draft) => apart.issue(draft)));
      expect(await apart.balances()).toEqual({ '1200': 108_250, '2200': 8250, '4000': 100_000 });
    });

    it('turn into sales when the job is closed, less what was credited', async () => {
      const apart = new Books(api, await api.signUp());
      const job = await apart.job();
      const deposit = await apart.issue(await apart.draftStage(job, 0));
      await apart.credit(deposit, { amountCents: 3300 });
      expect(await apart.balances()).toEqual({ '1200': 40_000, '2300': 40_000 });
      const close = { stage: 'closed', confirmSkip: true, reason: 'The customer moved away.' };
      const { body } = await apart.client.get(`/jobs/${job.id}`);
      const { version } = body as { version: number };
      const closed = await apart.client.post(`/jobs/${job.id}/move`, close, { version });
      expect(closed.status).toBe(200);
      // Of 43,300 with 3,300 tax, 3,300 were taken back: 252 of it tax, to the cent.
      expect(await apart.balances()).toEqual({ '1200': 40_000, '2200': 3048, '4000': 36_952 });
      await apart.credit(await apart.read(deposit.id));
      expect(await apart.balances()).toEqual({ '4000': 36_952, '4900': 36_952 });
    });
  });

  describe('lists and sums', () => {
    let apart: Books;
    let shopApart: TestShop;
    beforeAll(async () => {
      shopApart = await api.signUp();
      apart = new Books(api, shopApart);
      const [ines, sten] = [
        await apart.customer({ name: 'Ines Calder' }),
        await apart.customer({ name: 'Sten Halloran' }),
      ];
      await apart.draft({ customerId: ines });
      await apart.issued({ customerId: ines }, [{ unitPriceCents: 1000 }]);
      await apart.pay(await apart.issued({ customerId: sten }, [{ unitPriceCents: 2000 }]), {
        amountCents: 500,
      });
      await apart.pay(await apart.issued({ customerId: sten }, [{ unitPriceCents: 4000 }]));
      await apart.credit(await apart.issued({ customerId: sten }, [{ unitPriceCents: 8000 }]));
    });

    const list = async (query: Record<string, string>) =>
      (await apart.client.get('/invoices', query)).body as {
        rows: { id: string; standing: string; balanceCents: number; customerName: string; number: number }[];
        total: number;
        next: string | null;
      };

    it('show drafts first, then the newest number', async () => {
      const { rows } = await list({});
      expect(rows.map(({ standing }) => standing)).toEqual(['draft', 'credited', 'paid', 'part-paid', 'due']);
    });

    it('narrow by standing, customer, text and number, and page without losing a row', async () => {
      expect((await list({ standing: 'open' })).total).toBe(2);
      expect((await list({ standing: 'draft' })).total).toBe(1);
      expect((await list({ q: 'hallo' })).total).toBe(3);
      expect((await list({ q: '2002' })).rows[0]?.number).toBe(2002);
      for (const sort of ['number', '-issuedOn', 'dueOn', '-createdAt']) {
        const seen: string[] = [];
        let after: string | null = '';
        while (after !== null) {
          const page = await list({ sort, limit: '2', ...(after ? { after } : {}) });
          seen.push(...page.rows.map(({ id }) => id));
          after = page.next;
        }
        expect([sort, new Set(seen).size, seen.length]).toEqual([sort, 5, 5]);
      }
      expect((await apart.client.get('/invoices', { sort: 'total' })).status).toBe(400);
      expect((await apart.client.get('/invoices', { standing: 'due' })).status).toBe(400);
    });

    it('count days overdue and age by customer as time goes by', async () => {
      const totals = async () => (await apart.client.get('/invoices/totals')).body as Record<string, number>;
      expect(await totals()).toMatchObject({
        aging: { currentCents: 2500, totalCents: 2500 },
        overdueCents: 0,
        openCount: 2,
        draftCents: 10_000,
        draftCount: 1,
      });
      api.clock.forward({ days: 45 });
      // The owner's session has ended by then.
      const { client: later } = await shopApart.join('bookkeeper');
      apart = new Books(api, shopApart, later);
      const { rows } = await list({ standing: 'overdue' });
      expect(rows).toHaveLength(2);
      expect(rows[0]).toMatchObject({ standing: 'overdue', daysOverdue: 31 });
      expect(await totals()).toMatchObject({
        aging: { currentCents: 0, days31To60Cents: 2500, totalCents: 2500 },
        overdueCents: 2500,
        overdueCount: 2,
      });
      const { body } = await apart.client.get('/invoices/aging');
      expect(body).toMatchObject({
        on: '2026-07-16',
        rows: [
          { customerName: 'Sten Halloran', days31To60Cents: 1500, totalCents: 1500 },
          { customerName: 'Ines Calder', totalCents: 1000 },
        ],
        totals: { totalCents: 2500 },
      });
      const earlier = await apart.client.get('/invoices/aging', { on: '2026-06-15' });
      expect(earlier.body).toMatchObject({ totals: { currentCents: 2500 } });
      api.clock.forward({ days: -45 });
      apart = new Books(api, shopApart);
    });

    it('go out as CSV, formulas neutralized', async () => {
      const named = await apart.customer({ name: '=cmd|calc' });
      await apart.issued({ customerId: named });
      const { text, headers } = await apart.client.get('/invoices/export', { standing: 'open' });
      expect(headers['content-type']).toContain('text/csv');
      const [head, ...rows] = text.trim().split('\r\n');
      expect(head).toBe('Number,Kind,Standing,Customer,Job,Stage,Issued,Due,Total,Balance,Overpaid');
      expect(rows).toHaveLength(3);
      expect(text).toContain("'=cmd|calc");
      expect((await apart.client.get('/invoices/aging/export')).text).toContain('Sten Halloran,15.00,0.00');
    });

    it('answer a list and the head of it with few statements', async () => {
      const noter = new QueryNoter(api);
      expect(await noter.during(() => apart.client.get('/invoices'))).toHaveLength(3);
      expect((await noter.during(() => apart.client.get('/invoices/totals'))).length).toBeLessThanOrEqual(4);
    });
  });

  it('lets bookkeepers in, and neither the floor, nor strangers, nor nobody', async () => {
    const { id, version } = await books.draft();
    const { client: bookkeeper } = await shop.join('bookkeeper');
    expect((await bookkeeper.get(`/invoices/${id}`)).status).toBe(200);
    expect((await bookkeeper.post(`/invoices/${id}/issue`, {}, { version })).status).toBe(200);
    for (const role of ['lead-hand', 'crew'] as const) {
      const { client } = await shop.join(role);
      for (const path of ['/invoices', '/invoices/totals', '/invoices/aging', `/invoices/${id}`, '/payments'])
        expect([role, path, (await client.get(path)).status]).toEqual([role, path, 403]);
      expect((await client.post('/invoices', {})).status).toBe(403);
      expect((await client.post(`/invoices/${id}/payments`, {}, { version })).status).toBe(403);
    }
    const stranger = await api.signUp();
    expect((await stranger.owner.get(`/invoices/${id}`)).status).toBe(404);
    expect((await stranger.owner.get(`/invoices/${id}/pdf`)).status).toBe(404);
    expect((await shop.owner.get(`/invoices/${NO_ID}`)).status).toBe(404);
  });
});
