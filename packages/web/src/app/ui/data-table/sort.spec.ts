import { nextSort, sortDirection } from './sort';

describe('sort', () => {
  it('turns the order of the column in use around, both ways', () => {
    expect(nextSort('name', 'name')).toBe('-name');
    expect(nextSort('-name', 'name')).toBe('name');
  });

  it('starts another column ascending', () => {
    expect(nextSort('-name', 'total')).toBe('total');
    expect(nextSort(undefined, 'total')).toBe('total');
  });

  it('tells the direction of the column in use only', () => {
    expect(sortDirection('-name', 'name')).toBe('descending');
    expect(sortDirection('name', 'total')).toBeNull();
    expect(sortDirection('name', undefined)).toBeNull();
  });
});
