import { letterTo, tokenIn } from '../../../test/harness/letters.js';
import { PASSWORD, TestApi } from '../../../test/harness/test-api.js';

const form = (email: string, fields: object = {}) => ({
  name: 'Dora Flint',
  email,
  password: PASSWORD,
  shopName: 'Flint & Daughters',
  timeZone: 'America/Denver',
  unitSystem: 'metric',
  ...fields,
});

describe('signing up', () => {
  let api: TestApi;
  beforeAll(async () => {
    api = await TestApi.open();
  });
  afterAll(() => api.close());

  const confirmation = async (email: string) =>
    tokenIn(await letterTo(api, email, 'Confirm your e-mail address'));

  it('opens a shop with its owner and a trial once the address is confirmed', async () => {
    const browser = api.browser();
    expect((await browser.post('/account/sign-up', form('Dora@Flint.test'))).status).toBe(202);
    const answer = await browser.post('/account/confirm-email', {
      token: await confirmation('dora@flint.test'),
    });
    expect(answer.body).toMatchObject({
      person: { name: 'Dora Flint', email: 'dora@flint.test', emailConfirmed: true },
      memberships: [
        {
          slug: 'flint-daughters',
          shopName: 'Flint & Daughters',
          role: 'owner',
          unitSystem: 'metric',
          timeZone: 'America/Denver',
          subscription: { access: 'full', banner: 'none' },
        },
      ],
    });
    expect((await browser.get('/account/session')).status).toBe(200);
  });

  it('does not sign in before the address is confirmed, and says why only to who knows the password', async () => {
    await api.browser().post('/account/sign-up', form('slow@flint.test'));
    await api.product.outbox.drain();
    const known = await api
      .browser()
      .post('/account/sign-in', { email: 'slow@flint.test', password: PASSWORD });
    expect(known.status).toBe(409);
    const guess = await api
      .browser()
      .post('/account/sign-in', { email: 'slow@flint.test', password: 'not this one' });
    expect(guess.status).toBe(401);
  });

  it('refuses a short password, an unknown zone and fields that are not asked, each at its field', async () => {
    const answer = await api
      .browser()
      .post(
        '/account/sign-up',
        form('no@flint.test', { password: 'short', timeZone: 'Mars/Olympus', role: 'owner' }),
      );
    expect(answer.status).toBe(422);
    const paths = (answer.body as { fields: { path: string }[] }).fields.map(({ path }) => path);
    expect(paths.sort()).toEqual(['password', 'role', 'timeZone']);
  });

  it('answers a known address like an unknown one, changes nothing and writes to its owner', async () => {
    const browser = api.browser();
    const first = await browser.post('/account/sign-up', form('twice@flint.test'));
    await browser.post('/account/confirm-email', { token: await confirmation('twice@flint.test') });
    const again = await api
      .browser()
      .post('/account/sign-up', form('twice@flint.test', { name: 'Mallory', password: 'another password' }));
    expect([again.status, again.text]).toEqual([first.status, first.text]);
    expect(await letterTo(api, 'twice@flint.test', 'You have an account already')).toBeDefined();
    expect((await browser.get('/account/session')).body).toMatchObject({
      person: { name: 'Dora Flint' },
      memberships: [{ shopName: 'Flint & Daughters' }],
    });
    await api.signIn('twice@flint.test');
  });

  it('makes one account of parallel sign-ups with one address', async () => {
    await Promise.all(
      Array.from({ length: 6 }, () => api.browser().post('/account/sign-up', form('six@flint.test'))),
    );
    const letters = await api.lettersTo('six@flint.test');
    expect(letters.filter(({ subject }) => subject === 'Confirm your e-mail address')).toHaveLength(1);
  });

  it('confirms once, within two days', async () => {
    await api.browser().post('/account/sign-up', form('late@flint.test'));
    const token = await confirmation('late@flint.test');
    api.clock.forward({ hours: 49 });
    const late = await api.browser().post('/account/confirm-email', { token });
    expect(late.status).toBe(410);
    await api.browser().post('/account/resend-confirmation', { email: 'late@flint.test' });
    const fresh = await confirmation('late@flint.test');
    expect((await api.browser().post('/account/confirm-email', { token: fresh })).status).toBe(200);
    expect((await api.browser().post('/account/confirm-email', { token: fresh })).status).toBe(410);
  });

  it('resends a confirmation only where one is waited for, with one answer for all', async () => {
    const before = (await api.lettersTo('twice@flint.test')).length;
    const answers = await Promise.all(
      ['twice@flint.test', 'nobody@flint.test'].map((email) =>
        api.browser().post('/account/resend-confirmation', { email }),
      ),
    );
    expect(new Set(answers.map(({ status, text }) => `${status} ${text}`))).toEqual(new Set(['202 ']));
    expect(await api.lettersTo('twice@flint.test')).toHaveLength(before);
    expect(await api.lettersTo('nobody@flint.test')).toHaveLength(0);
  });

  it('keeps neither a password nor the secret of a link anywhere it was on its way through', async () => {
    await api
      .browser()
      .post('/account/sign-up', form('trace@flint.test', { password: 'a telling password' }));
    const token = await confirmation('trace@flint.test');
    const kept: { text: string }[] = await api.platform.dataSource.query(
      `select payload as text from outbox_message union all select coalesce(\`after\`, '') from audit_entry
       union all select token_hash from person_token union all select answer from idempotency_key`,
    );
    const all = kept.map(({ text }) => text).join('\n');
    expect(kept.length).toBeGreaterThan(10);
    for (const secret of [token, 'a telling password', '$argon2']) expect(all).not.toContain(secret);
  });

  it('changes the own name and nothing else', async () => {
    const browser = await api.signIn('twice@flint.test');
    const renamed = await browser.send('patch', '/account/person', { name: '  Dora  Flint-Reyes ' });
    expect(renamed.body).toMatchObject({ name: 'Dora  Flint-Reyes', email: 'twice@flint.test' });
    const more = await browser.send('patch', '/account/person', { name: 'x', email: 'other@flint.test' });
    expect(more.status).toBe(422);
    expect((await api.browser().send('patch', '/account/person', { name: 'x' })).status).toBe(401);
  });

  it('opens one more shop for somebody signed in, once for a double click', async () => {
    const browser = await api.signIn('twice@flint.test');
    const body = { shopName: 'Flint & Daughters', timeZone: 'America/Denver', unitSystem: 'inch' };
    const answers = await Promise.all(
      [1, 2].map(() => browser.post('/account/shops', body, { key: 'open-one-more' })),
    );
    expect(answers.map(({ status }) => status)).toEqual([201, 201]);
    expect(answers[0]?.body).toEqual(answers[1]?.body);
    expect(answers[0]?.body).toMatchObject({ role: 'owner', subscription: { access: 'full' } });
    const { body: session } = await browser.get('/account/session');
    const slugs = (session as { memberships: { slug: string }[] }).memberships.map(({ slug }) => slug);
    expect(new Set(slugs).size).toBe(2);
    const { shopId } = answers[0]?.body as { shopId: string };
    expect((await browser.get(`/shops/${shopId}/customers`)).status).toBe(200);
  });
});
