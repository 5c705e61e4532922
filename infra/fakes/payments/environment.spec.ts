import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { join } from 'node:path';
import { optionsFromEnvironment } from './environment.js';

describe('the options from the environment', () => {
  it('listens on this machine alone, without webhooks, unless told otherwise', () => {
    expect(optionsFromEnvironment({})).toMatchObject({ port: 4242, host: '127.0.0.1', webhooks: [] });
  });

  it('reads addresses, their secret and prices', () => {
    const options = optionsFromEnvironment({
      PAYMENTS_FAKE_WEBHOOK_URL: 'http://127.0.0.1:1/a, http://127.0.0.1:1/b',
      PAYMENTS_FAKE_WEBHOOK_SECRET: 'whsec_x',
      PAYMENTS_FAKE_PRICES: '[{"id":"price_x","unitAmountCents":500}]',
    });
    expect(options.webhooks?.map((one) => [one.url, one.secret])).toEqual([
      ['http://127.0.0.1:1/a', 'whsec_x'],
      ['http://127.0.0.1:1/b', 'whsec_x'],
    ]);
    expect(options.prices).toMatchObject([{ id: 'price_x', unitAmountCents: 500, interval: 'month' }]);
  });

  it('names what is missing', () => {
    const lonely = { PAYMENTS_FAKE_WEBHOOK_URL: 'http://127.0.0.1:1/a' };
    expect(() => optionsFromEnvironment(lonely)).toThrow('PAYMENTS_FAKE_WEBHOOK_SECRET');
    expect(() => optionsFromEnvironment({ PAYMENTS_FAKE_PRICES: '[{"id":"price_x"}]' })).toThrow(
      'unitAmountCents',
    );
  });
});

describe('the process', () => {
  it.each(['SIGTERM', 'SIGINT'] as const)('answers, and ends well on %s', async (signal) => {
    const env = { ...process.env, PAYMENTS_FAKE_PORT: '0' };
    const child = spawn(process.execPath, ['--import', 'tsx', join(__dirname, 'main.ts')], { env });
    const [line] = (await once(child.stdout, 'data')) as [Buffer];
    const url = /http:\S+/.exec(line.toString())?.[0] ?? '';
    expect((await fetch(`${url}/healthz`)).status).toBe(200);
    child.kill(signal);
    expect(await once(child, 'exit')).toEqual([0, null]);
  });
});
