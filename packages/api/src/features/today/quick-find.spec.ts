import type { Found } from '@bookmatch/common/today/quick-find-contract';
import { Books } from '../../../test/harness/books.js';
import type { Client } from '../../../test/harness/client.js';
import { ClockSteps } from '../../../test/harness/clock-steps.js';
import { startEstimate } from '../../../test/harness/estimate-steps.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

describe('quick find', () => {
  let api: TestApi;
  let shop: TestShop;
  let books: Books;
  let clock: ClockSteps;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
    books = new Books(api, shop);
    clock = await ClockSteps.of(shop);
  });
  afterAll(() => api.close());

  const find = async (q: string, client: Client = shop.owner): Promise<Found[]> => {
    const answer = await client.get('/find', { q });
    if (answer.status !== 200) throw new Error(answer.text);
    return (answer.body as { rows: Found[] }).rows;
  };

  it('finds customers, leads, estimates, jobs and invoices by what they are called', async () => {
    const customerId = await books.customer({ name: 'Tamsin Quill', company: 'Quill and Sons' });
    await shop.owner.post('/leads', { title: 'Bench', contactName: 'Tamsin Quill', source: 'website' });
    await startEstimate(shop.owner, { customerId, title: 'Pantry' });
    const job = await books.job({ customerId, title: 'Hall cabinets' });
    const invoice = await books.issue(await books.draftStage(job, 0));
    const rows = await find('quill');
    expect(new Set(rows.map(({ kind }) => kind))).toEqual(
      new Set(['customer', 'lead', 'estimate', 'job', 'invoice']),
    );
    expect(rows.find(({ kind }) => kind === 'invoice')).toEqual({
      kind: 'invoice',
      id: invoice.id,
      title: 'Tamsin Quill',
      line: 'Hall cabinets · Issued',
      number: invoice.number,
    });
    expect(rows.find(({ kind }) => kind === 'lead')).toMatchObject({
      title: 'Bench',
      line: 'Tamsin Quill · New',
    });
    expect(JSON.stringify(rows)).not.toMatch(/cents/i);
  });

  it('puts the number that matches before every text, and takes the kind that is named', async () => {
    const job = await books.job({ title: 'Numbered' });
    await books.customer({ name: `${job.number} Alder Court` });
    const [first, second] = await find(`${job.number}`);
    expect(first).toMatchObject({ kind: 'job', id: job.id, number: job.number });
    expect(second).toMatchObject({ kind: 'customer', title: `${job.number} Alder Court` });
    expect((await find(`Job ${job.number}`)).map(({ kind }) => kind)).toEqual(['job']);
    expect((await find(`invoice #${job.number}`)).every(({ kind }) => kind === 'invoice')).toBe(true);
  });

  it('puts what begins with the text first, and lets no kind hide the others', async () => {
    for (let copy = 0; copy < 12; copy += 1) await books.customer({ name: `House of Marlow ${copy}` });
    await books.customer({ name: 'Marlow Reed' });
    await shop.owner.post('/leads', { title: 'Marlow window seat', contactName: 'Wren', source: 'website' });
    const rows = await find('marlow');
    expect(rows.slice(0, 2).map(({ title }) => title)).toEqual(['Marlow Reed', 'Marlow window seat']);
    expect(rows.filter(({ kind }) => kind === 'customer')).toHaveLength(8);
  });

  it('takes % and _ as themselves, and refuses nothing to look for', async () => {
    await books.customer({ name: '100% Linseed' });
    expect(await find('100%')).toHaveLength(1);
    expect(await find('1__%')).toHaveLength(0);
    for (const q of ['', '   ', 'x'.repeat(101)])
      expect((await shop.owner.get('/find', { q })).status).toBe(400);
    expect((await shop.owner.get('/find')).status).toBe(400);
  });

  it('finds only what the role may read: the floor no prices, the crew only its jobs', async () => {
    await shop.owner.post('/leads', { title: 'Corbel wall', contactName: 'Wren', source: 'website' });
    await startEstimate(shop.owner, { title: 'Corbel wall' });
    await clock.job({}, { title: 'Corbel wall, open', openToCrew: true });
    await clock.job({}, { title: 'Corbel wall, closed off', openToCrew: false });
    const { client: leadHand } = await shop.join('lead-hand');
    expect((await find('corbel', leadHand)).map(({ kind }) => kind)).toEqual(['job', 'job']);
    const { client: crew } = await shop.join('crew');
    expect((await find('corbel', crew)).map(({ title }) => title)).toEqual(['Corbel wall, open']);
    const { client: bookkeeper } = await shop.join('bookkeeper');
    expect(await find('corbel', bookkeeper)).toHaveLength(4);
  });

  it('finds nothing of another shop', async () => {
    const stranger = await api.signUp();
    expect(await find('marlow', stranger.owner)).toEqual([]);
  });
});
