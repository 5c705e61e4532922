import { createHash, randomUUID } from 'node:crypto';
import type { CustomerEstimate } from '@bookmatch/common/customer-page/customer-page-contract';
import type { Client } from '../../../test/harness/client.js';
import {
  contentOf,
  line,
  newestToken,
  read,
  save,
  send,
  sendEstimate,
  twoRooms,
} from '../../../test/harness/estimate-steps.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

type Page = { shop: { name: string }; estimate: CustomerEstimate };

describe('the customer’s page of an estimate', () => {
  let api: TestApi;
  let shop: TestShop;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp({ shopName: 'Alder Court Cabinets' });
  });
  afterAll(() => api.close());

  const pageOf = async (customer: Client) => (await customer.get('')).body as Page;
  const yesTo = ({ document, documentHash }: CustomerEstimate, name = 'Ines Calder') => ({
    ...{ name, revisionId: document.revisionId, documentHash, agreed: true },
  });
  const jobsOf = (estimateId: string) =>
    api.platform.dataSource.query<object[]>('select id from job where estimate_id = ?', [estimateId]);

  it('shows what, for how much and when it is paid, to whoever holds the link', async () => {
    const { estimate, customer } = await sendEstimate(api, shop.owner, { intro: 'As agreed on site.' });
    expect(await pageOf(customer)).toMatchObject({
      subject: 'estimate',
      shop: { name: 'Alder Court Cabinets', timeZone: 'America/Chicago' },
      estimate: {
        status: 'open',
        acceptance: null,
        document: {
          estimateNumber: estimate.number,
          intro: 'As agreed on site.',
          totalCents: 566_155,
          billingSchedule: [{ totalCents: 283_078 }, { totalCents: 283_077 }],
        },
      },
    });
  });

  it('lets no cost, hour or margin out: neither a key nor a value of one', async () => {
    const { rows: operations } = (await shop.owner.get('/operations')).body as { rows: { id: string }[] };
    const told = { unitPriceCents: 91_001, quantity: '3' };
    const secret = { unitCostCents: 7_654_321, plannedMinutesPerUnit: '98765.432' };
    const rooms = [
      {
        id: randomUUID(),
        name: 'Library',
        lines: [line({ ...told, ...secret, kind: 'labor', operationId: operations[0]?.id ?? null })],
      },
    ];
    const { estimate, customer } = await sendEstimate(api, shop.owner, { rooms });
    const { totals } = estimate.currentRevision;
    const answer = await customer.get('');
    expect(answer.text).toContain('91001');
    const keys = new Set<string>();
    JSON.parse(answer.text, (key: string, value: unknown) => {
      keys.add(key);
      return value;
    });
    const inside = /cost|margin|markup|minute|hour|operation|kind|member|version|lead/i;
    expect([...keys].filter((key) => inside.test(key))).toEqual([]);
    const values = [
      secret.unitCostCents,
      secret.plannedMinutesPerUnit,
      totals.plannedCostCents,
      totals.plannedMinutes,
      totals.marginCents,
      totals.margin,
      totals.markup,
      operations[0]?.id,
    ];
    for (const value of values) expect(answer.text).not.toContain(String(value));
    const pdf = await customer.get('/estimate.pdf');
    expect(pdf.type).toBe('application/pdf');
  });

  it('answers 404 to a forged link, 410 to one that ran out, and 404 to links about other things', async () => {
    const { customer, email } = await sendEstimate(api, shop.owner);
    const token = await newestToken(api, email);
    const forged = token.slice(0, -1) + (token.endsWith('A') ? 'B' : 'A');
    for (const bad of [forged, 'x'.repeat(64), '..%2f', randomUUID()])
      expect((await api.browser().get(`/api/links/${bad}`)).status).toBe(404);
    api.clock.forward({ days: 181 });
    const late = await customer.get('');
    expect(late.status).toBe(410);
    expect(late.body).toMatchObject({ code: 'link-expired' });
    expect((await customer.post('/questions', { body: 'Still there?' })).status).toBe(410);
    expect((await customer.get('/estimate.pdf')).status).toBe(410);
    api.clock.forward({ days: -181 });
  });

  it('counts tries by network address', async () => {
    const strict = await TestApi.open({ limitScale: 0.02 });
    const answers: number[] = [];
    for (let tries = 0; tries < 8; tries += 1)
      answers.push((await strict.browser().get(`/api/links/${'x'.repeat(64)}`)).status);
    expect(answers).toEqual([404, 404, 404, 404, 404, 404, 429, 429]);
    await strict.close();
  });

  it('takes a question and tells the people who write estimates, nobody else', async () => {
    const { client: _bookkeeper, email: bookkeeper } = await shop.join('bookkeeper');
    const { estimate, customer } = await sendEstimate(api, shop.owner);
    const asked = await customer.post('/questions', { body: 'Oak or ash?\n<script>alert(1)</script>' });
    expect(asked.status).toBe(201);
    expect((await read(shop.owner, estimate.id)).questions).toMatchObject([{ answer: null }]);
    const letter = (await api.lettersTo('owner1@shop.test')).at(-1);
    expect(letter?.text).toContain('Oak or ash?');
    expect(letter?.html).not.toContain('<script>');
    expect(letter?.text).toContain(`/s/${shop.slug}/estimates/${estimate.id}`);
    expect(await api.lettersTo(bookkeeper)).toEqual([]);
    const { rows } = (await shop.owner.get('/estimates', { q: String(estimate.number) })).body as {
      rows: object[];
    };
    expect(rows).toMatchObject([{ openQuestions: 1 }]);
    expect((await customer.post('/questions', { body: ' ' })).status).toBe(422);
  });

  it('takes no more questions than a shop can be asked at once', async () => {
    const { customer } = await sendEstimate(api, shop.owner);
    for (let asked = 0; asked < 20; asked += 1)
      expect((await customer.post('/questions', { body: `Question ${asked}` })).status).toBe(201);
    expect((await customer.post('/questions', { body: 'One more' })).status).toBe(409);
  });

  it('keeps who accepted what, when and from where, makes the job and tells both sides', async () => {
    const { estimate, customer, email } = await sendEstimate(api, shop.owner);
    const { estimate: offer } = await pageOf(customer);
    const answer = await customer.post('/accept', yesTo(offer), { headers: { 'User-Agent': 'A phone' } });
    expect(answer.status).toBe(200);
    expect(answer.body).toMatchObject({ status: 'accepted', acceptance: { name: 'Ines Calder' } });
    const [row] = await api.platform.dataSource.query<Record<string, string>[]>(
      'select * from estimate_acceptance where estimate_id = ?',
      [estimate.id],
    );
    expect(row).toMatchObject({
      name: 'Ines Calder',
      user_agent: 'A phone',
      document_hash: offer.documentHash,
    });
    expect(row?.['address']).toMatch(/127\.0\.0\.1/);
    expect(
      createHash('sha256')
        .update(row?.['document'] ?? '')
        .digest('hex'),
    ).toBe(offer.documentHash);
    expect(JSON.parse(row?.['document'] ?? '')).toEqual(offer.document);
    const accepted = await read(shop.owner, estimate.id);
    expect(accepted).toMatchObject({
      status: 'accepted',
      acceptance: { name: 'Ines Calder', documentHash: offer.documentHash },
      job: { number: expect.any(Number) },
    });
    expect((await api.lettersTo('owner1@shop.test')).at(-1)).toMatchObject({
      subject: expect.stringMatching(/^Accepted: /),
    });
    const thanks = (await api.lettersTo(email)).at(-1);
    expect(thanks?.text).toContain('Thank you, Ines Calder');
    expect(thanks?.attachments).toMatchObject([{ contentType: 'application/pdf' }]);
  });

  it('keeps acceptances as they are: the application itself cannot change or remove one', async () => {
    for (const sql of [
      "update estimate_acceptance set name = 'Somebody else'",
      'delete from estimate_acceptance',
    ])
      await expect(api.platform.dataSource.query(sql)).rejects.toThrow(/denied/);
  });

  it('makes one acceptance and one job of 50 at once, and gives all of them that one', async () => {
    const { estimate, customer } = await sendEstimate(api, shop.owner);
    const yes = yesTo((await pageOf(customer)).estimate);
    const answers = await Promise.all(Array.from({ length: 50 }, () => customer.post('/accept', yes)));
    expect(answers.map(({ status }) => status)).toEqual(Array.from({ length: 50 }, () => 200));
    expect(new Set(answers.map(({ text }) => text)).size).toBe(1);
    expect(await jobsOf(estimate.id)).toHaveLength(1);
  });

  it('lets exactly one of 50 people accept', async () => {
    const { estimate, customer } = await sendEstimate(api, shop.owner);
    const { estimate: offer } = await pageOf(customer);
    const answers = await Promise.all(
      Array.from({ length: 50 }, (_, person) => customer.post('/accept', yesTo(offer, `Person ${person}`))),
    );
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1);
    expect(answers.filter(({ status }) => status === 409)).toHaveLength(49);
    expect(await jobsOf(estimate.id)).toHaveLength(1);
  });

  it('refuses what is not exactly what was read', async () => {
    const { customer, estimate } = await sendEstimate(api, shop.owner);
    const { estimate: offer } = await pageOf(customer);
    const refused = async (change: object) =>
      (await customer.post('/accept', { ...yesTo(offer), ...change })).status;
    expect(await refused({ documentHash: 'a'.repeat(64) })).toBe(409);
    expect(await refused({ revisionId: randomUUID() })).toBe(404);
    expect(await refused({ agreed: false })).toBe(422);
    expect(await refused({ name: ' ' })).toBe(422);
    expect(await refused({ totalCents: 1 })).toBe(422);
    const other = await sendEstimate(api, shop.owner);
    const theirs = yesTo((await pageOf(other.customer)).estimate);
    expect(await refused(theirs)).toBe(404);
    expect((await read(shop.owner, estimate.id)).status).toBe('sent');
  });

  it('refuses a superseded revision, a draft and an expired one', async () => {
    const { customer, estimate, email } = await sendEstimate(api, shop.owner, { validUntil: '2026-06-20' });
    const { estimate: first } = await pageOf(customer);
    const { body } = await shop.owner.post(
      `/estimates/${estimate.id}/revisions`,
      {},
      { version: estimate.version },
    );
    const revised = body as typeof estimate;
    const draft = { ...yesTo(first), revisionId: revised.currentRevision.id };
    expect((await customer.post('/accept', draft)).status).toBe(404);
    const content = { ...contentOf(revised), rooms: twoRooms(), validUntil: '2026-06-20' };
    await save(shop.owner, revised, content);
    await send(shop.owner, await read(shop.owner, estimate.id), email);
    const superseded = await customer.post('/accept', yesTo(first));
    expect(superseded.status).toBe(409);
    expect(superseded.body).toMatchObject({ detail: expect.stringContaining('newer revision') });
    const { estimate: second } = await pageOf(customer);
    api.clock.set('2026-06-21T05:00:00Z');
    expect((await pageOf(customer)).estimate.status).toBe('expired');
    expect((await customer.post('/accept', yesTo(second))).status).toBe(409);
    api.clock.set('2026-06-02T12:00:00Z');
    expect((await customer.post('/accept', yesTo(second))).status).toBe(200);
  });

  it('does not change any more once it is accepted', async () => {
    const { customer, estimate } = await sendEstimate(api, shop.owner);
    await customer.post('/accept', yesTo((await pageOf(customer)).estimate));
    const accepted = await read(shop.owner, estimate.id);
    const { version } = accepted;
    const address = `/estimates/${estimate.id}`;
    expect((await save(shop.owner, accepted, contentOf(accepted))).status).toBe(409);
    expect((await shop.owner.post(`${address}/revisions`, {}, { version })).status).toBe(409);
    expect((await shop.owner.post(`${address}/decline`, { reason: '' }, { version })).status).toBe(409);
    expect((await shop.owner.patch(address, { title: 'Other' }, version)).status).toBe(409);
    expect((await send(shop.owner, accepted)).status).toBe(409);
    const { revisionId } = { revisionId: accepted.currentRevision.id };
    expect((await customer.post('/decline', { revisionId, reason: '' })).status).toBe(409);
  });

  it('takes a no with its reason, tells the shop, and takes no yes after it', async () => {
    const { customer, estimate } = await sendEstimate(api, shop.owner);
    const { estimate: offer } = await pageOf(customer);
    const no = { revisionId: offer.document.revisionId, reason: 'We wait a year.' };
    expect((await customer.post('/decline', no)).body).toMatchObject({ status: 'declined' });
    expect((await customer.post('/decline', no)).status).toBe(200);
    const about = (await api.lettersTo('owner1@shop.test')).filter(({ subject }) =>
      subject.startsWith(`Declined: estimate ${estimate.number},`),
    );
    expect(about).toHaveLength(1);
    expect(about[0]?.text).toContain('We wait a year.');
    expect((await customer.post('/accept', yesTo(offer))).status).toBe(409);
    expect(await read(shop.owner, estimate.id)).toMatchObject({
      status: 'declined',
      declineReason: 'We wait a year.',
    });
  });

  it('takes no request from another site', async () => {
    const { customer } = await sendEstimate(api, shop.owner);
    const yes = yesTo((await pageOf(customer)).estimate);
    const answer = await customer.post('/accept', yes, { headers: { Origin: 'https://elsewhere.test' } });
    expect(answer.status).toBe(403);
  });
});
