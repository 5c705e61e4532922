import type { Job, JobRow } from '@bookmatch/common/jobs/jobs-contract';
import { ClockSteps } from '../../../test/harness/clock-steps.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';
import { systemStamp } from '../../platform/database/stamp.js';
import { onTheClock, workMinutesThisWeek } from './time-public.js';

describe('what other slices learn of the clock', () => {
  let api: TestApi;
  let shop: TestShop;
  let steps: ClockSteps;
  let crew: Awaited<ReturnType<TestShop['join']>>;
  beforeAll(async () => {
    api = await TestApi.open({ now: '2026-06-03T17:00:00.000Z' });
    shop = await api.signUp();
    steps = await ClockSteps.of(shop);
    crew = await shop.join('crew');
    await shop.owner.patch(`/members/${crew.memberId}/labor-cost`, { laborCostCentsPerHour: 4_000 }, 1);
  });
  afterAll(() => api.close());

  it('a job shows minutes and cost by operation, and how much of it fell in this week', async () => {
    const jobId = await steps.job();
    await steps.worked(crew.client, jobId, '2026-05-29T13:00:00.000Z', '2026-05-29T15:00:00.000Z');
    // Sunday 11 pm to Monday 1 am in Chicago: an hour of it is this week's.
    await steps.worked(crew.client, jobId, '2026-06-01T04:00:00.000Z', '2026-06-01T06:00:00.000Z');
    await steps.worked(crew.client, jobId, '2026-06-02T13:00:00.000Z', '2026-06-02T13:45:00.000Z', {
      operationId: steps.operation('Install'),
    });
    const voided = await steps.worked(
      crew.client,
      jobId,
      '2026-06-02T14:00:00.000Z',
      '2026-06-02T15:00:00.000Z',
    );
    await shop.owner.post(
      `/time/entries/${voided.id}/void`,
      { reason: 'Twice' },
      { version: voided.version },
    );

    const job = (await shop.owner.get(`/jobs/${jobId}`)).body as Job;
    expect(job.clockedMinutes).toBe(285);
    expect(job.operations.map((row) => [row.name, row.clockedMinutes, row.thisWeekMinutes])).toEqual([
      ['Face frames', 240, 60],
      ['Install', 45, 45],
    ]);
    expect(job.operations.map((row) => row.actualCostCents)).toEqual([16_000, 3_000]);
    expect(job.money?.actualCostCents).toBe(19_000);
    const { rows } = (await shop.owner.get('/jobs')).body as { rows: JobRow[] };
    expect(rows.find((row) => row.id === jobId)).toMatchObject({
      clockedMinutes: 285,
      actualCostCents: 19_000,
    });
  });

  it('the first pages show who is clocked in, the longest first, and the week’s minutes', async () => {
    const jobId = await steps.job({}, { title: 'Library wall' });
    await steps.clockIn(crew.client, steps.punch(jobId, '2026-06-03T15:00:00.000Z'));
    await steps.clockIn(shop.owner, steps.mealBreak('2026-06-03T16:00:00.000Z'));
    const [clockedIn, minutes] = await api.platform.work.read(
      systemStamp('test', api.clock.read()),
      async (scope) => {
        const here = scope.forShop(shop.id);
        return [await onTheClock(here), await workMinutesThisWeek(here)];
      },
    );
    expect(clockedIn).toMatchObject([
      {
        memberId: crew.memberId,
        jobId,
        jobTitle: 'Library wall',
        operationName: 'Face frames',
        kind: 'work',
      },
      { memberName: 'Owner 1', kind: 'meal-break', jobId: null, startedAt: '2026-06-03T16:00:00.000Z' },
    ]);
    expect(minutes).toBe(105);
  });
});
