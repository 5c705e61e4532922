import type { Logger } from 'typeorm';
import type { TestApi } from './test-api.js';

/** Notes the statements that one API sends, by its own logger: what others send to the same server does not count. */
export class QueryNoter {
  private seen: string[] = [];

  constructor(api: TestApi) {
    const logger: Logger = {
      logQuery: (query) => void this.seen.push(query),
      logQueryError: () => undefined,
      logQuerySlow: () => undefined,
      logSchemaBuild: () => undefined,
      logMigration: () => undefined,
      log: () => undefined,
    };
    api.platform.dataSource.setOptions({ logging: ['query'], logger });
  }

  /** The statements that a piece of work sends. */
  async during(work: () => Promise<unknown>): Promise<string[]> {
    this.seen = [];
    await work();
    return this.seen;
  }
}
