import { quickFindQuestion, quickFindRank } from './quick-find-question.js';

describe('what is looked for', () => {
  it.each([
    ['1042', 1042, null],
    ['#1042', 1042, null],
    [' Job 1042 ', 1042, 'job'],
    ['jobs 1042', 1042, 'job'],
    ['invoice no. 2207', 2207, 'invoice'],
    ['ESTIMATE #318', 318, 'estimate'],
    ['customer 12', null, null],
    ['Job', null, null],
    ['1042b', null, null],
    ['12345678901', null, null],
  ])('%s', (typed, number, kind) => {
    expect(quickFindQuestion(typed)).toEqual({ text: typed.trim(), number, kind });
  });

  it('is answered best by its number, then by how a name begins, then by anything', () => {
    const question = quickFindQuestion('1042');
    expect(quickFindRank({ title: 'Library', number: 1042 }, question)).toBe(0);
    expect(quickFindRank({ title: '1042 Quarry Road', number: null }, question)).toBe(1);
    expect(quickFindRank({ title: 'House at 1042', number: 7 }, question)).toBe(2);
    expect(quickFindRank({ title: 'Wren Halloway', number: null }, quickFindQuestion('wren'))).toBe(1);
  });
});
