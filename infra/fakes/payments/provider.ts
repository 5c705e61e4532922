import { NO_CAUSE, type Cause, type Desk } from './desk.js';
import { sweep } from './acts/sweep.js';
import { buildEvent } from './objects/event.js';
import { emptyBook, type Book } from './state/book.js';
import { emptyState, type State } from './state/state.js';
import { Snapshot } from './state/snapshot.js';
import { seedPlatform, seedPrices } from './seed.js';
import { DEFAULT_PRICES, type PriceSeed } from './options.js';
import { Faults } from './wire/faults.js';
import { NORMAL } from './webhooks/mode.js';
import { Outbox } from './webhooks/outbox.js';

const SWEEP_MS = 1000;
const MOST_EVENTS = 5000;

export interface ProviderConfig {
  key: string;
  /** Known once the server listens. */
  publicUrl: string;
  stateFile: string | undefined;
  prices: readonly PriceSeed[] | undefined;
  retryBaseMs: number;
}

/** The whole payment provider: its state, its clock, its outgoing events and the faults a test has set. */
export class Provider {
  readonly faults = new Faults();
  readonly outbox: Outbox;
  private readonly snapshot: Snapshot;
  private readonly timer: NodeJS.Timeout;

  constructor(
    readonly config: ProviderConfig,
    readonly state: State,
  ) {
    this.snapshot = new Snapshot(config.stateFile, state);
    this.outbox = new Outbox(state, config.retryBaseMs, () => this.changed());
    this.seed();
    this.timer = setInterval(() => this.sweep(), SWEEP_MS);
    this.timer.unref();
  }

  /** Unix seconds by the provider's own clock. */
  now(): number {
    return Math.floor(Date.now() / 1000) + this.state.clockAheadSeconds;
  }

  /** The books of one account; `account` is null for the platform. */
  desk(account: string | null, cause: Cause = NO_CAUSE): Desk {
    return {
      state: this.state,
      book: this.bookOf(account),
      account,
      now: () => this.now(),
      url: (path) => this.config.publicUrl + path,
      publish: (type, object, previous) => {
        const pendingWebhooks = this.outbox.receiversOf(account).length;
        const now = this.now();
        const event = buildEvent({ type, object, previous, account, cause, pendingWebhooks, now });
        this.keepEvent(event);
        this.outbox.add(event);
        this.changed();
      },
    };
  }

  /** Every account that has books, the platform (null) first. */
  accounts(): (string | null)[] {
    return Object.keys(this.state.books).map((name) => (name === 'platform' ? null : name));
  }

  sweep(): void {
    for (const account of this.accounts()) sweep(this.desk(account));
  }

  changed(): void {
    this.snapshot.changed();
  }

  /** Forgets everything but the receivers of webhooks and the prices it began with. */
  reset(): void {
    Object.assign(this.state, emptyState(this.state.platformId, this.state.endpoints));
    this.faults.clear();
    this.outbox.setMode(NORMAL);
    this.seed();
    this.changed();
  }

  async close(): Promise<void> {
    clearInterval(this.timer);
    await this.outbox.stop();
    this.snapshot.close();
  }

  private seed(): void {
    seedPlatform(this.state, this.now());
    seedPrices(this.bookOf(null), this.config.prices ?? DEFAULT_PRICES, this.now());
    this.changed();
  }

  private bookOf(account: string | null): Book {
    const name = account ?? 'platform';
    const held = Object.hasOwn(this.state.books, name) ? this.state.books[name] : undefined;
    if (held !== undefined) return held;
    const fresh = emptyBook();
    this.state.books[name] = fresh;
    return fresh;
  }

  private keepEvent(event: ReturnType<typeof buildEvent>): void {
    const { state } = this;
    state.events.push(event);
    if (state.events.length <= MOST_EVENTS) return;
    state.events.splice(0, state.events.length - MOST_EVENTS);
    const kept = new Set(state.events.map((one) => one.id));
    state.deliveries = state.deliveries.filter((one) => kept.has(one.eventId));
  }
}
