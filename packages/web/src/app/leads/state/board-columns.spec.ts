import { buildLead, buildLeadRow } from '@bookmatch/common/testing/build-lead';
import { cardOf, findCard, placeOnBoard, type BoardColumn } from './board-columns';

const early = buildLeadRow({ title: 'Early', nextStepOn: '2027-01-10', expectedCents: 100_000 });
const late = buildLeadRow({ title: 'Late', nextStepOn: null, expectedCents: null });
const columns: BoardColumn[] = [
  { stage: 'new', count: 40, expectedCents: 900_000, rows: [early, late] },
  { stage: 'contacted', count: 1, expectedCents: 50_000, rows: [buildLeadRow({ nextStepOn: '2027-01-20' })] },
];

describe('a card on the board', () => {
  it('moves to its new column, to the place of its next step, and takes count and sum along', () => {
    const [from, to] = placeOnBoard(columns, { ...early, stage: 'contacted' });
    expect(from).toMatchObject({ count: 39, expectedCents: 800_000, rows: [late] });
    expect(to).toMatchObject({ count: 2, expectedCents: 150_000 });
    expect(to?.rows[0]?.title).toBe('Early');
  });

  it('stands last without a next step', () => {
    const [, to] = placeOnBoard(columns, { ...late, stage: 'contacted' });
    expect(to?.rows.at(-1)?.title).toBe('Late');
    expect(to?.expectedCents).toBe(50_000);
  });

  it('changes in place when only its fields changed', () => {
    const [from] = placeOnBoard(columns, { ...early, expectedCents: 300_000, title: 'Renamed' });
    expect(from).toMatchObject({ count: 40, expectedCents: 1_100_000 });
    expect(findCard([from as BoardColumn], early.id)?.title).toBe('Renamed');
  });

  it('is not put on a board that does not show it', () => {
    expect(placeOnBoard(columns, buildLeadRow({ stage: 'contacted' }))).toEqual(columns);
  });

  it('shows nothing of a lead but what a card has', () => {
    const lead = buildLead();
    expect(Object.keys(cardOf(lead)).sort()).toEqual(Object.keys(buildLeadRow()).sort());
  });
});
