import type { InvoiceKind, PaymentMethod } from '../invoices/invoice-standings.js';
import type { Cents } from '../money/cents.js';
import { assertBalanced } from './balance.js';
import { ACCOUNTS, type AccountCode, type LedgerSide } from './chart-of-accounts.js';
import type { EntryKind, LedgerLine } from './ledger-contract.js';

/** Whom and what an entry is about; every line of it says so. */
export type PostingParty = { customerId: string; jobId: string | null };
type NetAndTax = { netCents: Cents; taxCents: Cents };

/** Which entry an issued invoice makes. */
export function entryKindOf(kind: InvoiceKind): EntryKind {
  return kind === 'deposit' ? 'deposit-invoice' : 'invoice';
}

/**
 * An invoice is issued. The customer owes it from now on. A deposit is owed back to the customer, its tax included,
 * until work earns it; everything else is a sale, and its tax is owed to the state.
 */
export function postInvoice(
  kind: InvoiceKind,
  { netCents, taxCents }: NetAndTax,
  party: PostingParty,
): LedgerLine[] {
  const total = netCents + taxCents;
  return kind === 'deposit'
    ? entry(party, [debit(ACCOUNTS.accountsReceivable, total), credit(ACCOUNTS.customerDeposits, total)])
    : entry(party, [
        debit(ACCOUNTS.accountsReceivable, total),
        credit(ACCOUNTS.sales, netCents),
        credit(ACCOUNTS.salesTaxPayable, taxCents),
      ]);
}

/** A deposit is earned: what was owed to the customer becomes a sale and the tax on it. */
export function postDepositEarned({ netCents, taxCents }: NetAndTax, party: PostingParty): LedgerLine[] {
  return entry(party, [
    debit(ACCOUNTS.customerDeposits, netCents + taxCents),
    credit(ACCOUNTS.sales, netCents),
    credit(ACCOUNTS.salesTaxPayable, taxCents),
  ]);
}

/**
 * A payment is received. Cards go through clearing, since the provider pays them out some days later. What came beyond
 * the debt is owed back to the customer.
 *
 * @param excessCents the part of the amount that is more than was owed
 */
export function postPayment(
  method: PaymentMethod,
  amountCents: Cents,
  party: PostingParty,
  excessCents: Cents = 0,
): LedgerLine[] {
  return entry(party, [
    debit(moneyAccount(method), amountCents),
    credit(ACCOUNTS.accountsReceivable, amountCents - excessCents),
    credit(ACCOUNTS.customerOverpayments, excessCents),
  ]);
}

/** A payment that was recorded wrongly is taken back: the customer owes it again. */
export function postReversal(method: PaymentMethod, amountCents: Cents, party: PostingParty): LedgerLine[] {
  return entry(party, [
    debit(ACCOUNTS.accountsReceivable, amountCents),
    credit(moneyAccount(method), amountCents),
  ]);
}

/** What came beyond the debt is given back. */
export function postRefund(method: PaymentMethod, amountCents: Cents, party: PostingParty): LedgerLine[] {
  return entry(party, [
    debit(ACCOUNTS.customerOverpayments, amountCents),
    credit(moneyAccount(method), amountCents),
  ]);
}

/**
 * A credit note is given. Of a sale it takes back net and tax in proportion; of a deposit that is not earned yet it
 * takes back the liability, since there was no sale.
 */
export function postCreditNote(
  { netCents, taxCents }: NetAndTax,
  unearnedDeposit: boolean,
  party: PostingParty,
): LedgerLine[] {
  const total = netCents + taxCents;
  const takenBack = unearnedDeposit
    ? [debit(ACCOUNTS.customerDeposits, total)]
    : [debit(ACCOUNTS.creditsAndAllowances, netCents), debit(ACCOUNTS.salesTaxPayable, taxCents)];
  return entry(party, [...takenBack, credit(ACCOUNTS.accountsReceivable, total)]);
}

function moneyAccount(method: PaymentMethod): AccountCode {
  return method === 'card' ? ACCOUNTS.cardClearing : ACCOUNTS.cashAndBank;
}

type Amount = { account: AccountCode; side: LedgerSide; amountCents: Cents };

function debit(account: AccountCode, amountCents: Cents): Amount {
  return { account, side: 'debit', amountCents };
}

function credit(account: AccountCode, amountCents: Cents): Amount {
  return { account, side: 'credit', amountCents };
}

/** Lines of nothing (no tax on an untaxed sale) are left out; what remains must balance. */
function entry(party: PostingParty, amounts: readonly Amount[]): LedgerLine[] {
  const lines = amounts.filter(({ amountCents }) => amountCents !== 0);
  return assertBalanced(lines.map((line) => ({ ...line, customerId: party.customerId, jobId: party.jobId })));
}
