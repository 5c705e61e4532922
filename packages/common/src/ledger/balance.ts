import { sumCents, type Cents } from '../money/cents.js';
import { CHART_OF_ACCOUNTS, type AccountCode, type LedgerSide } from './chart-of-accounts.js';
import type { TrialBalance } from './ledger-contract.js';

type Posted = { account: AccountCode; side: LedgerSide; amountCents: Cents };

/**
 * The books' one invariant, checked before anything is stored.
 *
 * @throws RangeError when debits and credits differ, or a line is not above zero: a fault of the program, never of the
 * person
 */
export function assertBalanced<Line extends Posted>(lines: Line[]): Line[] {
  if (lines.some((line) => !Number.isSafeInteger(line.amountCents) || line.amountCents <= 0))
    throw new RangeError('a ledger line must be whole cents above zero');
  const [debits, credits] = [sumOf(lines, 'debit'), sumOf(lines, 'credit')];
  if (debits !== credits || lines.length < 2)
    throw new RangeError(`an entry must balance: debits ${debits}, credits ${credits}`);
  return lines;
}

/** The balance on an account's normal side: below zero when it stands on the other. */
export function accountBalance(account: AccountCode, debitCents: Cents, creditCents: Cents): Cents {
  const { normalSide } = CHART_OF_ACCOUNTS.find(({ code }) => code === account)!;
  return normalSide === 'debit' ? debitCents - creditCents : creditCents - debitCents;
}

/**
 * Every account with its balance on one side. Debits equal credits as long as every entry balanced.
 *
 * @param sums what was posted to each account in all; accounts without a sum have none
 */
export function trialBalance(
  sums: readonly { account: AccountCode; debitCents: Cents; creditCents: Cents }[],
  on: string,
): TrialBalance {
  const rows = CHART_OF_ACCOUNTS.map(({ code, name, type, normalSide }) => {
    const posted = sums.filter(({ account }) => account === code);
    const net = sumCents(posted.map(({ debitCents, creditCents }) => debitCents - creditCents));
    return {
      account: code,
      name,
      type,
      normalSide,
      debitCents: Math.max(0, net),
      creditCents: Math.max(0, -net),
    };
  });
  return {
    on,
    rows,
    debitCents: sumCents(rows.map((row) => row.debitCents)),
    creditCents: sumCents(rows.map((row) => row.creditCents)),
  };
}

function sumOf(lines: readonly Posted[], side: LedgerSide): Cents {
  return sumCents(lines.filter((line) => line.side === side).map((line) => line.amountCents));
}
