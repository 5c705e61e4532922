import { stageParts } from './stage-bar';

const stage = (key: string, count: number) => ({ key, name: key, count });

describe('the bar of stages', () => {
  it('gives every stage its share of the width, one after the other, the later the fuller', () => {
    const parts = stageParts([stage('new', 1), stage('contacted', 0), stage('estimating', 3)]);
    expect(parts.map(({ key, from }) => [key, from])).toEqual([
      ['new', 0],
      ['estimating', 25],
    ]);
    expect(parts[1]!.width).toBeGreaterThan(74);
    expect(parts.map(({ fullness }) => fullness)).toEqual([0.3, 1]);
  });

  it('is empty when there is nothing', () => expect(stageParts([stage('new', 0)])).toEqual([]));
});
