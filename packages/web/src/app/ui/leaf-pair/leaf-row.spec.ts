import { leafBars, leafScale, leafTone } from './leaf-row';

const row = (planned: number, built: number) => ({ key: 'a', name: 'Solid stock', planned, built });

describe('leafBars', () => {
  it('draws both leaves to one scale, that of the largest figure on either side', () => {
    const rows = [row(200, 100), row(50, 400)];
    expect(leafScale(rows)).toBe(400);
    expect(leafBars(row(200, 100), 400)).toEqual({ planned: 50, built: 25, over: 0 });
  });

  it('puts what ran over at the end of the built bar', () => {
    expect(leafBars(row(100, 150), 200)).toEqual({ planned: 50, built: 50, over: 25 });
  });

  it('shows work that was not planned as over from its start', () => {
    expect(leafBars(row(0, 50), 100)).toEqual({ planned: 0, built: 0, over: 50 });
  });

  it('draws nothing for a negative figure and never divides by zero', () => {
    expect(leafBars(row(-10, -5), leafScale([row(0, 0)]))).toEqual({ planned: 0, built: 0, over: 0 });
  });

  it('tells over, under and even', () => {
    expect([leafTone(row(1, 2)), leafTone(row(2, 1)), leafTone(row(2, 2))]).toEqual([
      'over',
      'under',
      'even',
    ]);
  });
});
