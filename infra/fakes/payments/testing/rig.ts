import Stripe from 'stripe';
import type { PaymentsFakeOptions } from '../options.js';
import { startPaymentsFake, type PaymentsFake } from '../start.js';
import { Receiver } from './receiver.js';

export const KEY = 'sk_test_for_the_suite';
export const SECRET = 'whsec_for_the_suite';
export const PRICE = 'price_bookmatch_member_month';

/** The provider on a free port, the SDK pointed at it, and a receiver of its webhooks. */
export interface Rig {
  fake: PaymentsFake;
  stripe: Stripe;
  receiver: Receiver;
  control(method: 'GET' | 'POST' | 'PUT' | 'DELETE', path: string, body?: object): Promise<unknown>;
  /** Posts a form of a hosted page, without following where it leads. */
  submit(url: string | null, form: Record<string, string>): Promise<Response>;
  close(): Promise<void>;
}

export function clientFor(fake: PaymentsFake, config: Stripe.StripeConfig = {}): Stripe {
  const where = { host: '127.0.0.1', port: fake.port, protocol: 'http' } as const;
  return new Stripe(KEY, { ...where, maxNetworkRetries: 0, telemetry: false, ...config });
}

export async function startRig(options: PaymentsFakeOptions = {}): Promise<Rig> {
  const receiver = await Receiver.start();
  const webhooks = [{ url: receiver.url, secret: SECRET, sends: 'all' as const }];
  const starting = startPaymentsFake({ key: KEY, webhooks, retryBaseMs: 20, ...options });
  const fake = await starting.catch(async (error: unknown) => {
    await receiver.close();
    throw error;
  });
  return {
    fake,
    receiver,
    stripe: clientFor(fake),
    control: (method, path, body) => controlCall(fake, method, path, body),
    submit: (url, form) => submitForm(url, form),
    close: async () => {
      await fake.close();
      await receiver.close();
    },
  };
}

async function controlCall(
  fake: PaymentsFake,
  method: string,
  path: string,
  body?: object,
): Promise<unknown> {
  const headers = { 'content-type': 'application/json' };
  const sent = body === undefined ? {} : { body: JSON.stringify(body) };
  const answer = await fetch(`${fake.url}/_control${path}`, { method, headers, ...sent });
  if (!answer.ok) throw new Error(`${method} ${path}: ${answer.status} ${await answer.text()}`);
  return answer.json();
}

function submitForm(url: string | null, form: Record<string, string>): Promise<Response> {
  if (url === null) throw new Error('The page has no address');
  return fetch(url, { method: 'POST', redirect: 'manual', body: new URLSearchParams(form) });
}
