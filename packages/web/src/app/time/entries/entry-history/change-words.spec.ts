import type { TimeEntryFacts } from '@bookmatch/common/time/time-contract';
import { changeWords } from './change-words';

const zone = 'America/New_York';
const before: TimeEntryFacts = {
  ...{ jobId: 'a', operationId: 'b', kind: 'work', note: '' },
  ...{ startedAt: '2027-01-12T14:31:00.000Z', endedAt: '2027-01-12T22:00:00.000Z' },
};

describe('what a correction did', () => {
  it.each<[string, Partial<TimeEntryFacts>, string]>([
    [
      'an end',
      { endedAt: '2027-01-12T20:15:00.000Z' },
      'End: Tue, Jan 12, 2027, 5:00 pm → Tue, Jan 12, 2027, 3:15 pm',
    ],
    ['a kind', { kind: 'meal-break' }, 'Kind: work → meal break'],
    ['a note', { note: 'Truck' }, 'Note: empty → Truck'],
    ['a job', { jobId: 'c' }, 'It was put on another job.'],
    ['an operation', { operationId: null }, 'It was put on another operation.'],
  ])('is told of %s', (_, changed, words) => {
    expect(changeWords({ before, after: { ...before, ...changed } }, zone)).toEqual([words]);
  });

  it('is told of an entry that was open, added or voided', () => {
    const open = { ...before, endedAt: null };
    expect(changeWords({ before: open, after: before }, zone)).toEqual([
      'End: open → Tue, Jan 12, 2027, 5:00 pm',
    ]);
    expect(changeWords({ before: null, after: before }, zone)).toEqual(['The entry was added.']);
    expect(changeWords({ before, after: null }, zone)).toEqual(['The entry was voided.']);
  });
});
