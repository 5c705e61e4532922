import { priceSeedFrom } from './control/price-seed.js';
import { needed, Reader } from './control/read.js';
import type { PaymentsFakeOptions, PriceSeed } from './options.js';
import type { Endpoint } from './webhooks/endpoint.js';

type Environment = Record<string, string | undefined>;

/** Webhook addresses are separated by commas and share one secret. Errors: an address without a secret. */
function endpointsFrom(env: Environment): Endpoint[] {
  const secret = env['PAYMENTS_FAKE_WEBHOOK_SECRET'];
  const urls = (env['PAYMENTS_FAKE_WEBHOOK_URL'] ?? '').split(',').map((url) => url.trim());
  return urls
    .filter((url) => url !== '')
    .map((url) => ({ url, secret: needed(secret, 'PAYMENTS_FAKE_WEBHOOK_SECRET'), sends: 'all' }));
}

/** A JSON list of prices, as the control for one takes them. */
function pricesFrom(env: Environment): PriceSeed[] | undefined {
  const text = env['PAYMENTS_FAKE_PRICES'];
  return text
    ? new Reader({ prices: JSON.parse(text) as unknown }).list('prices')?.map(priceSeedFrom)
    : undefined;
}

/** The options that PAYMENTS_FAKE_* variables give; README.md lists them. */
export function optionsFromEnvironment(env: Environment): PaymentsFakeOptions {
  return {
    port: Number(env['PAYMENTS_FAKE_PORT'] ?? '4242'),
    host: env['PAYMENTS_FAKE_HOST'] ?? '127.0.0.1',
    key: env['PAYMENTS_FAKE_KEY'],
    publicUrl: env['PAYMENTS_FAKE_PUBLIC_URL'],
    stateFile: env['PAYMENTS_FAKE_STATE_FILE'],
    webhooks: endpointsFrom(env),
    prices: pricesFrom(env),
  };
}
