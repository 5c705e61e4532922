import fc from 'fast-check';
import { laborCost } from './labor-cost.js';
import { elapsedMinutes } from './punch.js';
import { costedParts } from './entry-parts.js';

const chicago = 'America/Chicago';

describe('the parts of an entry', () => {
  it('share its cost by their minutes', () => {
    // 11:30 pm to 1 am in Chicago at 41.00 an hour.
    const shift = {
      kind: 'work',
      startedAt: '2027-01-15T05:30:00.000Z',
      endedAt: '2027-01-15T07:00:00.000Z',
    };
    expect(costedParts({ ...shift, kind: 'work', costCents: laborCost(90, 4_100) }, chicago)).toEqual([
      { on: '2027-01-14', minutes: 30, costCents: 2_050 },
      { on: '2027-01-15', minutes: 60, costCents: 4_100 },
    ]);
  });

  it('cost nothing where no minute passed', () => {
    const at = '2027-01-15T05:30:00.000Z';
    const parts = costedParts({ kind: 'work', startedAt: at, endedAt: at, costCents: 0 }, chicago);
    expect(parts).toEqual([{ on: '2027-01-14', minutes: 0, costCents: 0 }]);
  });

  it('add up to the entry, minutes and cents', () => {
    const minute = fc.integer({
      min: Date.parse('2026-01-01') / 60_000,
      max: Date.parse('2029-01-01') / 60_000,
    });
    fc.assert(
      fc.property(minute, fc.nat(960), fc.nat(100_000), (start, length, rate) => {
        const startedAt = new Date(start * 60_000).toISOString();
        const endedAt = new Date((start + length) * 60_000).toISOString();
        const costCents = laborCost(elapsedMinutes(startedAt, endedAt), rate);
        const parts = costedParts({ kind: 'work', startedAt, endedAt, costCents }, chicago);
        expect(parts.reduce((sum, part) => sum + part.minutes, 0)).toBe(length);
        expect(parts.reduce((sum, part) => sum + part.costCents, 0)).toBe(costCents);
      }),
    );
  });
});
