import { Decimal } from 'decimal.js';
import { sumCents, type Cents } from '../money/cents.js';
import { splitCents } from '../money/split.js';
import type { Refusal } from '../problems/problem.js';
import type { BilledStage, BillingStage, BillingStagePlan } from './billing-schedule-contract.js';

/** The price a schedule bills: net, its tax, and both. */
export type BillablePrice = { netCents: Cents; taxCents: Cents; totalCents: Cents };

/**
 * Why a schedule cannot bill this price, or null. Percents are of the whole price with tax, amounts have their tax in
 * them, and one stage may take what is left.
 */
export function refuseSchedule(schedule: readonly BillingStagePlan[], totalCents: Cents): Refusal | null {
  const detail =
    remainderProblem(schedule) ?? sumProblem(schedule, totalCents) ?? emptyStageProblem(schedule, totalCents);
  return detail === null ? null : { code: 'conflict', detail };
}

/**
 * What each stage bills. Stages add up to the price to the cent (largest remainder), and so do their nets and taxes:
 * each stage carries the share of tax that it carries of the price.
 *
 * @throws RangeError on a schedule that `refuseSchedule` refuses
 */
export function billSchedule(schedule: readonly BillingStage[], price: BillablePrice): BilledStage[] {
  const refusal = refuseSchedule(schedule, price.totalCents);
  if (refusal) throw new RangeError(refusal.detail);
  const totals = stageTotals(schedule, price.totalCents);
  const taxes = splitCents(price.taxCents, totals);
  return schedule.map((stage, index) => {
    const totalCents = totals[index]!;
    const taxCents = taxes[index]!;
    return { ...stage, netCents: totalCents - taxCents, taxCents, totalCents };
  });
}

/** As above, but with zeros while the schedule cannot bill the price: for an editor that is still being typed in. */
export function billScheduleSoFar(schedule: readonly BillingStage[], price: BillablePrice): BilledStage[] {
  if (refuseSchedule(schedule, price.totalCents) === null) return billSchedule(schedule, price);
  return schedule.map((stage) => ({ ...stage, netCents: 0, taxCents: 0, totalCents: 0 }));
}

function remainderProblem(schedule: readonly BillingStagePlan[]): string | null {
  const remainders = schedule.filter((stage) => 'remainder' in stage.share);
  return remainders.length > 1 ? 'Only one stage can bill the remainder.' : null;
}

function sumProblem(schedule: readonly BillingStagePlan[], totalCents: Cents): string | null {
  if (totalCents <= 0) return 'There is no price to bill yet.';
  if (schedule.some((stage) => 'remainder' in stage.share)) {
    const left = leftOver(schedule, totalCents);
    return left.greaterThan(0)
      ? null
      : 'The other stages bill the whole price, so nothing is left for the remainder.';
  }
  const percent = sumOfPercents(schedule);
  if (schedule.every((stage) => 'percent' in stage.share))
    return percent.equals(100) ? null : `The stages bill ${percent.toFixed()} % of the price, not 100 %.`;
  // Amounts beside percents: rounding the percents may leave less than a cent, which the split settles.
  const left = leftOver(schedule, totalCents);
  if (left.abs().lessThan(1)) return null;
  return left.greaterThan(0)
    ? 'The stages bill less than the price. Let one of them bill the remainder.'
    : 'The stages bill more than the price.';
}

function emptyStageProblem(schedule: readonly BillingStagePlan[], totalCents: Cents): string | null {
  const totals = stageTotals(schedule, totalCents);
  const empty = schedule.find((_, index) => totals[index]! <= 0);
  return empty ? `The stage ${empty.name} bills nothing.` : null;
}

/** What each stage comes to with tax: amounts as they are, the rest split over percents and the remainder. */
function stageTotals(schedule: readonly BillingStagePlan[], totalCents: Cents): Cents[] {
  const fixed = schedule.map(({ share }) => ('amountCents' in share ? share.amountCents : 0));
  const left = totalCents - sumCents(fixed);
  const weights = schedule.map((stage) =>
    'amountCents' in stage.share ? new Decimal(0) : quota(stage, schedule, totalCents),
  );
  if (weights.every((weight) => weight.isZero())) return fixed;
  const split = splitCents(
    left,
    weights.map((weight) => weight.toString()),
  );
  return fixed.map((amount, index) => amount + split[index]!);
}

function quota(
  { share }: BillingStagePlan,
  schedule: readonly BillingStagePlan[],
  totalCents: Cents,
): Decimal {
  if ('remainder' in share) return leftOver(schedule, totalCents);
  if ('amountCents' in share) return new Decimal(share.amountCents);
  return new Decimal(share.percent).times(totalCents).div(100);
}

/** Exact cents of the price that neither percents nor amounts bill. */
function leftOver(schedule: readonly BillingStagePlan[], totalCents: Cents): Decimal {
  const named = schedule.filter((stage) => !('remainder' in stage.share));
  return named.reduce(
    (left, stage) => left.minus(quota(stage, schedule, totalCents)),
    new Decimal(totalCents),
  );
}

function sumOfPercents(schedule: readonly BillingStagePlan[]): Decimal {
  return schedule.reduce(
    (sum, { share }) => ('percent' in share ? sum.plus(share.percent) : sum),
    new Decimal(0),
  );
}
