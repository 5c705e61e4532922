import { clientFor, startRig, type Rig } from './testing/rig.js';

describe('lost answers', () => {
  let rig: Rig;

  beforeAll(async () => {
    rig = await startRig();
  });
  afterAll(() => rig.close());

  it.each(['error-before', 'error-after'])(
    '%s answers 500 once, and the key finds the truth',
    async (kind) => {
      await rig.control('POST', '/faults', { kind });
      const options = { idempotencyKey: `lost-${kind}` };
      const lost = rig.stripe.customers.create({ name: 'A' }, options);
      await expect(lost).rejects.toMatchObject({ type: 'StripeAPIError', statusCode: 500 });
      const found = await rig.stripe.customers.create({ name: 'A' }, options);
      const replayed = kind === 'error-after' ? 'true' : undefined;
      expect(found.lastResponse.headers['idempotent-replayed']).toBe(replayed);
    },
  );

  it('cuts the connection after the work; the SDK asks again with its own key and makes one only', async () => {
    await rig.control('POST', '/faults', { kind: 'reset-after' });
    const found = await clientFor(rig.fake, { maxNetworkRetries: 1 }).customers.create({ name: 'B' });
    expect(found.lastResponse.headers['idempotent-replayed']).toBe('true');
  });

  it('cuts the connection before the work as often as it is told', async () => {
    await rig.control('POST', '/faults', { kind: 'reset-before', calls: 2 });
    const lost = rig.stripe.customers.create({ name: 'C' }, { idempotencyKey: 'cut' });
    await expect(lost).rejects.toMatchObject({ type: 'StripeConnectionError' });
    const found = await rig.stripe.customers.create({ name: 'C' }, { idempotencyKey: 'cut' });
    expect(found.lastResponse.headers['idempotent-replayed']).toBeUndefined();
  });

  it.each(['hang-before', 'hang-after'])('%s gives no answer at all', async (kind) => {
    await rig.control('POST', '/faults', { kind });
    const impatient = clientFor(rig.fake, { timeout: 150 });
    const options = { idempotencyKey: `hung-${kind}` };
    await expect(impatient.customers.create({ name: 'D' }, options)).rejects.toMatchObject({
      type: 'StripeConnectionError',
    });
    const found = await rig.stripe.customers.create({ name: 'D' }, options);
    const replayed = kind === 'hang-after' ? 'true' : undefined;
    expect(found.lastResponse.headers['idempotent-replayed']).toBe(replayed);
  });

  it('strikes only the calls it is set for, until cleared', async () => {
    await rig.control('POST', '/faults', { kind: 'error-before', method: 'POST', path: '/v1/refunds' });
    expect((await rig.stripe.customers.create({})).id).toMatch(/^cus_/);
    await rig.control('DELETE', '/faults');
    await expect(rig.stripe.refunds.create({ charge: 'ch_x' })).rejects.toMatchObject({ statusCode: 404 });
  });

  it('refuses controls it does not know, and browsers', async () => {
    await expect(rig.control('POST', '/faults', { kind: 'flood' })).rejects.toThrow('400');
    await expect(rig.control('POST', '/faults', { kind: 'slow', surplus: 1 })).rejects.toThrow('400');
    await expect(rig.control('POST', '/none', {})).rejects.toThrow('400');
    const headers = { origin: 'http://elsewhere.test', 'content-type': 'application/json' };
    const answer = await fetch(`${rig.fake.url}/_control/reset`, { method: 'POST', headers, body: '{}' });
    expect(answer.status).toBe(400);
  });
});
