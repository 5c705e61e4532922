import type { TestApi } from './test-api.js';

/** The payment provider as tests handle it: its hosted pages, its controls, and waiting for its events. */
export class Provider {
  constructor(private readonly api: TestApi) {}

  /** Reads a hosted page as a browser would, then posts its form. Answers where the browser is sent. */
  async submit(url: string, form: Record<string, string>): Promise<string | null> {
    const page = await fetch(url);
    if (page.status !== 200) throw new Error(`The page at ${url} answered ${page.status}.`);
    const answer = await fetch(url, { method: 'POST', redirect: 'manual', body: new URLSearchParams(form) });
    return answer.headers.get('location');
  }

  /** Delivers every event that waits, carries out what they left in the outbox, and again what that set off. */
  async settle(order: 'given' | 'reverse' = 'given'): Promise<void> {
    for (let round = 0; round < 4; round += 1) {
      await this.control('POST', '/flush', { order });
      await this.api.product.outbox.drain();
    }
  }

  async control(method: 'GET' | 'POST' | 'PUT' | 'DELETE', path: string, body?: object): Promise<unknown> {
    const answer = await fetch(`${this.api.payments.url}/_control${path}`, {
      method,
      headers: { 'content-type': 'application/json' },
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    });
    if (!answer.ok) throw new Error(`${method} ${path}: ${answer.status} ${await answer.text()}`);
    return answer.json();
  }

  /** Moves both clocks, ours and the provider's. */
  async forward(days: number): Promise<void> {
    this.api.clock.forward({ days });
    await this.control('POST', '/clock', { advanceSeconds: Math.round(days * 86_400) });
  }
}
