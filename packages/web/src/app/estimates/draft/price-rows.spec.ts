import { estimateTotals } from '@bookmatch/common/estimates/estimate-totals';
import { sumCents } from '@bookmatch/common/money/cents';
import { buildLine, buildRevisionContent, buildRoom } from '@bookmatch/common/testing/build-estimate';
import { costRows, roomParts, taxableParts } from './price-rows';

const operationId = '01940000-0000-7000-8000-0000000000a1';
const content = buildRevisionContent({
  discountCents: 1_001,
  rooms: [
    buildRoom({
      name: 'Library',
      lines: [
        buildLine({ description: 'Birch ply' }),
        buildLine({
          kind: 'labor',
          description: 'Assemble',
          quantity: '2.5',
          unit: 'hour',
          operationId,
          plannedMinutesPerUnit: '60',
        }),
      ],
    }),
    buildRoom({ name: 'Mudroom', lines: [buildLine({ taxable: false })] }),
  ],
});
const totals = estimateTotals(content);

describe('the working of a price', () => {
  it('gives the cost by category, each with its lines and hours, adding up to the cost', () => {
    const rows = costRows(content);
    expect(rows.map(({ name, minutes }) => [name, minutes])).toEqual([
      ['Material', 0],
      ['Shop labor', 150],
    ]);
    expect(rows[0]?.parts.map(({ note }) => note)).toEqual(['Library, 3 sheet', 'Mudroom, 3 sheet']);
    expect(sumCents(rows.map(({ cents }) => cents))).toBe(totals.plannedCostCents);
  });

  it('gives the rooms, adding up to the price before the discount', () => {
    expect(roomParts(content).map(({ name, note }) => [name, note])).toEqual([
      ['Library', '2 lines'],
      ['Mudroom', '1 line'],
    ]);
    expect(sumCents(roomParts(content).map(({ cents }) => cents))).toBe(totals.subtotalCents);
  });

  it('gives the taxable lines less their share of the discount, adding up to what is taxed', () => {
    const parts = taxableParts(content);
    expect(parts.map(({ note }) => note)).toEqual(['Library', 'Library']);
    expect(sumCents(parts.map(({ cents }) => cents))).toBe(totals.taxableCents);
  });
});
