import { CHART_OF_ACCOUNTS, type AccountCode } from '@bookmatch/common/ledger/chart-of-accounts';
import type { EntryKind } from '@bookmatch/common/ledger/ledger-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { amountCell, csvDownload, EXPORT_BATCH, everyRow } from '../../platform/http/csv-download.js';
import { keysetPage } from '../../platform/http/keyset.js';
import type { Download } from '../../platform/http/route.js';
import { Customer } from '../customers/customers-public.js';
import { Job } from '../jobs/jobs-public.js';
import { LedgerEntry } from './ledger-entry.entity.js';
import { LedgerLine } from './ledger-line.entity.js';

type ExportedLine = {
  id: string;
  entryNumber: number;
  on: string;
  kind: EntryKind;
  memo: string;
  account: AccountCode;
  side: 'debit' | 'credit';
  amountCents: number;
  customerName: string | null;
  jobNumber: number | null;
};
type Period = { from?: string | undefined; to?: string | undefined };

/** Every line of the ledger in order, one row each, the way another bookkeeping program takes it over. */
export function exportLedger(scope: ShopScope, period: Period): Download {
  return csvDownload<ExportedLine>(
    'ledger',
    {
      Entry: (line) => line.entryNumber,
      Date: (line) => line.on,
      Kind: (line) => line.kind,
      Memo: (line) => line.memo,
      Account: (line) => line.account,
      'Account name': (line) => NAMES.get(line.account) ?? '',
      Debit: (line) => (line.side === 'debit' ? amountCell(line.amountCents) : null),
      Credit: (line) => (line.side === 'credit' ? amountCell(line.amountCents) : null),
      Customer: (line) => line.customerName,
      Job: (line) => line.jobNumber,
    },
    everyRow((after) => pageOf(scope, period, after)),
  );
}
const NAMES = new Map(CHART_OF_ACCOUNTS.map(({ code, name }) => [code, name]));

function pageOf(scope: ShopScope, { from, to }: Period, after: { after?: string }) {
  const query = scope
    .query(LedgerLine, 'line')
    .join(LedgerEntry, 'entry', 'entry.id = line.entryId')
    .leftJoin(Customer, 'customer', 'customer.id = line.customerId')
    .leftJoin(Job, 'job', 'job.id = line.jobId')
    .pick({
      id: 'line.id',
      entryNumber: 'line.entryNumber',
      on: 'line.postedOn',
      kind: 'entry.kind',
      memo: 'entry.memo',
      account: 'line.account',
      side: 'line.side',
      amountCents: 'line.amountCents',
      customerName: 'customer.name',
      jobNumber: 'job.number',
    });
  if (from) query.where('line.postedOn >= :from', { from });
  if (to) query.where('line.postedOn <= :to', { to });
  const columns = { id: 'line.id', sorts: { number: 'line.entryNumber' }, standard: 'number' } as const;
  return keysetPage<ExportedLine, 'number'>(query, columns, { ...after, limit: EXPORT_BATCH });
}
