import type { Lead, LeadBoard, LeadNote, LeadRow } from '@bookmatch/common/leads/leads-contract';
import { randomUUID } from 'node:crypto';
import { openLink, priceEstimate, send } from '../../../test/harness/estimate-steps.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

const ABSENT = '01940000-0000-7000-8000-00000000dead';

describe('leads', () => {
  let api: TestApi;
  let shop: TestShop;
  beforeAll(async () => {
    // Late in the evening of January 14 in Chicago, already the 15th in UTC.
    api = await TestApi.open({ now: '2027-01-15T03:00:00Z' });
    shop = await api.signUp({ timeZone: 'America/Chicago' });
  });
  afterAll(() => api.close());

  const add = async (fields: object = {}): Promise<Lead> => {
    const lead = { title: 'Mudroom lockers', contactName: 'Wren Halloway', source: 'referral', ...fields };
    const answer = await shop.owner.post('/leads', lead);
    if (answer.status !== 201) throw new Error(answer.text);
    return answer.body as Lead;
  };
  const read = async (id: string) => (await shop.owner.get(`/leads/${id}`)).body as Lead;
  const list = async (query: Record<string, string>) =>
    ((await shop.owner.get('/leads', query)).body as { rows: LeadRow[] }).rows;
  const command = (lead: Pick<Lead, 'id' | 'version'>, verb: string, body: object = {}) =>
    shop.owner.post(`/leads/${lead.id}/${verb}`, body, { version: lead.version });

  it('takes in an inquiry as new and keeps how it came in', async () => {
    const lead = await add({ email: 'WREN@Example.test', nextStep: 'Call back', nextStepOn: '2027-01-14' });
    expect(lead).toMatchObject({
      version: 1,
      stage: 'new',
      email: 'wren@example.test',
      siteAddress: { street: '', city: '' },
      customerId: null,
      estimates: [],
      expectedCents: null,
      stageChanges: [{ fromStage: null, toStage: 'new', by: 'Owner 1' }],
    });
    expect(await read(lead.id)).toEqual(lead);
  });

  it('names each field that is wrong and refuses what it does not know', async () => {
    const answer = await shop.owner.post('/leads', {
      title: ' ',
      contactName: 'Wren',
      source: 'rumor',
      stage: 'won',
      nextStepOn: '2027-02-30',
      expectedCents: -1,
    });
    expect(answer.status).toBe(422);
    const paths = (answer.body as { fields: { path: string }[] }).fields.map(({ path }) => path);
    expect(paths).toEqual(
      expect.arrayContaining(['title', 'source', 'stage', 'nextStepOn', 'expectedCents']),
    );
  });

  it('changes what is named, empties nothing else, and refuses a version that has passed', async () => {
    const lead = await add({ phone: '555 0114', expectedCents: 1_400_000 });
    const url = `/leads/${lead.id}`;
    const changed = await shop.owner.patch(url, { nextStep: 'Measure', nextStepOn: '2027-01-20' }, 1);
    expect(changed.body).toMatchObject({
      version: 2,
      phone: '555 0114',
      expectedCents: 1_400_000,
      nextStepOn: '2027-01-20',
    });
    expect((await shop.owner.patch(url, { nextStepOn: null }, 1)).status).toBe(412);
    expect((await shop.owner.send('patch', url, { nextStepOn: null })).status).toBe(428);
    expect((await shop.owner.patch(url, { nextStepOn: null }, 2)).body).toMatchObject({ nextStepOn: null });
  });

  it('moves between open stages, and keeps every step', async () => {
    const lead = await add();
    const visited = (await command(lead, 'move', { stage: 'site-visit' })).body as Lead;
    expect((await command(lead, 'move', { stage: 'contacted' })).status).toBe(412);
    expect((await command(visited, 'move', { stage: 'site-visit' })).status).toBe(409);
    expect((await command(visited, 'move', { stage: 'won' })).status).toBe(422);
    const back = (await command(visited, 'move', { stage: 'contacted' })).body as Lead;
    expect(back.stageChanges.map(({ fromStage, toStage }) => [fromStage, toStage])).toEqual([
      [null, 'new'],
      ['new', 'site-visit'],
      ['site-visit', 'contacted'],
    ]);
  });

  it('is lost for a reason, and reopened where it was lost', async () => {
    const lead = (await command(await add(), 'move', { stage: 'estimating' })).body as Lead;
    expect((await command(lead, 'lose')).status).toBe(422);
    const lost = (await command(lead, 'lose', { reason: 'price', note: 'Half of it elsewhere' }))
      .body as Lead;
    expect(lost).toMatchObject({ stage: 'lost', lostReason: 'price', lostNote: 'Half of it elsewhere' });
    expect((await command(lost, 'move', { stage: 'new' })).status).toBe(409);
    expect((await command(lost, 'convert', { customer: { kind: 'homeowner', name: 'Wren' } })).status).toBe(
      409,
    );
    const reopened = (await command(lost, 'reopen')).body as Lead;
    expect(reopened).toMatchObject({ stage: 'estimating', lostReason: null, lostNote: '' });
  });

  it('is won by hand once, and stays won', async () => {
    const won = (await command(await add(), 'win')).body as Lead;
    expect(won.stage).toBe('won');
    for (const verb of ['win', 'reopen']) expect((await command(won, verb)).status).toBe(409);
    expect((await command(won, 'lose', { reason: 'price' })).status).toBe(409);
    expect((await command(won, 'move', { stage: 'new' })).status).toBe(409);
  });

  it('is taken to one stage when two people move it at once', async () => {
    const lead = await add();
    const answers = await Promise.all(
      Array.from({ length: 20 }, (_, index) =>
        command(lead, 'move', { stage: index % 2 ? 'contacted' : 'site-visit' }),
      ),
    );
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1);
    expect(answers.filter(({ status }) => status === 412)).toHaveLength(19);
    expect((await read(lead.id)).stageChanges).toHaveLength(2);
  });

  it('keeps notes, the newest first, with who wrote them', async () => {
    const { id } = await add();
    for (const body of ['Called, no answer', 'She wants white oak\nand a bench'])
      expect((await shop.owner.post(`/leads/${id}/notes`, { body })).status).toBe(201);
    expect((await shop.owner.post(`/leads/${id}/notes`, { body: '  ' })).status).toBe(422);
    const { rows } = (await shop.owner.get(`/leads/${id}/notes`)).body as { rows: LeadNote[] };
    expect(rows.map(({ body, by }) => [body, by])).toEqual([
      ['She wants white oak\nand a bench', 'Owner 1'],
      ['Called, no answer', 'Owner 1'],
    ]);
  });

  it('finds what is overdue by the date on the wall of the shop', async () => {
    const source = 'walk-in';
    await add({ title: 'Late', source, nextStep: 'Call', nextStepOn: '2027-01-13' });
    await add({ title: 'Today', source, nextStep: 'Call', nextStepOn: '2027-01-14' });
    await add({ title: 'Ahead', source, nextStep: 'Call', nextStepOn: '2027-01-15' });
    await add({ title: 'Nothing planned', source });
    const over = await add({ title: 'Late but won', source, nextStepOn: '2027-01-01' });
    await command(over, 'win');
    const titles = async (nextStep: string) =>
      (await list({ source, nextStep, sort: 'nextStepOn' })).map(({ title }) => title);
    expect(await titles('overdue')).toEqual(['Late']);
    expect(await titles('due')).toEqual(['Late', 'Today']);
    expect(await titles('none')).toEqual(['Nothing planned']);
    expect((await list({ source, sort: 'nextStepOn' })).at(-1)?.title).toBe('Nothing planned');
  });

  it('lists by stage, source and text, and pages without losing a row', async () => {
    const source = 'designer';
    for (const title of ['Page A', 'Page B', 'Page C', 'Page D', 'Page E']) await add({ title, source });
    const won = await add({ title: 'Page F', company: '50% Linen', source });
    await command(won, 'win');
    expect(await list({ source, stage: 'open' })).toHaveLength(5);
    expect((await list({ source, stage: 'won' })).map(({ title }) => title)).toEqual(['Page F']);
    expect(await list({ q: '50%' })).toHaveLength(1);
    expect(await list({ q: '5_%' })).toHaveLength(0);
    for (const sort of ['title', '-title', 'nextStepOn', 'createdAt', '-createdAt']) {
      const seen: string[] = [];
      for (let after: string | null = ''; after !== null;) {
        const query: Record<string, string> = { source, sort, limit: '2', ...(after ? { after } : {}) };
        const page = (await shop.owner.get('/leads', query)).body as { rows: LeadRow[]; next: string | null };
        seen.push(...page.rows.map(({ id }) => id));
        after = page.next;
      }
      expect(new Set(seen).size).toBe(6);
      expect(seen).toHaveLength(6);
    }
    expect((await shop.owner.get('/leads', { sort: 'stage;drop table lead' })).status).toBe(400);
    expect((await shop.owner.get('/leads', { stage: 'thinking' })).status).toBe(400);
  });

  it('shows the board: counts and sums of all, the soonest of each, what was closed in 90 days', async () => {
    const other = await api.signUp({ timeZone: 'America/Chicago' });
    const take = async (fields: object) =>
      (
        await other.owner.post('/leads', {
          contactName: 'Wren',
          source: 'website',
          title: 'Bench',
          ...fields,
        })
      ).body as Lead;
    const board = async (query: Record<string, string> = {}) =>
      ((await other.owner.get('/leads/board', query)).body as LeadBoard).columns;
    for (let index = 0; index < 32; index += 1)
      await take({
        expectedCents: 100_000,
        nextStepOn: `2027-02-${String(28 - (index % 28)).padStart(2, '0')}`,
      });
    const win = async (fields: object) =>
      other.owner.post(`/leads/${(await take(fields)).id}/win`, {}, { version: 1 });
    await win({ expectedCents: 250_000, source: 'referral' });
    api.clock.forward({ days: -91 });
    await win({ expectedCents: 700_000, source: 'referral' });
    api.clock.forward({ days: 91 });
    const [first, , , , closed] = await board();
    expect(first).toMatchObject({ stage: 'new', count: 32, expectedCents: 3_200_000 });
    expect(first?.rows).toHaveLength(30);
    const dates = first?.rows.map(({ nextStepOn }) => nextStepOn ?? '') ?? [];
    expect(dates).toEqual(dates.toSorted());
    expect(closed).toMatchObject({ stage: 'won', count: 1, expectedCents: 250_000 });
    expect((await board({ source: 'referral' })).map(({ count }) => count)).toEqual([0, 0, 0, 0, 1, 0]);
    expect((await board({ nextStep: 'none' })).map(({ count }) => count)).toEqual([0, 0, 0, 0, 0, 0]);
  });

  it('makes a customer and a site once, and starts an estimate there', async () => {
    const lead = await add({ title: 'Library wall' });
    expect((await command(lead, 'estimates', { title: 'Library wall' })).status).toBe(409);
    const wish = {
      customer: { kind: 'homeowner', name: 'Wren Halloway' },
      site: { name: 'Quarry Road house' },
    };
    const key = randomUUID();
    const twice = await Promise.all(
      [1, 2].map(() => shop.owner.post(`/leads/${lead.id}/convert`, wish, { version: lead.version, key })),
    );
    expect(twice.map(({ status }) => status).filter((status) => status !== 409)).toContain(200);
    const converted = await read(lead.id);
    expect(converted).toMatchObject({
      customerName: 'Wren Halloway',
      siteName: 'Quarry Road house',
      version: 2,
    });
    const found = (await shop.owner.get('/customers', { q: 'Wren Halloway' })).body as { total: number };
    expect(found.total).toBe(1);
    expect((await command(converted, 'convert', wish)).status).toBe(409);

    const started = await command(converted, 'estimates', { title: 'Library wall' });
    expect(started.status).toBe(201);
    const { estimateId } = started.body as { estimateId: string };
    expect((await shop.owner.get(`/estimates/${estimateId}`)).body).toMatchObject({
      customer: { name: 'Wren Halloway' },
      site: { name: 'Quarry Road house' },
      lead: { id: lead.id, title: 'Library wall' },
    });
    const estimating = await read(lead.id);
    expect(estimating).toMatchObject({ stage: 'estimating', estimates: [{ id: estimateId }] });
    const stays = await shop.owner.patch(`/leads/${lead.id}`, { customerId: null }, estimating.version);
    expect(stays.status).toBe(409);
  });

  it('is won when its customer accepts, also after it was given up', async () => {
    const customer = { kind: 'homeowner', name: 'Ines Calder', email: 'accepts@calder.test' };
    const lead = (await command(await add(), 'convert', { customer })).body as Lead;
    const fields = { customerId: lead.customerId, leadId: lead.id };
    const draft = await priceEstimate(shop.owner, fields);
    const sent = (await send(shop.owner, draft, customer.email)).body as typeof draft;
    await command(await read(lead.id), 'lose', { reason: 'no-answer' });
    const link = await openLink(api, customer.email);
    const { estimate } = (await link.get('/')).body as { estimate: { documentHash: string } };
    const answer = await link.post('/accept', {
      revisionId: sent.currentRevision.id,
      documentHash: estimate.documentHash,
      name: 'Ines Calder',
      agreed: true,
    });
    expect(answer.status).toBe(200);
    const won = await read(lead.id);
    expect(won).toMatchObject({ stage: 'won', lostReason: null });
    expect(won.stageChanges.at(-1)).toMatchObject({ fromStage: 'lost', toStage: 'won', by: null });
  });

  it('takes no customer and no lead that is not of this shop', async () => {
    const stranger = await api.signUp();
    const theirs = (await stranger.owner.post('/customers', { kind: 'homeowner', name: 'Theirs' })).body as {
      id: string;
    };
    const lead = await add();
    for (const customerId of [theirs.id, ABSENT]) {
      expect((await shop.owner.post('/leads', { ...LEAD, customerId })).status).toBe(404);
      expect((await shop.owner.patch(`/leads/${lead.id}`, { customerId }, 1)).status).toBe(404);
      expect((await command(lead, 'convert', { customerId })).status).toBe(404);
    }
    const estimate = { title: 'Theirs', customerId: theirs.id, leadId: lead.id };
    expect((await stranger.owner.post('/estimates', estimate)).status).toBe(404);
    for (const path of ['', '/notes']) {
      expect((await stranger.owner.get(`/leads/${lead.id}${path}`)).status).toBe(404);
      expect((await shop.owner.get(`/leads/${ABSENT}${path}`)).status).toBe(404);
    }
    expect((await stranger.owner.post(`/leads/${lead.id}/win`, {}, { version: 1 })).status).toBe(404);
    expect((await stranger.owner.get('/leads')).body).toMatchObject({ rows: [], total: 0 });
  });

  it('is the owner’s to change and the bookkeeper’s to read; the floor sees none', async () => {
    const { id } = await add();
    const bookkeeper = (await shop.join('bookkeeper')).client;
    expect((await bookkeeper.get(`/leads/${id}`)).body).toMatchObject({ id, expectedCents: null });
    expect((await bookkeeper.get('/leads/board')).status).toBe(200);
    expect((await bookkeeper.post('/leads', LEAD)).status).toBe(403);
    expect((await bookkeeper.post(`/leads/${id}/win`, {}, { version: 1 })).status).toBe(403);
    expect((await bookkeeper.post(`/leads/${id}/notes`, { body: 'Hello' })).status).toBe(403);
    for (const role of ['lead-hand', 'crew'] as const) {
      const { client } = await shop.join(role);
      for (const path of ['/leads', '/leads/board', '/leads/export', `/leads/${id}`, `/leads/${id}/notes`])
        expect((await client.get(path)).status).toBe(403);
    }
  });

  it('gives the list as a file, with formulas made harmless', async () => {
    await add({
      title: '=HYPERLINK("https://example.test")',
      source: 'show-or-fair',
      expectedCents: 125_050,
    });
    const { text, headers } = await shop.owner.get('/leads/export', { source: 'show-or-fair' });
    expect(headers['content-disposition']).toContain('leads.csv');
    const [head, row] = text.split('\r\n');
    expect(head).toBe(
      'Lead,Contact,Company,Phone,Source,Stage,Next step,Next step on,Came in,Expected amount',
    );
    expect(row).toContain("'=HYPERLINK");
    expect(row).toContain('Show or fair,New,');
    expect(row).toMatch(/,1250\.50$/);
  });
});

const LEAD = { title: 'Mudroom lockers', contactName: 'Wren Halloway', source: 'referral' };
