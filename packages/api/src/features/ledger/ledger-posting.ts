import { assertBalanced } from '@bookmatch/common/ledger/balance';
import type { EntryKind, EntrySource, LedgerLine } from '@bookmatch/common/ledger/ledger-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { lockCounter, takeNumber } from '../shops/shops-public.js';
import { LedgerEntry } from './ledger-entry.entity.js';
import { LedgerLine as LedgerLineRow } from './ledger-line.entity.js';

export type NewEntry = {
  kind: EntryKind;
  /** The day it counts on, `YYYY-MM-DD` in the shop's zone. */
  on: string;
  memo: string;
  source: EntrySource;
  invoiceId: string;
  lines: LedgerLine[];
};

/**
 * The first statement of every act that will write an entry: the money events of one shop happen one after another. They
 * are short and few, and so none of them finds its decision overtaken by another.
 */
export async function openBooks(scope: ShopScope): Promise<void> {
  await lockCounter(scope, 'ledger-entry');
}

/**
 * Writes an entry, in the transaction of what it was made for.
 *
 * @throws RangeError when debits and credits differ: a fault of the program, which undoes the whole transaction
 */
export async function postEntry(scope: ShopScope, entry: NewEntry): Promise<void> {
  const lines = assertBalanced(entry.lines);
  const { id, number } = await scope.rows(LedgerEntry).insert({
    id: scope.newId(),
    number: await takeNumber(scope, 'ledger-entry'),
    postedOn: entry.on,
    kind: entry.kind,
    memo: entry.memo,
    sourceKind: entry.source.kind,
    sourceId: entry.source.id,
    invoiceId: entry.invoiceId,
  });
  await scope.rows(LedgerLineRow).insertMany(
    lines.map((line, position) => ({
      ...line,
      id: scope.newId(),
      entryId: id,
      entryNumber: number,
      position,
      postedOn: entry.on,
    })),
  );
}
