import type { DataSource } from 'typeorm';
import { retryLostRaces } from './retry.js';
import { GlobalScope } from './scope.js';
import type { Stamp } from './stamp.js';

/** Opens the database for a request: a plain read, or a transaction that is run again whole when it lost a race. */
export class UnitOfWork {
  private readonly afterCommit: (() => void)[] = [];

  constructor(private readonly dataSource: DataSource) {}

  /** Calls back after each commit: the outbox looks for new work. */
  onCommit(callback: () => void): void {
    this.afterCommit.push(callback);
  }

  /** Statements outside a transaction, each seeing what is committed when it runs. */
  read<Result>(stamp: Stamp, work: (scope: GlobalScope) => Promise<Result>): Promise<Result> {
    return work(new GlobalScope(this.dataSource.manager, stamp));
  }

  /**
   * One transaction. `work` may run several times, so it must have no effect outside the scope it is given: mail and
   * calls to others go through the outbox.
   *
   * READ COMMITTED, so that who waits for a locked row then sees what the one before left there. A snapshot taken before
   * the wait would be refused instead, and of fifty that want one number only one would get on at each try.
   */
  async transaction<Result>(stamp: Stamp, work: (scope: GlobalScope) => Promise<Result>): Promise<Result> {
    const result = await retryLostRaces(() =>
      this.dataSource.transaction('READ COMMITTED', (manager) => work(new GlobalScope(manager, stamp))),
    );
    for (const callback of this.afterCommit) callback();
    return result;
  }
}
