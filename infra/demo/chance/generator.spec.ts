import { Generator } from './generator.js';

const draw = (random: Generator, count = 200) => Array.from({ length: count }, () => random.whole(1, 6));

describe('a generator', () => {
  it('gives the same numbers for the same name, and others for another', () => {
    expect(draw(new Generator('a'))).toEqual(draw(new Generator('a')));
    expect(draw(new Generator('a'))).not.toEqual(draw(new Generator('b')));
  });

  it('gives every whole number between both ends and none beside', () => {
    expect([...new Set(draw(new Generator('dice')))].sort()).toEqual([1, 2, 3, 4, 5, 6]);
  });

  it('has streams that do not move each other', () => {
    const random = new Generator('root');
    const before = draw(random.stream('one'));
    draw(random);
    expect(draw(random.stream('one'))).toEqual(before);
  });

  it('stays near the middle it is given', () => {
    const random = new Generator('near');
    const drawn = Array.from({ length: 500 }, () => random.around(10, 2));
    expect(drawn.every((value) => value >= 8 && value <= 12)).toBe(true);
    expect(drawn.filter((value) => Math.abs(value - 10) < 1).length).toBeGreaterThan(300);
  });

  it('refuses to choose from nothing', () => {
    expect(() => new Generator('none').pick([])).toThrow(RangeError);
  });
});
