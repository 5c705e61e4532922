import { randomUUID } from 'node:crypto';
import type { Estimate } from '@bookmatch/common/estimates/estimates-contract';
import type { Revision } from '@bookmatch/common/estimates/revision-contract';
import {
  addCustomer,
  contentOf,
  line,
  priceEstimate,
  read,
  save,
  send,
  startEstimate,
  twoRooms,
} from '../../../test/harness/estimate-steps.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

describe('estimates', () => {
  let api: TestApi;
  let shop: TestShop;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
  });
  afterAll(() => api.close());

  it('starts with a draft that takes days, terms, tax and schedule from the shop', async () => {
    const estimate = await startEstimate(shop.owner);
    expect(estimate).toMatchObject({ title: 'Library wall', status: 'draft', version: 1, job: null });
    expect(estimate.currentRevision).toMatchObject({
      number: 1,
      status: 'draft',
      validUntil: '2026-07-01',
      taxRule: 'on-price',
      rooms: [],
    });
    const [row] = await api.platform.dataSource.query<{ schedule: string }[]>(
      'select default_billing_schedule schedule from shop where id = ?',
      [shop.id],
    );
    const schedule = JSON.parse(row?.schedule ?? '') as object[];
    expect(schedule.length).toBeGreaterThan(0);
    expect(estimate.currentRevision.billingSchedule).toMatchObject(schedule);
    expect(estimate.currentRevision.sendRefusals).not.toHaveLength(0);
  });

  it('adds no tax for a customer with an exemption certificate', async () => {
    const customerId = await addCustomer(shop.owner, { taxExempt: true, exemptionCertificate: 'EX-7' });
    const { currentRevision } = await startEstimate(shop.owner, { customerId });
    expect(currentRevision.taxRule).toBe('exempt');
  });

  it('numbers estimates without gaps or doubles when many start at once', async () => {
    const customerId = await addCustomer(shop.owner);
    const body = { title: 'At once', customerId };
    const answers = await Promise.all(Array.from({ length: 20 }, () => shop.owner.post('/estimates', body)));
    const numbers = answers.map((answer) => (answer.body as Estimate).number).sort((a, b) => a - b);
    expect(numbers).toEqual(numbers.map((_, index) => (numbers[0] ?? 0) + index));
  });

  it('prices to the cent what is saved', async () => {
    const { currentRevision: revision } = await priceEstimate(shop.owner);
    expect(revision.version).toBe(2);
    expect(revision.rooms.map((room) => room.amountCents)).toEqual([443_240, 93_400]);
    expect(revision.totals).toMatchObject({
      subtotalCents: 536_640,
      netCents: 536_640,
      taxableCents: 536_640,
      taxCents: 29_515,
      totalCents: 566_155,
      plannedCostCents: 311_650,
    });
    expect(revision.billingSchedule).toMatchObject([
      { totalCents: 283_078, netCents: 268_320, taxCents: 14_758 },
      { totalCents: 283_077, netCents: 268_320, taxCents: 14_757 },
    ]);
    expect(revision.sendRefusals).toEqual([]);
  });

  it('saves a whole draft over the last one: changed, moved, added and removed lines', async () => {
    const estimate = await priceEstimate(shop.owner);
    const content = contentOf(estimate);
    const [library, seat] = content.rooms;
    if (!library || !seat) throw new Error('two rooms');
    const [bookcase, crown] = library.lines;
    if (!bookcase || !crown) throw new Error('two lines');
    const added = line({ description: 'Panel' });
    const rooms = [
      { ...seat, lines: [{ ...crown, quantity: '12' }, added] },
      { ...library, name: 'Library', lines: [bookcase] },
    ];
    const saved = (await save(shop.owner, estimate, { ...content, rooms })).body as Revision;
    expect(saved.version).toBe(3);
    expect(saved.rooms.map((room) => [room.id, room.lines.map(({ id }) => id)])).toEqual([
      [seat.id, [crown.id, added.id]],
      [library.id, [bookcase.id]],
    ]);
    expect(contentOf(await read(shop.owner, estimate.id)).rooms).toEqual(rooms);
    const emptied = await save(shop.owner, estimate, { ...content, rooms: [] }, 3);
    expect(emptied.body).toMatchObject({ rooms: [], totals: { totalCents: 0 } });
  });

  it('keeps the version when a save changes nothing, so that an idle editor is never stale', async () => {
    const estimate = await priceEstimate(shop.owner);
    const again = await save(shop.owner, estimate, contentOf(estimate));
    expect(again.body).toMatchObject({ version: estimate.currentRevision.version });
  });

  it('refuses to save over what somebody saved meanwhile, and says which version that is', async () => {
    const estimate = await priceEstimate(shop.owner);
    const content = contentOf(estimate);
    expect((await save(shop.owner, estimate, { ...content, intro: 'First' })).status).toBe(200);
    const stale = await save(shop.owner, estimate, { ...content, rooms: [] });
    expect(stale.status).toBe(412);
    expect(stale.body).toMatchObject({ facts: { version: estimate.currentRevision.version + 1 } });
    const { currentRevision } = await read(shop.owner, estimate.id);
    expect(currentRevision).toMatchObject({ intro: 'First' });
    expect(currentRevision.rooms).toHaveLength(2);
    const address = `/estimates/${estimate.id}/revisions/${currentRevision.id}`;
    expect((await shop.owner.send('put', address, content)).status).toBe(428);
  });

  it('keeps a schedule that does not add up, names it, and will not send it', async () => {
    const estimate = await priceEstimate(shop.owner);
    const content = contentOf(estimate);
    const short = content.billingSchedule.map((stage) => ({ ...stage, share: { percent: '40' } }));
    const saved = (await save(shop.owner, estimate, { ...content, billingSchedule: short })).body as Revision;
    expect(saved.sendRefusals).toEqual(['The stages bill 80 % of the price, not 100 %.']);
    const refused = await send(shop.owner, await read(shop.owner, estimate.id));
    expect(refused.status).toBe(409);
    expect(refused.body).toMatchObject({ detail: 'The stages bill 80 % of the price, not 100 %.' });
  });

  it('will not send an estimate without a line', async () => {
    const refused = await send(shop.owner, await startEstimate(shop.owner));
    expect(refused.status).toBe(409);
    expect(
      (await api.lettersTo('ines@calder.test')).filter(({ subject }) => /Library/.test(subject)),
    ).toEqual([]);
  });

  it('names each field that is out of bounds', async () => {
    const estimate = await startEstimate(shop.owner);
    const rooms = [{ id: randomUUID(), name: '', lines: [line({ quantity: '-1', unitPriceCents: 1.5 })] }];
    const answer = await save(shop.owner, estimate, { ...contentOf(estimate), rooms, margin: '0.4' });
    expect(answer.status).toBe(422);
    const paths = (answer.body as { fields: { path: string }[] }).fields.map(({ path }) => path);
    expect(paths.sort()).toEqual([
      'margin',
      'rooms.0.lines.0.quantity',
      'rooms.0.lines.0.unitPriceCents',
      'rooms.0.name',
    ]);
  });

  it('takes no operation, room or line of another shop or estimate', async () => {
    const estimate = await startEstimate(shop.owner);
    const stranger = await api.signUp();
    const { rows } = (await stranger.owner.get('/operations')).body as { rows: { id: string }[] };
    const withLine = (fields: object) => ({
      ...contentOf(estimate),
      rooms: [{ id: randomUUID(), name: 'Room', lines: [line(fields)] }],
    });
    for (const operationId of [rows[0]?.id ?? '', randomUUID()]) {
      const answer = await save(shop.owner, estimate, withLine({ operationId }));
      expect(answer.status).toBe(422);
      expect(answer.body).toMatchObject({ fields: [{ path: 'rooms.0.lines.0.operationId' }] });
    }
    const other = await priceEstimate(shop.owner);
    const taken = await save(
      shop.owner,
      estimate,
      withLine({ id: other.currentRevision.rooms[0]?.lines[0]?.id }),
    );
    expect(taken.status).toBe(422);
    expect(contentOf(await read(shop.owner, other.id))).toEqual(contentOf(other));
  });

  it('answers 404 to a customer or site of another shop, and to a site of another customer', async () => {
    const stranger = await api.signUp();
    const theirs = await addCustomer(stranger.owner);
    expect((await shop.owner.post('/estimates', { title: 'X', customerId: theirs })).status).toBe(404);
    const [customerId, other] = [await addCustomer(shop.owner), await addCustomer(shop.owner)];
    const site = (await shop.owner.post(`/customers/${other}/sites`, { name: 'Lake house' })).body as {
      id: string;
    };
    const body = { title: 'X', customerId, siteId: site.id };
    expect((await shop.owner.post('/estimates', body)).status).toBe(404);
    const own = await shop.owner.post('/estimates', { ...body, customerId: other });
    expect(own.body).toMatchObject({ site: { id: site.id, name: 'Lake house' } });
  });

  it('duplicates an estimate for another customer, taxed as is due for them', async () => {
    const original = await priceEstimate(shop.owner);
    const customerId = await addCustomer(shop.owner, { taxExempt: true, exemptionCertificate: 'EX-9' });
    const copy = (await shop.owner.post(`/estimates/${original.id}/duplicate`, { customerId }))
      .body as Estimate;
    expect(copy.number).toBeGreaterThan(original.number);
    expect(copy).toMatchObject({
      title: 'Copy of Library wall',
      status: 'draft',
      customer: { id: customerId },
    });
    expect(copy.currentRevision.totals.totalCents).toBe(536_640);
    const ids = ({ currentRevision }: Estimate) => currentRevision.rooms.map(({ id }) => id);
    expect(ids(copy)).not.toEqual(ids(original));
  });

  it('lists by status, customer and text, expired told by the date alone', async () => {
    const other = await api.signUp();
    const draft = await priceEstimate(other.owner, { title: 'Draft one' });
    const sent = await priceEstimate(other.owner, { title: 'Sent one' }, { validUntil: '2026-06-03' });
    await send(other.owner, sent);
    const idsOf = async (query: Record<string, string>) => {
      const { rows } = (await other.owner.get('/estimates', query)).body as { rows: { id: string }[] };
      return rows.map(({ id }) => id);
    };
    expect(await idsOf({})).toEqual([sent.id, draft.id]);
    expect(await idsOf({ sort: 'title' })).toEqual([draft.id, sent.id]);
    expect(await idsOf({ status: 'sent' })).toEqual([sent.id]);
    expect(await idsOf({ status: 'expired' })).toEqual([]);
    expect(await idsOf({ customerId: draft.customer.id })).toEqual([draft.id]);
    expect(await idsOf({ q: 'Sent' })).toEqual([sent.id]);
    expect(await idsOf({ q: String(draft.number) })).toEqual([draft.id]);
    // The last day ends at midnight in Chicago, five hours behind UTC.
    api.clock.set('2026-06-04T04:59:00Z');
    expect(await idsOf({ status: 'sent' })).toEqual([sent.id]);
    api.clock.set('2026-06-04T05:00:00Z');
    expect(await idsOf({ status: 'expired' })).toEqual([sent.id]);
    expect((await read(other.owner, sent.id)).status).toBe('expired');
    const { rows } = (await other.owner.get('/estimates', { status: 'expired' })).body as { rows: object[] };
    expect(rows).toMatchObject([{ status: 'expired', totalCents: 566_155, openQuestions: 0 }]);
  });

  it('downloads the list as it is filtered, formulas neutralized', async () => {
    const other = await api.signUp();
    await priceEstimate(other.owner, { title: '=1+1' });
    await startEstimate(other.owner, { title: 'Another' });
    const file = await other.owner.get('/estimates/export', { q: '=1' });
    expect(file.type).toBe('text/csv');
    const lines = file.text.trim().split('\r\n');
    expect(lines).toHaveLength(2);
    expect(lines[1]).toContain("'=1+1");
    expect(lines[1]).toContain('5661.55');
  });

  it('lets the owner write, the bookkeeper read, and the floor see nothing', async () => {
    const estimate = await priceEstimate(shop.owner);
    const address = `/estimates/${estimate.id}`;
    const { client: bookkeeper } = await shop.join('bookkeeper');
    expect((await bookkeeper.get(address)).status).toBe(200);
    expect((await save(bookkeeper, estimate, contentOf(estimate))).status).toBe(403);
    expect((await send(bookkeeper, estimate)).status).toBe(403);
    expect(
      (await bookkeeper.post('/estimates', { title: 'X', customerId: estimate.customer.id })).status,
    ).toBe(403);
    for (const role of ['lead-hand', 'crew'] as const) {
      const { client } = await shop.join(role);
      expect((await client.get('/estimates')).status).toBe(403);
      expect((await client.get(address)).status).toBe(403);
    }
    const stranger = await api.signUp();
    expect((await stranger.owner.get(address)).status).toBe(404);
    expect((await save(stranger.owner, estimate, contentOf(estimate))).status).toBe(404);
  });

  it('typesets a draft as a PDF that says it is one', async () => {
    const { id, currentRevision } = await priceEstimate(shop.owner, {}, { rooms: twoRooms() });
    const pdf = await shop.owner.get(`/estimates/${id}/revisions/${currentRevision.id}/pdf`);
    expect(pdf.status).toBe(200);
    expect(pdf.type).toBe('application/pdf');
    expect((pdf.body as Buffer).subarray(0, 5).toString()).toBe('%PDF-');
  });
});
