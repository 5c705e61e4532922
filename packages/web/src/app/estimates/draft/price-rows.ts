import { COST_CATEGORY_NAMES, type CostCategory } from '@bookmatch/common/estimates/cost-categories';
import { discountShares, lineAmount, lineCost } from '@bookmatch/common/estimates/estimate-totals';
import { linePlannedMinutes } from '@bookmatch/common/estimates/planned-work';
import type { EstimateLine, RevisionContent } from '@bookmatch/common/estimates/revision-contract';
import type { Cents } from '@bookmatch/common/money/cents';

/** A figure's part: a line of the estimate, and the room it stands in. */
export type PricePart = { name: string; note: string; cents: Cents };
export type CostRow = {
  kind: CostCategory;
  name: string;
  cents: Cents;
  minutes: number;
  parts: PricePart[];
};
type Placed = { line: EstimateLine; room: string };

/** What the cost is made of, category by category, each down to its lines. */
export function costRows(content: RevisionContent): CostRow[] {
  const placed = placedLines(content);
  return (Object.keys(COST_CATEGORY_NAMES) as CostCategory[])
    .map((kind) =>
      costRow(
        kind,
        placed.filter(({ line }) => line.kind === kind),
      ),
    )
    .filter(({ parts }) => parts.length > 0);
}

/** What the price before the discount is made of: the rooms. */
export function roomParts({ rooms }: RevisionContent): PricePart[] {
  return rooms.map(({ name, lines }) => ({
    name,
    note: `${lines.length} ${lines.length === 1 ? 'line' : 'lines'}`,
    cents: lines.reduce((sum, line) => sum + lineAmount(line), 0),
  }));
}

/** What sales tax is computed on: the taxable lines, each less its share of the discount. */
export function taxableParts(content: RevisionContent): PricePart[] {
  const placed = placedLines(content);
  const amounts = placed.map(({ line }) => lineAmount(line));
  const subtotal = amounts.reduce((sum, amount) => sum + amount, 0);
  const shares = discountShares(amounts, Math.min(content.discountCents, subtotal));
  return placed
    .map(({ line, room }, at) => ({ line, room, cents: (amounts[at] ?? 0) - (shares[at] ?? 0) }))
    .filter(({ line, cents }) => line.taxable && cents !== 0)
    .map(({ line, room, cents }) => ({ name: line.description || 'Unnamed line', note: room, cents }));
}

function costRow(kind: CostCategory, lines: readonly Placed[]): CostRow {
  const parts = lines.map(({ line, room }) => ({
    name: line.description || 'Unnamed line',
    note: `${room}, ${line.quantity} ${line.unit}`,
    cents: lineCost(line),
  }));
  return {
    kind,
    name: COST_CATEGORY_NAMES[kind],
    cents: parts.reduce((sum, { cents }) => sum + cents, 0),
    minutes: lines.reduce((sum, { line }) => sum + linePlannedMinutes(line), 0),
    parts,
  };
}

function placedLines({ rooms }: RevisionContent): Placed[] {
  return rooms.flatMap((room) => room.lines.map((line) => ({ line, room: room.name })));
}
