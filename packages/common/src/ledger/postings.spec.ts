import fc from 'fast-check';
import { INVOICE_KINDS, PAYMENT_METHODS } from '../invoices/invoice-standings.js';
import { accountBalance, assertBalanced, trialBalance } from './balance.js';
import { CHART_OF_ACCOUNTS, type AccountCode } from './chart-of-accounts.js';
import type { LedgerLine } from './ledger-contract.js';
import {
  postCreditNote,
  postDepositEarned,
  postInvoice,
  postPayment,
  postRefund,
  postReversal,
} from './postings.js';

const party = { customerId: '01930000-0000-7000-8000-000000000001', jobId: null };
const brief = (lines: LedgerLine[]) =>
  lines.map((line) => `${line.side} ${line.account} ${line.amountCents}`);

function balances(lines: LedgerLine[]): Partial<Record<AccountCode, number>> {
  const sums = CHART_OF_ACCOUNTS.map(({ code }) => {
    const of = (side: string) =>
      lines
        .filter((line) => line.account === code && line.side === side)
        .reduce((sum, line) => sum + line.amountCents, 0);
    return [code, accountBalance(code, of('debit'), of('credit'))] as const;
  });
  return Object.fromEntries(sums.filter(([, balance]) => balance !== 0));
}

describe('postings', () => {
  it('owe a deposit to the customer, tax included, until it is earned', () => {
    expect(brief(postInvoice('deposit', { netCents: 40_000, taxCents: 3_300 }, party))).toEqual([
      'debit 1200 43300',
      'credit 2300 43300',
    ]);
    expect(brief(postDepositEarned({ netCents: 40_000, taxCents: 3_300 }, party))).toEqual([
      'debit 2300 43300',
      'credit 4000 40000',
      'credit 2200 3300',
    ]);
  });

  it('sell with every other invoice, and leave out tax where there is none', () => {
    expect(brief(postInvoice('final', { netCents: 60_000, taxCents: 4_950 }, party))).toEqual([
      'debit 1200 64950',
      'credit 4000 60000',
      'credit 2200 4950',
    ]);
    expect(brief(postInvoice('other', { netCents: 500, taxCents: 0 }, party))).toEqual([
      'debit 1200 500',
      'credit 4000 500',
    ]);
  });

  it('receive cards in clearing and everything else in the bank', () => {
    expect(PAYMENT_METHODS.map((method) => brief(postPayment(method, 100, party))[0])).toEqual([
      'debit 1050 100',
      'debit 1000 100',
      'debit 1000 100',
      'debit 1000 100',
    ]);
  });

  it('owe back what came beyond the debt, until it is given back', () => {
    const lines = postPayment('card', 10_000, party, 6_000);
    expect(brief(lines)).toEqual(['debit 1050 10000', 'credit 1200 4000', 'credit 2350 6000']);
    expect(brief(postRefund('check', 6_000, party))).toEqual(['debit 2350 6000', 'credit 1000 6000']);
    expect(brief(postPayment('card', 10_000, party, 10_000))).toEqual([
      'debit 1050 10000',
      'credit 2350 10000',
    ]);
  });

  it('owe a payment again that was recorded wrongly', () => {
    expect(balances([...postPayment('cash', 100, party), ...postReversal('cash', 100, party)])).toEqual({});
  });

  it('take back a sale as an allowance, and an unearned deposit as the liability it was', () => {
    const amount = { netCents: 10_000, taxCents: 825 };
    expect(brief(postCreditNote(amount, false, party))).toEqual([
      'debit 4900 10000',
      'debit 2200 825',
      'credit 1200 10825',
    ]);
    expect(brief(postCreditNote(amount, true, party))).toEqual(['debit 2300 10825', 'credit 1200 10825']);
  });

  it('leave a job that was billed, earned and paid with nothing owed either way', () => {
    const deposit = { netCents: 40_000, taxCents: 3_300 };
    const final = { netCents: 60_000, taxCents: 4_950 };
    const lines = [
      postInvoice('deposit', deposit, party),
      postPayment('card', 43_300, party),
      postInvoice('final', final, party),
      postDepositEarned(deposit, party),
      postPayment('check', 64_950, party),
    ].flat();
    expect(balances(lines)).toEqual({ '1000': 64_950, '1050': 43_300, '2200': 8_250, '4000': 100_000 });
  });

  const cents = fc.integer({ min: 1, max: 10_000_000 });
  const amount = fc.record({ netCents: cents, taxCents: fc.nat(1_000_000) });
  const entries = fc.oneof(
    fc.tuple(fc.constantFrom(...INVOICE_KINDS), amount).map(([kind, of]) => postInvoice(kind, of, party)),
    amount.map((of) => postDepositEarned(of, party)),
    fc
      .tuple(fc.constantFrom(...PAYMENT_METHODS), cents)
      .map(([method, of]) => postPayment(method, of, party)),
    fc.tuple(amount, fc.boolean()).map(([of, unearned]) => postCreditNote(of, unearned, party)),
  );

  it('balance one by one, and in any trial balance of them', () => {
    fc.assert(
      fc.property(fc.array(entries), (all) => {
        all.forEach((lines) => expect(() => assertBalanced(lines)).not.toThrow());
        const sums = all.flat().map((line) => ({
          account: line.account,
          debitCents: line.side === 'debit' ? line.amountCents : 0,
          creditCents: line.side === 'credit' ? line.amountCents : 0,
        }));
        const trial = trialBalance(sums, '2027-03-31');
        expect(trial.debitCents).toBe(trial.creditCents);
        expect(trial.rows.every((row) => row.debitCents === 0 || row.creditCents === 0)).toBe(true);
      }),
    );
  });
});

describe('an entry', () => {
  const line = (side: 'debit' | 'credit', amountCents: number): LedgerLine => ({
    account: '1000',
    side,
    amountCents,
    ...party,
  });

  it.each([
    ['that does not balance', [line('debit', 100), line('credit', 99)]],
    ['with a line of nothing', [line('debit', 0), line('credit', 0)]],
    ['with a line below zero', [line('debit', -5), line('credit', -5)]],
    ['with part of a cent', [line('debit', 0.5), line('credit', 0.5)]],
    ['without lines', []],
  ])('%s is refused', (_, lines) => {
    expect(() => assertBalanced(lines)).toThrow(RangeError);
  });
});
