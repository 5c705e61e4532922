import { buildJobInHand } from '../testing/build-today';
import { jobHourLeaves } from './job-hours';

it('lays clocked hours beside planned ones, and leaves out jobs with neither', () => {
  const job = buildJobInHand();
  const fresh = buildJobInHand({ number: 1043, clockedMinutes: 0 });
  const bare = buildJobInHand({ plannedMinutes: 0, clockedMinutes: 0 });
  expect(jobHourLeaves([job, fresh, bare])).toEqual([
    { key: job.id, name: '1042 Mudroom lockers', planned: 1200, built: 630, note: undefined },
    { key: fresh.id, name: '1043 Mudroom lockers', planned: 1200, built: 0, note: 'not started' },
  ]);
});
