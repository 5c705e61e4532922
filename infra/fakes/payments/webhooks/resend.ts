import type Stripe from 'stripe';
import type { Endpoint } from './endpoint.js';
import { send, signatureHeader } from './send.js';

export interface ResendOptions {
  copies: number;
  /** All at once instead of one after another. */
  parallel: boolean;
  /** Age of the signature's stamp; negative for one from the future. */
  signedSecondsAgo: number;
  /** Signs with another secret than the receiver's. */
  secret: string | undefined;
  /** Changes the payload after it was signed. */
  tampered: boolean;
}

/** Sends an event again, outside the queue, and gives the HTTP status of each copy (0 for no answer). */
export async function resend(
  event: Stripe.EventBase,
  endpoints: Endpoint[],
  options: ResendOptions,
): Promise<number[]> {
  const copies = endpoints.flatMap((endpoint) => Array.from({ length: options.copies }, () => endpoint));
  if (options.parallel) return Promise.all(copies.map((endpoint) => sendCopy(event, endpoint, options)));
  const statuses: number[] = [];
  for (const endpoint of copies) statuses.push(await sendCopy(event, endpoint, options));
  return statuses;
}

function sendCopy(event: Stripe.EventBase, endpoint: Endpoint, options: ResendOptions): Promise<number> {
  const payload = JSON.stringify(event, null, 2);
  const stamp = Math.floor(Date.now() / 1000) - options.signedSecondsAgo;
  const signature = signatureHeader(payload, options.secret ?? endpoint.secret, stamp);
  const sent = options.tampered ? payload.replace(event.id, `${event.id}x`) : payload;
  return send(endpoint.url, sent, signature);
}
