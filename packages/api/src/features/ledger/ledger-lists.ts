import type {
  EntryKind,
  EntrySource,
  LedgerEntry as LedgerEntryView,
  LedgerListQuery,
} from '@bookmatch/common/ledger/ledger-contract';
import type { Page } from '@bookmatch/common/wire/list';
import type { ShopQuery } from '../../platform/database/shop-query.js';
import type { ShopScope } from '../../platform/database/scope.js';
import { keysetPage, likePattern } from '../../platform/http/keyset.js';
import { LedgerEntry } from './ledger-entry.entity.js';
import { LedgerLine } from './ledger-line.entity.js';

type StoredEntry = {
  id: string;
  number: number;
  on: string;
  kind: EntryKind;
  memo: string;
  sourceKind: EntrySource['kind'];
  sourceId: string;
  invoiceId: string;
  createdAt: Date;
};

/** The entries with their lines, the newest first. */
export async function listEntries(
  scope: ShopScope,
  request: LedgerListQuery,
): Promise<Page<LedgerEntryView>> {
  const columns = { id: 'entry.id', sorts: { number: 'entry.number' }, standard: '-number' } as const;
  const page = await keysetPage<StoredEntry, 'number'>(entriesQuery(scope, request), columns, request);
  const lines = await linesOf(
    scope,
    page.rows.map(({ id }) => id),
  );
  return { ...page, rows: page.rows.map((entry) => viewEntry(entry, lines)) };
}

export async function readEntry(scope: ShopScope, id: string): Promise<LedgerEntryView> {
  const { postedOn, ...entry } = await scope.rows(LedgerEntry).get(id);
  return viewEntry({ ...entry, on: postedOn }, await linesOf(scope, [id]));
}

function entriesQuery(scope: ShopScope, request: LedgerListQuery): ShopQuery {
  const query = scope.query(LedgerEntry, 'entry').pick({
    id: 'entry.id',
    number: 'entry.number',
    on: 'entry.postedOn',
    kind: 'entry.kind',
    memo: 'entry.memo',
    sourceKind: 'entry.sourceKind',
    sourceId: 'entry.sourceId',
    invoiceId: 'entry.invoiceId',
    createdAt: 'entry.createdAt',
  });
  if (request.q) query.where('entry.memo like :q', { q: likePattern(request.q) });
  if (request.kind) query.where('entry.kind = :kind', { kind: request.kind });
  if (request.from) query.where('entry.postedOn >= :from', { from: request.from });
  if (request.to) query.where('entry.postedOn <= :to', { to: request.to });
  const { customerId, jobId, invoiceId } = request;
  if (invoiceId) query.where('entry.invoiceId = :invoiceId', { invoiceId });
  if (customerId) query.where(hasLine('customer_id = :customerId'), { customerId });
  if (jobId) query.where(hasLine('job_id = :jobId'), { jobId });
  return query;
}

const hasLine = (condition: string) =>
  `exists (select 1 from ledger_line of_entry where of_entry.shop_id = entry.shop_id and of_entry.entry_id = entry.id and of_entry.${condition})`;

function linesOf(scope: ShopScope, entryIds: readonly string[]): Promise<LedgerLine[]> {
  return scope.rows(LedgerLine).findBy({ entryId: entryIds }, 'position');
}

function viewEntry(entry: StoredEntry, lines: readonly LedgerLine[]): LedgerEntryView {
  const { sourceKind, sourceId, ...rest } = entry;
  return {
    ...rest,
    createdAt: entry.createdAt.toISOString(),
    source: { kind: sourceKind, id: sourceId },
    lines: lines.filter(({ entryId }) => entryId === entry.id),
  };
}
