import { Decimal } from 'decimal.js';
import { sumCents, type Cents } from './cents.js';

/**
 * Splits an amount over weights so that the parts add up to it exactly.
 *
 * Largest remainder (Hamilton's method): every part gets its quota rounded down, then the cents left over go
 * one each to the largest remainders, the earlier part first on a tie.
 *
 * @param amount whole cents, negative allowed (split as its mirror image)
 * @param weights exact decimals, none negative, at least one above zero
 * @throws RangeError if the weights cannot carry a split
 */
export function splitCents(amount: Cents, weights: readonly (string | number)[]): Cents[] {
  if (amount < 0) return splitCents(-amount, weights).map((part) => (part === 0 ? 0 : -part));
  const exact = weights.map((weight) => new Decimal(weight));
  const total = exact.reduce((sum, weight) => sum.plus(weight), new Decimal(0));
  if (exact.some((weight) => weight.isNegative()) || !total.isPositive() || total.isZero())
    throw new RangeError('a split needs weights that are not negative and not all zero');

  const quotas = exact.map((weight) => weight.times(amount).div(total));
  const parts = quotas.map((quota) => quota.floor().toNumber());
  const byRemainder = quotas
    .map((quota, index) => ({ index, remainder: quota.minus(quota.floor()) }))
    .sort((a, b) => b.remainder.comparedTo(a.remainder) || a.index - b.index);
  const left = amount - sumCents(parts);
  for (const { index } of byRemainder.slice(0, left)) parts[index]! += 1;
  return parts;
}
