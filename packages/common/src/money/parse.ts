import { MAX_CENTS, type Cents } from './cents.js';

export type MoneyReading = { cents: Cents } | { problem: string };

const GROUPED = /^\d{1,3}(?:,\d{3})+$|^\d{1,3}(?: \d{3})+$/;
const PLAIN = /^\d+$/;

/**
 * Reads what a person types into a money field: `1,250`, `$1250.00`, `1 250`, `.5`, `-5`, `(5)` as bookkeepers write
 * it. Whole amounts are dollars. More than two decimals are refused rather than rounded, and so is a lone comma before
 * two digits, which might mean either.
 */
export function parseMoney(text: string): MoneyReading {
  const { negative, rest } = takeSign(text.replaceAll(/[\u00a0\u202f\u2009]/g, ' ').trim());
  const [whole = '', decimals, ...more] = rest.split('.');
  if (rest === '' || rest === '.' || more.length > 0) return notAnAmount();
  if (whole !== '' && !PLAIN.test(whole) && !GROUPED.test(whole)) return notAnAmount();
  if (decimals !== undefined && !/^\d*$/.test(decimals)) return notAnAmount();
  if ((decimals ?? '').length > 2) return { problem: 'An amount has at most two decimals.' };
  return withinBounds(`${whole.replaceAll(/[ ,]/g, '')}${(decimals ?? '').padEnd(2, '0')}`, negative);
}

function takeSign(text: string): { negative: boolean; rest: string } {
  const inParentheses = /^\((.*)\)$/.exec(text);
  const signed = /^(-|\u2212)?\s*\$?\s*(-|\u2212)?\s*(.*)$/.exec(inParentheses?.[1] ?? text)!;
  const minuses = [inParentheses, signed[1], signed[2]].filter(Boolean).length;
  return minuses > 1 ? { negative: false, rest: '' } : { negative: minuses === 1, rest: signed[3]! };
}

function withinBounds(digits: string, negative: boolean): MoneyReading {
  const cents = Number(digits);
  if (cents > MAX_CENTS) return { problem: 'This amount is too large.' };
  return { cents: negative && cents !== 0 ? -cents : cents };
}

function notAnAmount(): MoneyReading {
  return { problem: 'Give an amount, such as 1,250 or 1250.00.' };
}
