import {
  INVOICE_KIND_NAMES,
  PAYMENT_KIND_NAMES,
  PAYMENT_METHOD_NAMES,
  standingWords,
} from '@bookmatch/common/invoices/invoice-words';
import { AGING_BUCKETS } from '@bookmatch/common/invoices/aging';
import type { AgingRow } from '@bookmatch/common/invoices/aging-contract';
import type {
  InvoiceListQuery,
  InvoiceRow,
  PaymentListQuery,
  PaymentRow,
} from '@bookmatch/common/invoices/invoices-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { amountCell, csvDownload, EXPORT_BATCH, everyRow } from '../../platform/http/csv-download.js';
import type { Download } from '../../platform/http/route.js';
import { listInvoices } from './invoice-lists.js';
import { listPayments } from './payment-lists.js';
import { readAging } from './receivables.js';

/** The list of invoices as it is filtered and sorted, whole. */
export function exportInvoices(scope: ShopScope, request: InvoiceListQuery): Download {
  return csvDownload<InvoiceRow>(
    'invoices',
    {
      Number: ({ number }) => number,
      Kind: ({ kind }) => INVOICE_KIND_NAMES[kind],
      Standing: ({ standing, daysOverdue }) => standingWords(standing, daysOverdue),
      Customer: ({ customerName }) => customerName,
      Job: ({ jobNumber }) => jobNumber,
      Stage: ({ stageName }) => stageName,
      Issued: ({ issuedOn }) => issuedOn,
      Due: ({ dueOn }) => dueOn,
      Total: ({ totalCents }) => amountCell(totalCents),
      Balance: ({ balanceCents }) => amountCell(balanceCents),
      Overpaid: ({ overpaidCents }) => amountCell(overpaidCents),
    },
    everyRow((after) => listInvoices(scope, { ...request, ...after, limit: EXPORT_BATCH })),
  );
}

/** Money in and money out stand in columns of their own, so that no cell begins with a minus. */
export function exportPayments(scope: ShopScope, request: PaymentListQuery): Download {
  return csvDownload<PaymentRow>(
    'payments',
    {
      Date: ({ receivedOn }) => receivedOn,
      Kind: ({ kind }) => PAYMENT_KIND_NAMES[kind],
      Method: ({ method }) => PAYMENT_METHOD_NAMES[method],
      Invoice: ({ invoiceNumber }) => invoiceNumber,
      Customer: ({ customerName }) => customerName,
      In: ({ amountCents }) => (amountCents > 0 ? amountCell(amountCents) : null),
      Out: ({ amountCents }) => (amountCents < 0 ? amountCell(-amountCents) : null),
      Reference: ({ reference }) => reference,
      Reason: ({ reason }) => reason,
      'Recorded by': ({ recordedBy }) => recordedBy,
    },
    everyRow((after) => listPayments(scope, { ...request, ...after, limit: EXPORT_BATCH })),
  );
}

export function exportAging(scope: ShopScope, on: string): Download {
  const buckets = AGING_BUCKETS.map(({ bucket, name }) => [name, (row: AgingRow) => amountCell(row[bucket])]);
  return csvDownload<AgingRow>(
    `aging-${on}`,
    {
      Customer: ({ customerName }) => customerName,
      ...(Object.fromEntries(buckets) as Record<string, (row: AgingRow) => string>),
      Total: ({ totalCents }) => amountCell(totalCents),
    },
    rowsOf(async () => (await readAging(scope, on)).rows),
  );
}

async function* rowsOf<Row>(read: () => Promise<Row[]>): AsyncGenerator<Row> {
  yield* await read();
}
