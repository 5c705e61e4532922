import { buildTimeEntryRow } from '@bookmatch/common/testing/build-time-entry';
import { buildMemberWeek } from '../testing/build-week';
import { daysWithEntries } from './days-with-entries';

const minutesOf = (day: ReturnType<typeof daysWithEntries>[number] | undefined) =>
  day?.entries.map(({ minutes }) => minutes);

describe('the days of a week', () => {
  // 11 pm on Tuesday to 1:30 am on Wednesday in New York.
  const night = buildTimeEntryRow({
    startedAt: '2027-01-13T04:00:00.000Z',
    endedAt: '2027-01-13T06:30:00.000Z',
  });

  it('hold an entry across midnight twice, each time with its part', () => {
    const days = daysWithEntries(buildMemberWeek([night]), '2027-01-17');
    expect(days.map(({ on, workMinutes }) => [on, workMinutes]).slice(1, 3)).toEqual([
      ['2027-01-12', 60],
      ['2027-01-13', 90],
    ]);
    expect([minutesOf(days[1]), minutesOf(days[2])]).toEqual([[60], [90]]);
  });

  it('hold an open entry on the day it began, without minutes', () => {
    const open = buildTimeEntryRow({ startedAt: '2027-01-12T14:00:00.000Z', endedAt: null });
    expect(minutesOf(daysWithEntries(buildMemberWeek([open]), '2027-01-12')[1])).toEqual([null]);
  });

  it('end with today: what is to come is not shown', () => {
    expect(daysWithEntries(buildMemberWeek([night]), '2027-01-12').map(({ on }) => on)).toEqual([
      '2027-01-11',
      '2027-01-12',
      '2027-01-13',
    ]);
    expect(daysWithEntries(buildMemberWeek(), '2027-01-20')).toHaveLength(7);
  });
});
