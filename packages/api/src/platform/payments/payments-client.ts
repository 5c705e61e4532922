import Stripe from 'stripe';
import type { Config } from '../config/config.js';

export type Payments = Stripe;

/** The provider's official client. With an address configured it talks to the local fake, and is otherwise the same. */
export function createPayments({ key, api }: Config['payments']): Payments {
  const options = { maxNetworkRetries: 2, timeout: 15_000, telemetry: false };
  if (api === '') return new Stripe(key, options);
  const url = new URL(api);
  return new Stripe(key, {
    ...options,
    protocol: url.protocol === 'https:' ? 'https' : 'http',
    host: url.hostname,
    port: Number(url.port),
  });
}
