import { formatDate } from '@bookmatch/common/calendar/format';
import { formatAmount, formatMoney } from '@bookmatch/common/money/format';
import type { Content } from 'pdfmake/interfaces.js';
import { ROWS, TOTALS } from '../../platform/documents/document-style.js';
import { addressLines, type Fact } from '../../platform/documents/letterhead.js';
import type { InvoiceLine } from './invoice-line.entity.js';
import type { IssuedFrame } from './issued-frame.js';

export type Total = { label: string; cents: number };

/** Whom a document is for, as on an envelope. */
export function recipientOf({ customer }: IssuedFrame): string[] {
  const address = addressLines(customer.address);
  return [customer.name, customer.company, ...address].filter(Boolean);
}

/** The facts at the head that every document of an invoice has, empty ones left out. */
export function factsOf(facts: Record<string, string | null>): Fact[] {
  return Object.entries(facts).flatMap(([label, value]) => (value ? [{ label, value }] : []));
}

export function jobFact({ job }: IssuedFrame): string | null {
  return job && `${job.number}, ${job.title}`;
}

export const dayOf = (date: string | null): string | null => date && formatDate(date);

export function linesTable(lines: readonly InvoiceLine[], currency: string): Content {
  const head = ['Description', 'Quantity', 'Unit price', `Amount (${currency})`];
  return {
    layout: ROWS,
    table: {
      headerRows: 1,
      dontBreakRows: true,
      widths: ['*', 50, 72, 84],
      body: [
        head.map((text, index) => ({ text, style: 'columnHead', ...figures(index) })),
        ...lines.map((line) =>
          [
            line.description,
            line.quantity,
            formatAmount(line.unitPriceCents),
            formatAmount(line.amountCents),
          ].map((text, index) => ({ text, ...figures(index) })),
        ),
      ],
    },
  };
}
const figures = (index: number) => (index === 0 ? {} : { alignment: 'right' as const });

/** Amounts under each other at the right; the last is the one that counts. */
export function totalsTable(totals: readonly Total[], currency: string): Content {
  const last = totals.length - 1;
  return {
    margin: [0, 12, 0, 0],
    columns: [
      { width: '*', text: '' },
      {
        width: 220,
        layout: TOTALS,
        unbreakable: true,
        table: {
          widths: ['*', 'auto'],
          body: totals.map(({ label, cents }, index) => {
            const style = index === last ? { style: 'total' } : {};
            return [
              { text: label, ...style },
              { text: formatMoney(cents, currency), alignment: 'right', ...style },
            ];
          }),
        },
      },
    ],
  };
}

export function paragraph(text: string): Content[] {
  return text ? [{ text, margin: [0, 18, 0, 0] }] : [];
}
