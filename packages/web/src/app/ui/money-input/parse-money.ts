import { MAX_CENTS, type Cents } from '@bookmatch/common/money/cents';

const TYPED = /^(?<sign>[-\u2212])?\$?\s*(?<whole>\d{1,3}(?:,\d{3})+|\d+)?(?:\.(?<part>\d{0,2}))?$/;

/**
 * Reads an amount as people type it: `1250`, `1,250`, `$1,250.00`, `.50`.
 *
 * @returns whole cents; null for an empty field; undefined when it cannot be read or is beyond every field's bound
 */
export function parseMoney(text: string): Cents | null | undefined {
  const typed = text.trim();
  if (typed === '') return null;
  const { sign, whole, part } = TYPED.exec(typed)?.groups ?? {};
  if (whole === undefined && !part) return undefined;
  const cents = Number((whole ?? '0').replaceAll(',', '')) * 100 + Number((part ?? '').padEnd(2, '0'));
  if (cents > MAX_CENTS) return undefined;
  return sign && cents > 0 ? -cents : cents;
}
