import type { ShopScope } from '@bookmatch/api/platform/database/scope';
import { Invoice, readAging, readTotals } from '@bookmatch/api/features/invoices/invoices-public';
import { CreditNote } from '@bookmatch/api/features/invoices/credit-note.entity';
import { InvoiceLine } from '@bookmatch/api/features/invoices/invoice-line.entity';
import { Payment } from '@bookmatch/api/features/invoices/payment.entity';
import { LedgerLine } from '@bookmatch/api/features/ledger/ledger-line.entity';
import { readBalance, readTrialBalance } from '@bookmatch/api/features/ledger/ledger-sums';
import type { DateText } from '@bookmatch/common/calendar/shop-dates';
import { ACCOUNTS, type AccountCode } from '@bookmatch/common/ledger/chart-of-accounts';
import { sumCents } from '@bookmatch/common/money/cents';
import { none, same, type Finding } from './finding.js';

type Books = { invoices: Invoice[]; payments: Payment[]; notes: CreditNote[]; lines: LedgerLine[] };
const ISSUED = (invoice: Invoice) => invoice.status !== 'draft';

/** The ledger against what it was made from, to the cent. @param today in the shop's zone */
export async function checkBooks(scope: ShopScope, today: DateText): Promise<Finding[]> {
  const books: Books = {
    invoices: await scope.rows(Invoice).findBy({}, 'id'),
    payments: await scope.rows(Payment).findBy({}, 'id'),
    notes: await scope.rows(CreditNote).findBy({}, 'id'),
    lines: await scope.rows(LedgerLine).findBy({}, 'id'),
  };
  return [
    ...(await checkBalances(scope, books, today)),
    depositsByJob(books),
    none('every entry balances by itself', unbalancedEntries(books)),
    none(
      'every invoice adds up',
      books.invoices.flatMap((invoice) => wrongSums(invoice, books)),
    ),
    none('every invoice is what its lines come to', await wrongLines(scope, books)),
    none('numbers have no gap', gaps(books.invoices.flatMap(({ number }) => number ?? []))),
  ];
}

async function checkBalances(scope: ShopScope, books: Books, today: DateText): Promise<Finding[]> {
  const { invoices, payments } = books;
  const trial = await readTrialBalance(scope, today);
  const balance = (account: AccountCode) => readBalance(scope, account);
  const owed = sumCents(invoices.map(({ balanceCents }) => balanceCents));
  const moneyBy = (card: boolean) =>
    sumCents(
      payments.filter(({ method }) => (method === 'card') === card).map(({ amountCents }) => amountCents),
    );
  return [
    same('debits are credits', trial.debitCents, trial.creditCents),
    same('receivables are what is open on invoices', await balance(ACCOUNTS.accountsReceivable), owed),
    same('the aging adds up to it', (await readAging(scope, today)).totals.totalCents, owed),
    same('so does the head of the list', (await readTotals(scope, {}, today)).aging.totalCents, owed),
    same('the bank is what was paid and not by card', await balance(ACCOUNTS.cashAndBank), moneyBy(false)),
    same('card clearing is what was paid by card', await balance(ACCOUNTS.cardClearing), moneyBy(true)),
    same(
      'overpayments are what is held for customers',
      await balance(ACCOUNTS.customerOverpayments),
      sumCents(invoices.map(({ overpaidCents }) => overpaidCents)),
    ),
    same(
      'sales and tax are what was billed and earned, less credits',
      (await balance(ACCOUNTS.sales)) +
        (await balance(ACCOUNTS.salesTaxPayable)) -
        (await balance(ACCOUNTS.creditsAndAllowances)),
      sumCents(
        invoices
          .filter(ISSUED)
          .filter((one) => !isUnearned(one))
          .map(({ totalCents, creditedCents }) => totalCents - creditedCents),
      ),
    ),
  ];
}

const isUnearned = ({ kind, depositEarnedOn }: Invoice): boolean =>
  kind === 'deposit' && depositEarnedOn === null;

/** Job by job, so that one job's deposit cannot hide another's. */
function depositsByJob({ invoices, lines }: Books): Finding {
  const jobIds = new Set(invoices.flatMap(({ jobId }) => jobId ?? []));
  const wrong = [...jobIds].flatMap((jobId) => {
    const held = sumCents(
      lines
        .filter((line) => line.jobId === jobId && line.account === ACCOUNTS.customerDeposits)
        .map(({ side, amountCents }) => (side === 'credit' ? amountCents : -amountCents)),
    );
    const unearned = sumCents(
      invoices
        .filter((invoice) => invoice.jobId === jobId && ISSUED(invoice) && isUnearned(invoice))
        .map(({ totalCents, creditedCents }) => totalCents - creditedCents),
    );
    return held === unearned ? [] : [`job ${jobId}: ${held} is held, ${unearned} is not earned`];
  });
  return none('deposits are what is not earned yet, job by job', wrong);
}

function unbalancedEntries({ lines }: Books): string[] {
  const sums = new Map<number, number>();
  for (const { entryNumber, side, amountCents } of lines)
    sums.set(entryNumber, (sums.get(entryNumber) ?? 0) + (side === 'debit' ? amountCents : -amountCents));
  return [...sums].filter(([, sum]) => sum !== 0).map(([number, sum]) => `entry ${number} is off by ${sum}`);
}

function wrongSums(invoice: Invoice, { payments, notes }: Books): string[] {
  const { id, number, netCents, taxCents, totalCents, paidCents, creditedCents, balanceCents } = invoice;
  const of = (row: { invoiceId: string }) => row.invoiceId === id;
  const applied = sumCents(payments.filter(of).map(({ appliedCents }) => appliedCents));
  const credited = sumCents(notes.filter(of).map(({ amountCents }) => amountCents));
  const left = invoice.status === 'draft' ? 0 : totalCents - paidCents - creditedCents;
  const fits = netCents + taxCents === totalCents && applied === paidCents && credited === creditedCents;
  return fits && left === balanceCents ? [] : [`invoice ${number ?? id}`];
}

async function wrongLines(scope: ShopScope, { invoices }: Books): Promise<string[]> {
  const lines = await scope.rows(InvoiceLine).findBy({}, 'id');
  const sumOf = (invoiceId: string) =>
    sumCents(lines.filter((line) => line.invoiceId === invoiceId).map(({ amountCents }) => amountCents));
  return invoices
    .filter(({ id, netCents }) => sumOf(id) !== netCents)
    .map(({ id, number }) => `invoice ${number ?? id}`);
}

function gaps(numbers: readonly number[]): string[] {
  const sorted = [...numbers].sort((one, other) => one - other);
  return sorted
    .slice(1)
    .flatMap((number, index) => (number === sorted[index]! + 1 ? [] : [`before ${number}`]));
}
