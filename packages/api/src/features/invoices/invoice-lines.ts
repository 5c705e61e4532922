import { priceInvoiceLines } from '@bookmatch/common/invoices/invoice-totals';
import type { InvoiceLine as TypedLine } from '@bookmatch/common/invoices/invoices-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict } from '../../platform/http/problem-error.js';
import { InvoiceLine } from './invoice-line.entity.js';

/**
 * Makes the lines of a draft what was typed: kept ones are changed, missing ones removed, new ones added. Answers whether
 * anything was written.
 */
export async function saveLines(
  scope: ShopScope,
  invoiceId: string,
  typed: readonly TypedLine[],
): Promise<boolean> {
  const rows = scope.rows(InvoiceLine);
  const stored = await rows.findBy({ invoiceId });
  await refuseForeignIds(scope, invoiceId, typed);
  const wanted = priceInvoiceLines(typed).map((line, position) => ({ ...line, position }));
  let written = false;
  for (const row of stored) {
    const line = wanted.find(({ id }) => id === row.id);
    if (!line) await rows.delete(row);
    // A row in which nothing differs comes back as it is.
    written = !line || (await rows.update(row, withoutId(line))) !== row || written;
  }
  const known = new Set(stored.map(({ id }) => id));
  const added = wanted.filter(({ id }) => !known.has(id)).map((line) => ({ ...line, invoiceId }));
  await rows.insertMany(added);
  return written || added.length > 0;
}

/** A client makes the ids of new lines; one that belongs to another invoice is a mistake, not a move. */
async function refuseForeignIds(
  scope: ShopScope,
  invoiceId: string,
  typed: readonly TypedLine[],
): Promise<void> {
  const found = await scope.rows(InvoiceLine).findBy({ id: typed.map(({ id }) => id) });
  if (found.some((row) => row.invoiceId !== invoiceId))
    throw conflict('One of these lines belongs to another invoice. Add it as a new line.');
}

function withoutId<Line extends { id: string }>({ id: _, ...rest }: Line): Omit<Line, 'id'> {
  return rest;
}
