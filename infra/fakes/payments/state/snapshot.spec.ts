import { mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { PRICE, startRig } from '../testing/rig.js';
import { openAccount, paymentParams, subscribe } from '../testing/scenes.js';

describe('the state file', () => {
  let folder: string;
  let stateFile: string;

  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'payments-fake-'));
    stateFile = join(folder, 'deep', 'state.json');
  });
  afterEach(() => rmSync(folder, { recursive: true }));

  it('keeps everything over a restart: accounts, sessions, subscriptions, answers to keys', async () => {
    const first = await startRig({ stateFile });
    const account = await openAccount(first);
    const shop = { stripeAccount: account };
    const key = { idempotencyKey: 'over-restart', ...shop };
    const session = await first.stripe.checkout.sessions.create(paymentParams(), key);
    const { subscription } = await subscribe(first);
    await first.close();
    expect(readdirSync(join(folder, 'deep'))).toEqual(['state.json']);

    const second = await startRig({ stateFile });
    expect(await second.stripe.accounts.retrieve(account)).toMatchObject({ charges_enabled: true });
    const again = await second.stripe.checkout.sessions.create(paymentParams(), key);
    expect(again.id).toBe(session.id);
    await second.control('POST', `/subscriptions/${subscription}/advance`, { to: 'renew' });
    expect((await second.stripe.subscriptions.retrieve(subscription)).status).toBe('active');
    expect((await second.stripe.prices.retrieve(PRICE)).unit_amount_decimal?.toString()).toBe('2900');
    await second.close();
  });

  it('sends after a restart what was not yet delivered', async () => {
    const first = await startRig({ stateFile, retryBaseMs: 60_000 });
    first.receiver.status = 500;
    const session = await first.stripe.checkout.sessions.create(paymentParams());
    await first.stripe.checkout.sessions.expire(session.id);
    await first.receiver.waitFor(1);
    const endpoint = { url: first.receiver.url, secret: 'whsec_new', sends: 'all' as const };
    await first.fake.close();
    const second = await startRig({ stateFile, webhooks: [endpoint] });
    first.receiver.status = 200;
    await second.control('POST', '/flush');
    expect(first.receiver.types()).toEqual(['checkout.session.expired', 'checkout.session.expired']);
    await second.close();
    await first.receiver.close();
  });

  it('is not overwritten when it is damaged', async () => {
    const damaged = join(folder, 'damaged.json');
    writeFileSync(damaged, '{"half":');
    await expect(startRig({ stateFile: damaged })).rejects.toThrow();
  });

  it('is emptied by a reset, which puts the prices up again', async () => {
    const rig = await startRig({ stateFile });
    const customer = await rig.stripe.customers.create({});
    await rig.control('POST', '/reset');
    await expect(rig.stripe.customers.retrieve(customer.id)).rejects.toMatchObject({ statusCode: 404 });
    expect((await rig.stripe.prices.retrieve(PRICE)).id).toBe(PRICE);
    await rig.close();
  });
});
