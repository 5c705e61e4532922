import { applyRate, extend, sumCents, type Cents } from '../money/cents.js';
import { ratio } from '../money/ratio.js';
import { splitCents } from '../money/split.js';
import { COST_CATEGORIES } from './cost-categories.js';
import { planWork } from './planned-work.js';
import type {
  EstimateLine,
  EstimateRoom,
  EstimateTotals,
  PlannedCategory,
  RevisionContent,
  RevisionRoom,
} from './revision-contract.js';

type Priced = Pick<RevisionContent, 'rooms' | 'discountCents' | 'taxRule' | 'taxRate'>;

/** A line's price: quantity × unit price, half-up to the cent. */
export function lineAmount(line: EstimateLine): Cents {
  return extend(line.quantity, line.unitPriceCents);
}

/** A line's planned cost. Where the shop pays use tax, the unit cost is what it pays in all, that tax included. */
export function lineCost(line: EstimateLine): Cents {
  return extend(line.quantity, line.unitCostCents);
}

/** The rooms as typed, with what each line and room comes to. */
export function priceRooms(rooms: readonly EstimateRoom[]): RevisionRoom[] {
  return rooms.map((room) => {
    const lines = room.lines.map((line) => ({
      ...line,
      amountCents: lineAmount(line),
      costCents: lineCost(line),
    }));
    return { ...room, lines, amountCents: sumCents(lines.map((line) => line.amountCents)) };
  });
}

/**
 * Everything a revision comes to. Net is subtotal less discount, total is net and tax. A discount above the subtotal
 * takes the price to zero, not below (and cannot be sent).
 */
export function estimateTotals(revision: Priced): EstimateTotals {
  const lines = revision.rooms.flatMap((room) => room.lines);
  const subtotalCents = sumCents(lines.map(lineAmount));
  const discountCents = Math.min(revision.discountCents, subtotalCents);
  const netCents = subtotalCents - discountCents;
  const taxableCents = taxableBase(revision, lines, discountCents);
  const taxCents = applyRate(taxableCents, revision.taxRate);
  const plannedCostByCategory = costByCategory(lines);
  const plannedCostCents = sumCents(plannedCostByCategory.map((row) => row.costCents));
  const work = planWork(lines);
  const marginCents = netCents - plannedCostCents;
  return {
    subtotalCents,
    discountCents,
    netCents,
    taxableCents,
    taxCents,
    totalCents: netCents + taxCents,
    plannedCostCents,
    plannedCostByCategory,
    plannedMinutes: work.reduce((sum, row) => sum + row.plannedMinutes, 0),
    plannedMinutesByOperation: work.map(({ operationId, plannedMinutes }) => ({
      operationId,
      plannedMinutes,
    })),
    marginCents,
    margin: ratio(marginCents, netCents),
    markup: ratio(marginCents, plannedCostCents),
  };
}

/** The discount's share of each line, in the lines' order: largest remainder, so that the shares add up to it. */
export function discountShares(amounts: readonly Cents[], discountCents: Cents): Cents[] {
  if (discountCents === 0 || sumCents(amounts) === 0) return amounts.map(() => 0);
  return splitCents(discountCents, amounts);
}

/**
 * What tax is computed on, once for the whole estimate (the invoice basis of SSUTA section 324): the taxable lines, each
 * less its share of the discount. Nothing where the customer is exempt or the shop pays use tax itself.
 */
function taxableBase({ taxRule }: Priced, lines: readonly EstimateLine[], discountCents: Cents): Cents {
  if (taxRule !== 'on-price') return 0;
  const amounts = lines.map(lineAmount);
  const shares = discountShares(amounts, discountCents);
  return sumCents(amounts.map((amount, index) => (lines[index]!.taxable ? amount - shares[index]! : 0)));
}

function costByCategory(lines: readonly EstimateLine[]): PlannedCategory[] {
  return COST_CATEGORIES.map((kind) => ({
    kind,
    costCents: sumCents(lines.filter((line) => line.kind === kind).map(lineCost)),
  })).filter((row) => row.costCents !== 0);
}
