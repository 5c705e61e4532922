import type Stripe from 'stripe';
import { startRig, type Rig } from '../testing/rig.js';

describe('the onboarding page', () => {
  let rig: Rig;
  let account: string;
  let link: Stripe.AccountLink;

  beforeAll(async () => {
    rig = await startRig();
  });
  afterAll(() => rig.close());
  beforeEach(async () => {
    account = (await rig.stripe.accounts.create({ type: 'standard' })).id;
    link = await rig.stripe.accountLinks.create({
      account,
      type: 'account_onboarding',
      refresh_url: 'http://app.test/again',
      return_url: 'http://app.test/back',
    });
  });

  const read = (): Promise<Stripe.Account> => rig.stripe.accounts.retrieve(account);

  it('says it is a test page', async () => {
    const text = await (await fetch(link.url)).text();
    expect(text).toContain('Test payment page - no real card is charged');
    expect(text).toContain('This is a test page');
  });

  it('opens the account for charges and payouts, and says so in the account’s name', async () => {
    const answer = await rig.submit(link.url, { action: 'complete', business_name: 'Walnut Row' });
    expect(answer.headers.get('location')).toBe('http://app.test/back');
    expect(await read()).toMatchObject({
      charges_enabled: true,
      payouts_enabled: true,
      details_submitted: true,
      business_profile: { name: 'Walnut Row' },
      requirements: { currently_due: [], disabled_reason: null },
    });
    const answered = await rig.control('GET', `/events?type=account.updated&object=${account}`);
    const { events } = answered as { events: Stripe.Event[] };
    expect(events).toHaveLength(1);
    expect(events[0]).toMatchObject({ account, data: { previous_attributes: { charges_enabled: false } } });
  });

  it('may leave the account under review, to be opened or closed later', async () => {
    await rig.submit(link.url, { action: 'review', business_name: 'Walnut Row' });
    expect(await read()).toMatchObject({ charges_enabled: false, details_submitted: true });
    await rig.control('POST', `/accounts/${account}/standing`, { enabled: true });
    expect(await read()).toMatchObject({ charges_enabled: true });
    await rig.control('POST', `/accounts/${account}/standing`, { enabled: false });
    expect(await read()).toMatchObject({ charges_enabled: false, details_submitted: true });
  });

  it('leaves everything as it was when put off, and the link stays good', async () => {
    await rig.submit(link.url, { action: 'later' });
    expect(await read()).toMatchObject({ details_submitted: false });
    expect((await fetch(link.url)).status).toBe(200);
  });

  it('needs a name', async () => {
    expect((await rig.submit(link.url, { action: 'complete', business_name: ' ' })).status).toBe(422);
  });

  it('leads to the refresh address once used or too old', async () => {
    await rig.submit(link.url, { action: 'complete', business_name: 'Walnut Row' });
    const again = await fetch(link.url, { redirect: 'manual' });
    expect(again.headers.get('location')).toBe('http://app.test/again');
    const address = { refresh_url: 'http://app.test/again', return_url: 'http://app.test/back' };
    const old = await rig.stripe.accountLinks.create({ account, type: 'account_onboarding', ...address });
    await rig.control('POST', '/clock', { advanceSeconds: 301 });
    expect((await fetch(old.url, { redirect: 'manual' })).headers.get('location')).toBe(
      'http://app.test/again',
    );
  });
});
