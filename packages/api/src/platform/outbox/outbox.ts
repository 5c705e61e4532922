import type { DataSource } from 'typeorm';
import { retryLostRaces } from '../database/retry.js';
import { ShopScope, type GlobalScope } from '../database/scope.js';
import { insertRows, updateRow } from '../database/statements.js';
import type { Logger } from '../log/logger.js';
import { OutboxMessage } from './outbox-message.entity.js';

export type OutboxHandler = (payload: never, message: { id: string; shopId: string | null }) => Promise<void>;

/**
 * Leaves a message to be carried out after the commit, or not before `dueAt`. The handler may run more than once for it.
 */
export async function enqueue(
  scope: GlobalScope,
  kind: string,
  payload: unknown,
  dueAt = scope.now,
): Promise<void> {
  const message: Omit<OutboxMessage, never> = {
    id: scope.newId(),
    createdAt: scope.now,
    shopId: scope instanceof ShopScope ? scope.shopId : null,
    kind,
    payload,
    attempts: 0,
    dueAt,
    finishedAt: null,
    givenUpAt: null,
    lastError: null,
  };
  await insertRows(scope.manager, OutboxMessage, [message]);
}

const HOLD_MS = 60_000;
const BATCH = 10;
const MOST_ATTEMPTS = 14;
const POLL_MS = 2_000;

/**
 * Carries out what the outbox holds. Several processes may run one each: a message is claimed with SKIP LOCKED and held
 * for a minute, so a process that dies leaves its messages to the next. The minute is counted anew when a message's turn
 * comes: those before it may have taken long.
 */
export class OutboxWorker {
  private timer: NodeJS.Timeout | undefined;
  private running: Promise<void> | undefined;
  private again = false;
  private stopped = true;

  constructor(
    private readonly dataSource: DataSource,
    private readonly handlers: Record<string, OutboxHandler>,
    private readonly clock: () => Date,
    private readonly log: Logger,
  ) {}

  start(): void {
    this.stopped = false;
    this.timer = setInterval(() => this.wake(), POLL_MS);
    this.timer.unref();
    this.wake();
  }

  async stop(): Promise<void> {
    this.stopped = true;
    clearInterval(this.timer);
    await this.running;
  }

  wake(): void {
    if (this.stopped) return;
    if (this.running) {
      this.again = true;
      return;
    }
    this.running = this.drain()
      .catch((error: unknown) => this.log.error({ err: error }, 'the outbox could not be read'))
      .then(() => {
        this.running = undefined;
        if (this.again) {
          this.again = false;
          this.wake();
        }
      });
  }

  /** Carries out everything that is due now. Tests and the demo call it directly. */
  async drain(): Promise<void> {
    for (;;) {
      const messages = await this.claim();
      if (messages.length === 0) return;
      for (const message of messages) if (await this.stillOurs(message)) await this.carryOut(message);
    }
  }

  private claim(): Promise<OutboxMessage[]> {
    const now = this.clock();
    return retryLostRaces(() =>
      this.dataSource.transaction('READ COMMITTED', async (manager) => {
        const messages = await manager
          .createQueryBuilder(OutboxMessage, 'message')
          .where('message.finishedAt is null and message.dueAt <= :now', { now })
          .orderBy('message.dueAt')
          .limit(BATCH)
          .setLock('pessimistic_write')
          .setOnLocked('skip_locked')
          .getMany();
        for (const message of messages) {
          const held = { attempts: message.attempts + 1, dueAt: new Date(now.getTime() + HOLD_MS) };
          await updateRow(manager, OutboxMessage, { id: message.id }, held);
        }
        return messages;
      }),
    );
  }

  /** Each claim counts one more attempt, so another number means that somebody else took the message over. */
  private async stillOurs({ id, attempts }: OutboxMessage): Promise<boolean> {
    const dueAt = new Date(this.clock().getTime() + HOLD_MS);
    const claimed = { id, attempts: attempts + 1 };
    return (await updateRow(this.dataSource.manager, OutboxMessage, claimed, { dueAt })) === 1;
  }

  private async carryOut(message: OutboxMessage): Promise<void> {
    const { manager } = this.dataSource;
    try {
      const handler = this.handlers[message.kind];
      if (!handler) throw new TypeError(`Nothing carries out outbox messages of kind ${message.kind}.`);
      await handler(message.payload as never, message);
      // A letter may hold the secret of a link, which is kept nowhere else but hashed: what was sent is not kept.
      const done = { finishedAt: this.clock(), lastError: null, payload: {} };
      await updateRow(manager, OutboxMessage, { id: message.id }, done);
    } catch (error) {
      this.log.warn(
        { err: error, outboxMessage: message.id, kind: message.kind },
        'an outbox message failed',
      );
      await updateRow(manager, OutboxMessage, { id: message.id }, this.afterFailure(message, error));
    }
  }

  /** Tries again after 5 s, 10 s, 20 s, … at most an hour apart, and gives up after about half a day. */
  private afterFailure(message: OutboxMessage, error: unknown): Record<string, unknown> {
    const now = this.clock();
    const lastError = String(error instanceof Error ? error.message : error).slice(0, 500);
    if (message.attempts + 1 >= MOST_ATTEMPTS) return { lastError, finishedAt: now, givenUpAt: now };
    const pause = Math.min(3_600_000, 5_000 * 2 ** message.attempts);
    return { lastError, dueAt: new Date(now.getTime() + pause) };
  }
}
