import { TestApi } from '../../../test/harness/test-api.js';
import { systemStamp } from '../database/stamp.js';
import { enqueue, OutboxWorker } from './outbox.js';

describe('the outbox', () => {
  let api: TestApi;
  beforeAll(async () => {
    api = await TestApi.open();
    await api.product.outbox.stop();
  });
  afterAll(() => api.close());

  it('is carried out once by two processes, also when what comes first takes longer than messages are held', async () => {
    const { dataSource, work, log } = api.platform;
    let now = api.clock.read().getTime();
    const clock = () => new Date(now);
    await work.transaction(systemStamp('three', clock()), async (scope) => {
      for (const name of ['slow', 'second', 'third']) await enqueue(scope, 'note', { name });
    });
    const carriedOut: string[] = [];
    const note = async ({ name }: { name: string }) => {
      carriedOut.push(name);
      if (carriedOut.length > 1) return;
      now += 61_000;
      await other.drain();
    };
    const first = new OutboxWorker(dataSource, { note }, clock, log);
    const other = new OutboxWorker(dataSource, { note }, clock, log);
    await first.drain();
    expect(carriedOut.filter((name) => name !== 'slow').sort()).toEqual(['second', 'third']);
  });
});
