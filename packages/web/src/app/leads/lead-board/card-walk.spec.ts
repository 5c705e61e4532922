import { cardBeside } from './card-walk';

const columns = [{ rows: [{ id: 'a' }, { id: 'b' }, { id: 'c' }] }, { rows: [] }, { rows: [{ id: 'd' }] }];

it.each([
  ['down', 'a', 0, 1, 'b'],
  ['up', 'b', 0, -1, 'a'],
  ['no further than the last', 'c', 0, 1, null],
  ['over an empty column, to its nearest card', 'c', 1, 0, 'd'],
  ['back', 'd', -1, 0, 'a'],
  ['not over the edge', 'a', -1, 0, null],
  ['from nowhere', 'x', 1, 0, null],
] as const)('walks %s', (_, from, column, row, expected) => {
  expect(cardBeside(columns, from, { column, row })).toBe(expected);
});
