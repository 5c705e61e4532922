import { createHash } from 'node:crypto';
import { Column, Entity, PrimaryColumn, type DataSource } from 'typeorm';
import { RateLimiterMySQL, RateLimiterRes } from 'rate-limiter-flexible';
import { whole } from '../database/columns.js';
import { ProblemError } from './problem-error.js';

/** The counters of the limits, shared by all processes. */
@Entity('rate_limit')
export class RateLimitCounter {
  @PrimaryColumn({ type: 'varchar', length: 255 }) key!: string;
  @Column(whole()) points!: number;
  @Column({ type: 'bigint', unsigned: true, nullable: true }) expire!: number | null;
}

type Limit = { points: number; seconds: number };
/**
 * Nobody is ever locked out for good. One person's mistakes do not lock out the whole office behind one address, nor does
 * a stranger who guesses elsewhere lock the owner of an account out: the limit on one account from one address is low,
 * those on an account from anywhere and on an address for all accounts are ten times that.
 */
const LIMITS = {
  'guessing-pair': { points: 10, seconds: 15 * 60 },
  'guessing-account': { points: 100, seconds: 15 * 60 },
  'guessing-address': { points: 100, seconds: 15 * 60 },
  'mailing-account': { points: 5, seconds: 60 * 60 },
  'mailing-address': { points: 30, seconds: 60 * 60 },
  'link-address': { points: 300, seconds: 5 * 60 },
} as const satisfies Record<string, Limit>;
export type LimitName = keyof typeof LIMITS;

export class RateLimits {
  private readonly limiters: Record<LimitName, RateLimiterMySQL>;

  constructor(dataSource: DataSource, database: string, scale = 1) {
    const storeClient = (dataSource.driver as unknown as { pool: unknown }).pool;
    const create = (name: LimitName) =>
      new RateLimiterMySQL({
        storeClient,
        dbName: database,
        tableName: 'rate_limit',
        tableCreated: true,
        keyPrefix: name,
        points: LIMITS[name].points * scale,
        duration: LIMITS[name].seconds,
      });
    this.limiters = Object.fromEntries(
      (Object.keys(LIMITS) as LimitName[]).map((name) => [name, create(name)]),
    ) as typeof this.limiters;
  }

  /** Counts one try. @throws too-many-requests with `Retry-After` */
  async count(name: LimitName, who: string): Promise<void> {
    try {
      await this.limiters[name].consume(keyOf(who));
    } catch (refused) {
      if (!(refused instanceof RateLimiterRes)) throw refused;
      const seconds = Math.max(1, Math.ceil(refused.msBeforeNext / 1000));
      throw new ProblemError(
        'too-many-requests',
        `Too many tries. Wait ${waitWords(seconds)} and try again.`,
        {
          headers: { 'Retry-After': String(seconds) },
        },
      );
    }
  }

  /** Forgets the tries after a success. */
  async forgive(name: LimitName, who: string): Promise<void> {
    await this.limiters[name].delete(keyOf(who));
  }
}

/** Addresses and e-mails are kept hashed: the counters need no personal data. */
const keyOf = (who: string) => createHash('sha256').update(who).digest('hex');
const waitWords = (seconds: number) =>
  seconds < 90 ? `${seconds} seconds` : `${Math.ceil(seconds / 60)} minutes`;
