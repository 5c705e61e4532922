import { movesFrom, neighborStage } from './stage-moves';

describe('where a card can go', () => {
  it('from an open stage: to every other', () => {
    expect(movesFrom('contacted').map(({ to }) => to)).toEqual([
      'new',
      'site-visit',
      'estimating',
      'won',
      'lost',
    ]);
  });

  it('from won: nowhere', () => expect(movesFrom('won')).toEqual([]));

  it('from lost: won after all; reopening is a command of its own', () => {
    expect(movesFrom('lost')).toEqual([{ to: 'won', by: 'win' }]);
  });

  it.each([
    ['new', 1, 'contacted'],
    ['new', -1, null],
    ['estimating', 1, 'won'],
    ['won', 1, null],
    ['lost', -1, 'won'],
  ] as const)('pushed from %s by %i: %s', (stage, step, expected) => {
    expect(neighborStage(stage, step)).toBe(expected);
  });
});
