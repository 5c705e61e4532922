import { createHmac } from 'node:crypto';

const TIMEOUT_MS = 10_000;

/** The signature header that the SDK's `webhooks.constructEvent` checks. `stamp` is in Unix seconds. */
export function signatureHeader(payload: string, secret: string, stamp: number): string {
  const signature = createHmac('sha256', secret).update(`${stamp}.${payload}`, 'utf8').digest('hex');
  return `t=${stamp},v1=${signature}`;
}

/**
 * Posts one signed payload. Gives the HTTP status, or 0 when no answer came in time or `stop` cut it off.
 * A redirect counts as its own status and is not followed.
 */
export async function send(
  url: string,
  payload: string,
  signature: string,
  stop?: AbortSignal,
): Promise<number> {
  try {
    const answer = await fetch(url, {
      method: 'POST',
      redirect: 'manual',
      signal: AbortSignal.any([AbortSignal.timeout(TIMEOUT_MS), ...(stop === undefined ? [] : [stop])]),
      headers: {
        'content-type': 'application/json; charset=utf-8',
        'user-agent': 'Stripe/1.0 (+https://stripe.com/docs/webhooks)',
        'stripe-signature': signature,
      },
      body: payload,
    });
    await answer.arrayBuffer();
    return answer.status;
  } catch {
    return 0;
  }
}
