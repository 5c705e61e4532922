import type { Estimate } from '@bookmatch/common/estimates/estimates-contract';
import {
  contentOf,
  openLink,
  priceEstimate,
  read,
  save,
  send,
  sendEstimate,
} from '../../../test/harness/estimate-steps.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

describe('sending an estimate', () => {
  let api: TestApi;
  let shop: TestShop;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp({ shopName: 'Alder Court Cabinets' });
  });
  afterAll(() => api.close());

  it('mails the shop’s letter with the link and the PDF, and freezes what was sent', async () => {
    const draft = await priceEstimate(shop.owner);
    const answer = await send(shop.owner, draft, 'ann@sent.test', 'As we said on Tuesday.\n<b>Ann</b>');
    const sent = answer.body as Estimate;
    expect(sent).toMatchObject({
      status: 'sent',
      sends: [{ to: 'ann@sent.test', revisionNumber: 1 }],
      currentRevision: { status: 'sent', sendRefusals: [] },
    });
    const [letter] = await api.lettersTo('ann@sent.test');
    expect(letter).toMatchObject({ subject: expect.stringContaining('Alder Court Cabinets') });
    expect(letter?.text).toContain('$5,661.55, $295.15 sales tax included');
    expect(letter?.text).toContain('As we said on Tuesday.');
    expect(letter?.html).toContain('&lt;b&gt;Ann&lt;/b&gt;');
    expect(letter?.text).toMatch(/\/c\/[\w-]{64}/);
    expect(letter?.attachments).toMatchObject([{ contentType: 'application/pdf' }]);
    const late = await save(shop.owner, sent, { ...contentOf(sent), intro: 'Changed' });
    expect(late.status).toBe(409);
    expect((await read(shop.owner, sent.id)).currentRevision.intro).toBe('');
  });

  it('sends only what was seen: an estimate or a revision that changed meanwhile is refused', async () => {
    const seen = await priceEstimate(shop.owner);
    await save(shop.owner, seen, { ...contentOf(seen), discountCents: 10_000 });
    expect((await send(shop.owner, seen)).status).toBe(412);
    const fresh = await read(shop.owner, seen.id);
    await shop.owner.patch(`/estimates/${seen.id}`, { title: 'Renamed' }, fresh.version);
    expect((await send(shop.owner, fresh)).status).toBe(412);
    expect((await send(shop.owner, await read(shop.owner, seen.id))).status).toBe(200);
  });

  it('sends once for a double click, and again when asked again', async () => {
    const draft = await priceEstimate(shop.owner);
    const body = { to: 'twice@sent.test', message: '', revisionVersion: draft.currentRevision.version };
    const options = { version: draft.version, key: 'a-double-click' };
    const [one, two] = await Promise.all(
      [1, 2].map(() => shop.owner.post(`/estimates/${draft.id}/send`, body, options)),
    );
    expect([one?.status, two?.status]).toEqual([200, 200]);
    expect(await api.lettersTo('twice@sent.test')).toHaveLength(1);
    const again = await send(shop.owner, await read(shop.owner, draft.id), 'twice@sent.test');
    expect(again.body).toMatchObject({ sends: [{ revisionNumber: 1 }, { revisionNumber: 1 }] });
    expect(await api.lettersTo('twice@sent.test')).toHaveLength(2);
  });

  it('lets a new revision take the place of the sent one only when it is sent itself', async () => {
    const { estimate, customer } = await sendEstimate(api, shop.owner);
    const revised = await shop.owner.post(
      `/estimates/${estimate.id}/revisions`,
      {},
      { version: estimate.version },
    );
    expect(revised.status).toBe(201);
    const draft = revised.body as Estimate;
    expect(draft).toMatchObject({
      status: 'sent',
      currentRevision: { number: 2, status: 'draft' },
      revisions: [
        { number: 1, status: 'sent' },
        { number: 2, status: 'draft' },
      ],
    });
    const saved = await save(shop.owner, draft, { ...contentOf(draft), discountCents: 6_640 });
    expect(saved.status).toBe(200);
    expect((await customer.get('')).body).toMatchObject({ estimate: { document: { discountCents: 0 } } });
    const twice = await shop.owner.post(`/estimates/${draft.id}/revisions`, {}, { version: draft.version });
    expect(twice.status).toBe(409);
    expect((await send(shop.owner, await read(shop.owner, draft.id))).status).toBe(200);
    expect((await read(shop.owner, draft.id)).revisions.map(({ status }) => status)).toEqual([
      'superseded',
      'sent',
    ]);
    expect((await customer.get('')).body).toMatchObject({
      estimate: { status: 'open', document: { revisionNumber: 2, discountCents: 6_640 } },
    });
  });

  it('records that the customer said no, and starts over from there', async () => {
    const { estimate } = await sendEstimate(api, shop.owner);
    const declined = await shop.owner.post(
      `/estimates/${estimate.id}/decline`,
      { reason: 'Too late in the year' },
      { version: estimate.version },
    );
    expect(declined.body).toMatchObject({ status: 'declined', declineReason: 'Too late in the year' });
    const now = declined.body as Estimate;
    expect((await send(shop.owner, now)).status).toBe(409);
    const again = await shop.owner.post(`/estimates/${estimate.id}/revisions`, {}, { version: now.version });
    expect(again.body).toMatchObject({ status: 'draft', currentRevision: { number: 2 } });
  });

  it('will not record a no to what was never sent', async () => {
    const { id, version } = await priceEstimate(shop.owner);
    expect((await shop.owner.post(`/estimates/${id}/decline`, { reason: '' }, { version })).status).toBe(409);
  });

  it('refuses to send again what has expired, and renews it with a new revision', async () => {
    const { estimate, email } = await sendEstimate(api, shop.owner, { validUntil: '2026-06-02' });
    api.clock.set('2026-06-10T12:00:00Z');
    const late = await send(shop.owner, await read(shop.owner, estimate.id), email);
    expect(late.status).toBe(409);
    const { body } = await shop.owner.post(
      `/estimates/${estimate.id}/revisions`,
      {},
      { version: estimate.version },
    );
    expect((body as Estimate).currentRevision.validUntil).toBe('2026-07-10');
    expect((await send(shop.owner, body as Estimate, email)).body).toMatchObject({ status: 'sent' });
  });

  it('gives, lists and ends links; what is ended stops at once', async () => {
    const { estimate, customer } = await sendEstimate(api, shop.owner);
    const about = { subject: 'estimate', subjectId: estimate.id };
    expect((await customer.get('')).status).toBe(200);
    const made = (await shop.owner.post('/links', about)).body as { id: string; url: string };
    const [{ found }] = await api.platform.dataSource.query<[{ found: string }]>(
      'select count(*) as found from idempotency_key where locate(?, answer) > 0',
      [new URL(made.url).pathname],
    );
    expect(Number(found)).toBe(0);
    expect(made.url).toMatch(/\/c\/[\w-]{64}$/);
    const byHand = api.browser().below(`/api/links/${made.url.split('/').at(-1) ?? ''}`);
    expect((await byHand.get('')).status).toBe(200);
    const listed = (await shop.owner.get('/links', about)).body as { rows: { id: string }[] };
    expect(listed.rows).toMatchObject([
      { id: made.id, revokedAt: null, lastSeenAt: expect.any(String) },
      { revokedAt: null, lastSeenAt: expect.any(String) },
    ]);
    expect(JSON.stringify(listed)).not.toContain('/c/');
    const ended = await shop.owner.send('post', `/links/${made.id}/revoke`, {});
    expect(ended.body).toMatchObject({ revokedAt: expect.any(String) });
    expect((await byHand.get('')).status).toBe(410);
    expect((await customer.get('')).status).toBe(200);
  });

  it('gives no link to a draft, to another shop’s estimate, or to who may only read', async () => {
    const draft = await priceEstimate(shop.owner);
    const about = { subject: 'estimate', subjectId: draft.id };
    expect((await shop.owner.post('/links', about)).status).toBe(409);
    const { estimate } = await sendEstimate(api, shop.owner);
    const sent = { subject: 'estimate', subjectId: estimate.id };
    const stranger = await api.signUp();
    expect((await stranger.owner.post('/links', sent)).status).toBe(404);
    expect((await stranger.owner.get('/links', sent)).body).toEqual({ rows: [] });
    const { client: bookkeeper } = await shop.join('bookkeeper');
    expect((await bookkeeper.post('/links', sent)).status).toBe(403);
    const { rows } = (await bookkeeper.get('/links', sent)).body as { rows: { id: string }[] };
    expect((await bookkeeper.send('post', `/links/${rows[0]?.id}/revoke`, {})).status).toBe(403);
    expect((await stranger.owner.send('post', `/links/${rows[0]?.id}/revoke`, {})).status).toBe(404);
  });

  it('answers a question by letter, once', async () => {
    const { estimate, customer, email } = await sendEstimate(api, shop.owner);
    await customer.post('/questions', { body: 'Is the crown oak too?' });
    const { questions } = await read(shop.owner, estimate.id);
    const address = `/estimates/${estimate.id}/questions/${questions[0]?.id}/answer`;
    const answered = await shop.owner.post(address, { body: 'It is, quartersawn.' });
    expect(answered.body).toMatchObject({ answer: 'It is, quartersawn.', answeredBy: 'Owner 1' });
    const letter = (await api.lettersTo(email)).at(-1);
    expect(letter?.text).toContain('It is, quartersawn.');
    expect((await (await openLink(api, email)).get('')).body).toMatchObject({
      estimate: { questions: [{ answer: 'It is, quartersawn.' }] },
    });
    expect((await shop.owner.post(address, { body: 'Again' })).status).toBe(409);
    const { client: bookkeeper } = await shop.join('bookkeeper');
    expect((await bookkeeper.post(address, { body: 'Me' })).status).toBe(403);
  });
});
