import { Injectable } from '@angular/core';

/**
 * Gives every posted action its idempotency key and keeps it until the outcome is known, so that a second press, a
 * retry after a lost network or a sign-in in between can never do the same thing twice.
 *
 * The same address with the same body is the same action for as long as it is unanswered.
 */
@Injectable({ providedIn: 'root' })
export class ActionKeys {
  private readonly unanswered = new Map<string, string>();

  keyFor(url: string, body: unknown): string {
    if (body instanceof FormData) return crypto.randomUUID();
    const action = describe(url, body);
    const key = this.unanswered.get(action) ?? crypto.randomUUID();
    this.unanswered.set(action, key);
    return key;
  }

  settle(url: string, body: unknown): void {
    this.unanswered.delete(describe(url, body));
  }
}

const describe = (url: string, body: unknown): string => `${url} ${JSON.stringify(body ?? null)}`;
