import type { AcceptedDocument } from '@bookmatch/common/estimates/accepted-document-contract';
import { BILLING_DUE_WORDS, taxWords } from '@bookmatch/common/estimates/tax-words';
import { formatAmount, formatMoney } from '@bookmatch/common/money/format';
import type { Content, TableCell } from 'pdfmake/interfaces.js';
import { ROWS, TOTALS } from '../../platform/documents/document-style.js';

/** The body of an estimate on paper: what, for how much, when paid. Made from the customer's document alone. */
export function pricePages(document: AcceptedDocument): Content[] {
  return [
    { text: document.title, style: 'title', margin: [0, 0, 0, 6] },
    ...paragraph('', document.intro),
    ...document.rooms.map(roomTable),
    totalsTable(document),
    scheduleTable(document),
    ...paragraph('Not included', document.exclusions),
    ...paragraph('Terms', document.terms),
  ];
}

function roomTable(room: AcceptedDocument['rooms'][number]): Content {
  return {
    margin: [0, 0, 0, 6],
    stack: [
      { text: room.name, style: 'heading' },
      {
        layout: ROWS,
        table: {
          headerRows: 1,
          keepWithHeaderRows: 1,
          dontBreakRows: true,
          widths: ['*', 70, 70, 76],
          body: [
            [head('Item'), head('Quantity', true), head('Unit price', true), head('Amount', true)],
            ...room.lines.map((line) => [
              line.description,
              figure(`${line.quantity} ${line.unit}`),
              figure(formatAmount(line.unitPriceCents)),
              figure(formatAmount(line.amountCents)),
            ]),
            [
              { text: room.name, colSpan: 3, bold: true },
              '',
              '',
              figure(formatAmount(room.amountCents), true),
            ],
          ],
        },
      },
    ],
  };
}

function totalsTable(document: AcceptedDocument): Content {
  const tax = taxWords(document);
  const money = (cents: number) => formatMoney(cents, document.currency);
  const discounted = document.discountCents !== 0;
  const rows: [string, string][] = [
    ['Subtotal', money(document.subtotalCents)],
    ...(discounted ? [['Discount', money(-document.discountCents)] satisfies [string, string]] : []),
    ...(discounted ? [['Price before tax', money(document.netCents)] satisfies [string, string]] : []),
    ...(tax.label === null ? [] : [[tax.label, money(document.taxCents)] satisfies [string, string]]),
  ];
  return {
    unbreakable: true,
    margin: [0, 10, 0, 0],
    stack: [
      {
        columns: [
          { width: '*', text: '' },
          {
            width: 250,
            layout: TOTALS,
            table: {
              widths: ['*', 'auto'],
              body: [
                ...rows.map(([label, amount]) => [label, figure(amount)]),
                [
                  { text: 'Total', style: 'total' },
                  { text: money(document.totalCents), style: 'total', alignment: 'right' },
                ],
              ],
            },
          },
        ],
      },
      { text: tax.note, style: 'small', alignment: 'right', margin: [0, 4, 0, 0] },
    ],
  };
}

function scheduleTable({ billingSchedule, currency }: AcceptedDocument): Content {
  return {
    unbreakable: true,
    stack: [
      { text: 'When it is paid', style: 'heading' },
      {
        layout: ROWS,
        table: {
          headerRows: 1,
          widths: ['*', 150, 100],
          body: [
            [head('Stage'), head('Billed'), head('Amount with tax', true)],
            ...billingSchedule.map((stage) => [
              stage.name,
              BILLING_DUE_WORDS[stage.due],
              figure(formatMoney(stage.totalCents, currency)),
            ]),
          ],
        },
      },
    ],
  };
}

function paragraph(heading: string, text: string): Content[] {
  if (text === '') return [];
  return [...(heading === '' ? [] : [{ text: heading, style: 'heading' }]), { text, margin: [0, 0, 0, 6] }];
}

function head(text: string, right = false): TableCell {
  return { text, style: 'columnHead', ...(right ? { alignment: 'right' as const } : {}) };
}

function figure(text: string, bold = false): TableCell {
  return { text, alignment: 'right', bold };
}
