import type Stripe from 'stripe';
import type { State } from '../state/state.js';
import { noteAttempt, type Delivery } from './delivery.js';
import { receives, type Endpoint } from './endpoint.js';
import { copiesUnder, modeFor, NORMAL, statusUnder, waitUnder, type DeliveryMode } from './mode.js';
import { send, signatureHeader } from './send.js';

/** So that the answer to the request leaves before the news of it. */
const HEAD_START_MS = 10;

/** Sends events to their receivers, one after another in order, and tries again what failed. */
export class Outbox {
  private mode: DeliveryMode = NORMAL;
  private timer: NodeJS.Timeout | null = null;
  private sending: Promise<void> | null = null;
  private readonly stopping = new AbortController();

  constructor(
    private readonly state: State,
    private readonly retryBaseMs: number,
    private readonly changed: () => void,
  ) {}

  setMode(mode: DeliveryMode): void {
    this.mode = mode;
  }

  /** How many receivers an event of this account has. */
  receiversOf(account: string | null): Endpoint[] {
    return this.state.endpoints.filter((endpoint) => receives(endpoint, account));
  }

  add(event: Stripe.EventBase): void {
    const mode = modeFor(this.mode, event.type);
    if (mode.name === 'reverse') this.postponeBatch(mode.delayMs);
    for (const endpoint of this.receiversOf(event.account ?? null)) {
      for (let copy = 0; copy < copiesUnder(mode); copy += 1) this.queue(event, endpoint, mode);
    }
    this.wake();
  }

  /** Sends everything held or waiting now, in the order asked for, and gives what became of it. */
  async flush(order: 'given' | 'reverse'): Promise<Delivery[]> {
    await this.sending;
    const open = this.open().sort((a, b) => a.sequence - b.sequence);
    if (order === 'reverse') open.reverse();
    this.hold(this.sendAll(open));
    await this.sending;
    return open.map((delivery) => ({ ...delivery }));
  }

  /** Begins, or begins again after a restart, to send what is due. */
  wake(): void {
    if (this.stopping.signal.aborted || this.sending !== null) return;
    if (this.timer !== null) clearTimeout(this.timer);
    this.timer = null;
    const next = this.nextPending();
    if (next === undefined) return;
    const wait = Math.max(HEAD_START_MS, next.dueAtMs - Date.now());
    this.timer = setTimeout(() => this.hold(this.sendDue()), wait);
  }

  async stop(): Promise<void> {
    this.stopping.abort();
    if (this.timer !== null) clearTimeout(this.timer);
    await this.sending;
  }

  /** One round at a time, so that nothing goes out twice by accident. */
  private hold(round: Promise<void>): void {
    if (this.timer !== null) clearTimeout(this.timer);
    this.timer = null;
    this.sending = round.finally(() => {
      this.sending = null;
      this.wake();
    });
  }

  private async sendAll(deliveries: Delivery[]): Promise<void> {
    for (const delivery of deliveries) {
      if (!this.stopping.signal.aborted) await this.attempt(delivery);
    }
  }

  private async sendDue(): Promise<void> {
    for (
      let next = this.nextDue();
      next !== undefined && !this.stopping.signal.aborted;
      next = this.nextDue()
    ) {
      await this.attempt(next);
    }
  }

  private async attempt(delivery: Delivery): Promise<void> {
    const event = this.state.events.find((one) => one.id === delivery.eventId);
    const endpoint = this.state.endpoints.find((one) => one.url === delivery.url);
    if (event === undefined || endpoint === undefined) delivery.status = 'dropped';
    else {
      const status = await this.post(event, endpoint);
      noteAttempt(delivery, status, this.retryBaseMs, Date.now());
      if (delivery.status === 'delivered') event.pending_webhooks = Math.max(0, event.pending_webhooks - 1);
    }
    this.changed();
  }

  private post(event: Stripe.EventBase, endpoint: Endpoint): Promise<number> {
    const payload = JSON.stringify(event, null, 2);
    const stamp = Math.floor(Date.now() / 1000);
    const signature = signatureHeader(payload, endpoint.secret, stamp);
    return send(endpoint.url, payload, signature, this.stopping.signal);
  }

  private queue(event: Stripe.EventBase, endpoint: Endpoint, mode: DeliveryMode): void {
    const { deliveries } = this.state;
    deliveries.push({
      sequence: (deliveries.at(-1)?.sequence ?? 0) + 1,
      eventId: event.id,
      eventType: event.type,
      url: endpoint.url,
      status: statusUnder(mode),
      dueAtMs: Date.now() + waitUnder(mode),
      attempts: 0,
      lastStatus: null,
    });
  }

  /** Each new event of a reversed batch keeps the earlier ones waiting until it is quiet. */
  private postponeBatch(quietMs: number): void {
    for (const delivery of this.open()) {
      if (delivery.status === 'pending' && delivery.attempts === 0) delivery.dueAtMs = Date.now() + quietMs;
    }
  }

  private open(): Delivery[] {
    return this.state.deliveries.filter((one) => one.status === 'pending' || one.status === 'held');
  }

  private nextPending(): Delivery | undefined {
    const pending = this.state.deliveries.filter((one) => one.status === 'pending');
    return pending.reduce<Delivery | undefined>(
      (first, one) => (first === undefined || one.dueAtMs < first.dueAtMs ? one : first),
      undefined,
    );
  }

  private nextDue(): Delivery | undefined {
    const due = this.state.deliveries.filter((one) => one.status === 'pending' && one.dueAtMs <= Date.now());
    return this.mode.name === 'reverse' ? due.at(-1) : due[0];
  }
}
