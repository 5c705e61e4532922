import { boxesChoice, buildChoice, buildJobs, BOXES, FRAMES } from '../testing/build-punch';
import { clockFace, jobOf, whatOf } from '../punches/work-words';
import { MEAL_BREAK } from '../punches/punch';
import { factsOf, leftOf } from './choice-words';
import { keptSentence, type Kept } from './kept-note/kept-sentence';
import { findJobs, operationsFor } from './other-work/offered-work';

describe('the words of the clock', () => {
  it.each([
    [0, '0:00'],
    [9, '0:09'],
    [134, '2:14'],
    [1449, '24:09'],
    [-3, '0:00'],
  ])('%i minutes read %s', (minutes, text) => {
    expect(clockFace(minutes)).toBe(text);
  });

  it('name work by its operation and its job', () => {
    expect([whatOf(MEAL_BREAK), jobOf(MEAL_BREAK)]).toEqual(['Meal break', '']);
    expect(factsOf(buildChoice())).toEqual({
      job: 'Job 1042, Mudroom lockers',
      left: '2.4 h left',
      over: false,
    });
    expect(factsOf(boxesChoice())).toMatchObject({ left: '0.5 h over', over: true });
  });

  it('say when work on a job was not planned, and nothing of work on none', () => {
    expect([leftOf(null, true), leftOf(null, false)]).toEqual(['not planned', '']);
  });
});

describe('what is said about punches that wait', () => {
  const kept: Kept = { count: 2, waiting: 'no-network', behindRefused: false, outlivesPage: true };

  it.each<[Partial<Kept>, string]>([
    [{}, 'No network. 2 punches are kept on this device and will be sent.'],
    [{ count: 1 }, 'No network. 1 punch is kept on this device and will be sent.'],
    [{ waiting: 'signed-out' }, 'You were signed out. 2 punches are kept on this device and will be sent.'],
    [{ waiting: null, behindRefused: true }, '2 punches are kept on this device and will be sent.'],
    [{ waiting: null }, ''],
    [{ count: 0 }, ''],
  ])('%j', (facts, sentence) => {
    expect(keptSentence({ ...kept, ...facts })).toBe(sentence);
  });

  it('warns where the browser keeps nothing', () => {
    expect(keptSentence({ ...kept, outlivesPage: false })).toMatch(/Do not close it/);
  });
});

describe('work that is not among the choices', () => {
  it('is found by a job’s number or title', () => {
    const numbers = (typed: string) => findJobs(buildJobs(), typed).map(({ jobNumber }) => jobNumber);
    expect(numbers('')).toEqual([1042, 1039]);
    expect(numbers(' 039 ')).toEqual([1039]);
    expect(numbers('alder')).toEqual([1039]);
    expect(numbers('none such')).toEqual([]);
    expect(findJobs(null, '')).toEqual([]);
  });

  it('lists a job’s planned operations first, and without a job those that belong to none', () => {
    const all = buildJobs();
    expect(
      operationsFor(all, all.jobs[0]!).map(({ operationId, minutesLeft }) => [operationId, minutesLeft]),
    ).toEqual([
      [FRAMES.operation, 144],
      [BOXES.operation, null],
    ]);
    expect(operationsFor(all, null).map(({ operationName }) => operationName)).toEqual([
      'Shop, not on a job',
    ]);
  });
});
