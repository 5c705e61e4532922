import { startRig, type Rig } from './testing/rig.js';

describe('idempotency keys', () => {
  let rig: Rig;

  beforeAll(async () => {
    rig = await startRig();
  });
  afterAll(() => rig.close());

  const key = (idempotencyKey: string): { idempotencyKey: string } => ({ idempotencyKey });

  it('replays the same answer to the same request, whatever the order of its parameters', async () => {
    const { stripe } = rig;
    const first = await stripe.customers.create({ name: 'A', email: 'a@example.com' }, key('same'));
    const second = await stripe.customers.create({ email: 'a@example.com', name: 'A' }, key('same'));
    expect(second.id).toBe(first.id);
    expect(first.lastResponse.headers['idempotent-replayed']).toBeUndefined();
    expect(second.lastResponse.headers['idempotent-replayed']).toBe('true');
    expect(second.lastResponse.headers['original-request']).toBe(first.lastResponse.requestId);
  });

  it('does the work anew for another key', async () => {
    const { stripe } = rig;
    const [one, two] = [
      await stripe.customers.create({}, key('k1')),
      await stripe.customers.create({}, key('k2')),
    ];
    expect(one.id).not.toBe(two.id);
  });

  it('refuses the key for other parameters', async () => {
    await rig.stripe.customers.create({ name: 'A' }, key('other'));
    const other = rig.stripe.customers.create({ name: 'B' }, key('other'));
    await expect(other).rejects.toMatchObject({ type: 'StripeIdempotencyError', statusCode: 400 });
  });

  it('keeps the keys of accounts apart', async () => {
    const account = await rig.stripe.accounts.create({ type: 'standard' });
    const platform = await rig.stripe.customers.create({}, key('shared'));
    const connected = await rig.stripe.customers.create({}, { ...key('shared'), stripeAccount: account.id });
    expect(connected.id).not.toBe(platform.id);
  });

  it('answers 409 while the first request with the key still runs', async () => {
    await rig.control('POST', '/faults', { kind: 'slow', delayMs: 300 });
    const first = rig.stripe.customers.create({ name: 'Slow' }, key('busy'));
    await new Promise((resolve) => setTimeout(resolve, 100));
    const second = rig.stripe.customers.create({ name: 'Slow' }, key('busy'));
    await expect(second).rejects.toMatchObject({ statusCode: 409, code: 'idempotency_key_in_use' });
    const { id } = await first;
    expect((await rig.stripe.customers.create({ name: 'Slow' }, key('busy'))).id).toBe(id);
  });

  it('keeps a refusal that came from the work, and frees the key of a refused parameter', async () => {
    const { stripe } = rig;
    const wrong = { customer: 'cus_nobody' };
    const refusal = await stripe.billingPortal.sessions
      .create(wrong, key('kept'))
      .catch((error: unknown) => error);
    expect(refusal).toMatchObject({ code: 'resource_missing' });
    await expect(stripe.billingPortal.sessions.create(wrong, key('kept'))).rejects.toMatchObject({
      headers: { 'idempotent-replayed': 'true' },
    });
    await expect(stripe.customers.create({ email: 'nobody' }, key('freed'))).rejects.toMatchObject({
      statusCode: 400,
    });
    expect((await stripe.customers.create({ email: 'a@example.com' }, key('freed'))).id).toMatch(/^cus_/);
  });

  it('forgets a key after a day', async () => {
    const first = await rig.stripe.customers.create({}, key('old'));
    await rig.control('POST', '/clock', { advanceSeconds: 24 * 60 * 60 + 1 });
    expect((await rig.stripe.customers.create({}, key('old'))).id).not.toBe(first.id);
  });
});
