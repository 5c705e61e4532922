import { accountBalance } from '@bookmatch/common/ledger/balance';
import { CHART_OF_ACCOUNTS, type AccountCode } from '@bookmatch/common/ledger/chart-of-accounts';
import type {
  AccountActivity,
  AccountActivityQuery,
  AccountActivityRow,
  EntryKind,
  EntrySource,
} from '@bookmatch/common/ledger/ledger-contract';
import type { ShopQuery } from '../../platform/database/shop-query.js';
import type { ShopScope } from '../../platform/database/scope.js';
import { keysetPage } from '../../platform/http/keyset.js';
import { notFound } from '../../platform/http/problem-error.js';
import { LedgerEntry } from './ledger-entry.entity.js';
import { LedgerLine } from './ledger-line.entity.js';
import { readBalance } from './ledger-sums.js';

type StoredRow = {
  id: string;
  entryId: string;
  entryNumber: number;
  on: string;
  kind: EntryKind;
  memo: string;
  sourceKind: EntrySource['kind'];
  sourceId: string;
  invoiceId: string;
  side: 'debit' | 'credit';
  amountCents: number;
};

/** What happened on one account, with the balance after each line. */
export async function accountActivity(
  scope: ShopScope,
  account: AccountCode,
  request: AccountActivityQuery,
): Promise<AccountActivity> {
  const known = CHART_OF_ACCOUNTS.find(({ code }) => code === account);
  if (!known) throw notFound('This account');
  const page = await keysetPage<StoredRow, 'number'>(linesOf(scope, account, request), COLUMNS, request);
  const { from, to } = request;
  const upTo = (sql: string, date: string) =>
    readBalance(scope, account, (query) => {
      narrowToCustomer(query, request);
      query.where(sql, { date });
    });
  const openingBalanceCents = from ? await upTo('line.postedOn < :date', from) : 0;
  const closingBalanceCents = await upTo('line.postedOn <= :date', to ?? '9999-12-31');
  const before = await balanceBefore(scope, account, request, page.rows[0]);
  return {
    ...page,
    rows: withBalances(account, openingBalanceCents + before, page.rows, request.sort === '-number'),
    account,
    name: known.name,
    normalSide: known.normalSide,
    openingBalanceCents,
    closingBalanceCents,
  };
}

const COLUMNS = { id: 'line.id', sorts: { number: 'line.entryNumber' }, standard: 'number' } as const;

function linesOf(scope: ShopScope, account: AccountCode, request: AccountActivityQuery): ShopQuery {
  const query = scope
    .query(LedgerLine, 'line')
    .join(LedgerEntry, 'entry', 'entry.id = line.entryId')
    .pick({
      id: 'line.id',
      entryId: 'line.entryId',
      entryNumber: 'line.entryNumber',
      on: 'line.postedOn',
      kind: 'entry.kind',
      memo: 'entry.memo',
      sourceKind: 'entry.sourceKind',
      sourceId: 'entry.sourceId',
      invoiceId: 'entry.invoiceId',
      side: 'line.side',
      amountCents: 'line.amountCents',
    })
    .where('line.account = :account', { account });
  narrow(query, request);
  return query;
}

function narrow(query: ShopQuery, request: AccountActivityQuery): void {
  narrowToCustomer(query, request);
  if (request.from) query.where('line.postedOn >= :from', { from: request.from });
  if (request.to) query.where('line.postedOn <= :to', { to: request.to });
}

function narrowToCustomer(query: ShopQuery, { customerId }: AccountActivityQuery): void {
  if (customerId) query.where('line.customerId = :customerId', { customerId });
}

/** What the listed lines that stand before the page's first come to: in a descending list also the first itself. */
async function balanceBefore(
  scope: ShopScope,
  account: AccountCode,
  request: AccountActivityQuery,
  first: StoredRow | undefined,
): Promise<number> {
  if (!first) return 0;
  const sign = request.sort === '-number' ? '<=' : '<';
  return readBalance(scope, account, (query) => {
    narrow(query, request);
    query.where(`line.entryNumber <= :number and (line.entryNumber < :number or line.id ${sign} :first)`, {
      number: first.entryNumber,
      first: first.id,
    });
  });
}

/** @param startCents the balance before the first row, or after it in a descending list */
function withBalances(
  account: AccountCode,
  startCents: number,
  rows: StoredRow[],
  descending: boolean,
): AccountActivityRow[] {
  let balance = startCents;
  return rows.map(({ sourceKind, sourceId, ...row }) => {
    const change =
      row.side === 'debit'
        ? accountBalance(account, row.amountCents, 0)
        : accountBalance(account, 0, row.amountCents);
    if (!descending) balance += change;
    const view = { ...row, source: { kind: sourceKind, id: sourceId }, balanceCents: balance };
    if (descending) balance -= change;
    return view;
  });
}
