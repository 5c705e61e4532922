import { boxes, buildIn, buildOut, BOXES, FRAMES } from '../testing/build-punch';
import { afterFailure, letGo, movedTo, putOn, withRefusal, without } from './settle-punches';

const problem = (status: number, code: string) => ({ type: '', title: '', status, code, detail: '' });

describe('a punch that did not get through', () => {
  it.each([
    [0, 'no-connection', 'no-network'],
    [401, 'not-signed-in', 'signed-out'],
    [402, 'subscription-lapsed', 'lapsed'],
    [403, 'cross-site', 'no-answer'],
    [409, 'in-progress', 'no-answer'],
    [429, 'too-many-requests', 'no-answer'],
    [500, 'fault', 'no-answer'],
    [503, 'fault', 'no-answer'],
  ] as const)('waits after %i %s', (status, code, why) => {
    expect(afterFailure(problem(status, code))).toBe(why);
  });

  it.each([
    [403, 'not-allowed'],
    [404, 'not-found'],
    [409, 'conflict'],
    [422, 'invalid-input'],
  ])('is a person’s to settle after %i %s', (status, code) => {
    expect(afterFailure(problem(status, code))).toBe('refused');
  });
});

describe('settling', () => {
  const first = buildIn({ order: 1, refused: 'This job is closed.' });
  const second = buildOut({ order: 2 });

  it('keeps the refused punch with the server’s sentence', () => {
    const [marked, other] = withRefusal(1, 'This job is closed.')([buildIn(), second]);
    expect([marked?.refused, other?.refused]).toEqual(['This job is closed.', null]);
  });

  it('puts the same stretch on something else, at its place in the order', () => {
    const [again] = putOn(1, boxes())([first, second]);
    expect(again).toMatchObject({ order: 1, at: first.at, entryId: FRAMES.entry, refused: null });
    expect(again?.work.operationName).toBe('Assemble boxes');
  });

  it('moves a punch to another instant', () => {
    const at = '2027-01-12T17:00:00.000Z';
    expect(movedTo(2, at)([first, { ...second, refused: 'Overlaps.' }])[1]).toMatchObject({
      at,
      refused: null,
    });
  });

  it('takes a punch out and leaves the others', () => {
    expect(without(1)([first, second])).toEqual([second]);
  });

  it('ends what was open before, once the switch from it was given up', () => {
    const given = { ...first, before: BOXES.entry };
    expect(letGo(1)([given, second])).toEqual([{ ...second, entryId: BOXES.entry }]);
  });

  it('drops the end of an entry that never began, when nothing was open before', () => {
    const third = buildIn({ order: 3, entryId: BOXES.entry, before: null });
    expect(letGo(1)([first, second, third])).toEqual([third]);
  });

  it('hands on what was open before to the next switch', () => {
    const given = { ...first, before: 'oldest' };
    const next = buildIn({ order: 3, entryId: BOXES.entry, before: FRAMES.entry });
    expect(letGo(1)([given, next])).toEqual([{ ...next, before: 'oldest' }]);
  });

  it('gives up an end and nothing else', () => {
    const next = buildIn({ order: 3, entryId: BOXES.entry });
    expect(letGo(2)([{ ...second, refused: 'Overlaps.' }, next])).toEqual([next]);
  });
});
