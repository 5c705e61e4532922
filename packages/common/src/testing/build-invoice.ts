import { balanceOf, invoiceStanding } from '../invoices/invoice-standing.js';
import { invoiceTotals, priceInvoiceLines } from '../invoices/invoice-totals.js';
import type { Invoice, InvoiceLine } from '../invoices/invoices-contract.js';
import { MADE_AT, nextId, nextNumber } from './ids.js';

export function buildInvoiceLine(overrides: Partial<InvoiceLine> = {}): InvoiceLine {
  return {
    id: nextId(),
    description: 'Deposit, 40 %',
    quantity: '1',
    unitPriceCents: 400_000,
    taxable: true,
    ...overrides,
  };
}

/**
 * An invoice issued on January 11, 2027, due on the 25th; pass `status: 'draft'` for one without number and dates. Whatever
 * lines and payments are given, the amounts and the standing are those of the rules.
 *
 * @param today the date it stands as of
 */
export function buildInvoice(overrides: Partial<Invoice> = {}, today = '2027-01-11'): Invoice {
  const status = overrides.status ?? 'issued';
  const isDraft = status === 'draft';
  const taxRate = overrides.taxRate ?? '0.0825';
  const lines = overrides.lines ?? priceInvoiceLines([buildInvoiceLine()]);
  const totals = invoiceTotals(lines.map(withoutAmount), taxRate);
  const { paidCents = 0, creditedCents = 0 } = overrides;
  const dueOn = overrides.dueOn ?? (isDraft ? null : '2027-01-25');
  return {
    id: nextId(),
    version: 1,
    number: isDraft ? null : nextNumber('invoice', 2001),
    status,
    ...invoiceStanding(status, paidCents, dueOn, today),
    kind: 'deposit',
    issuedOn: isDraft ? null : '2027-01-11',
    dueOn,
    customer: { id: nextId(), name: 'Wren Halloway', email: 'wren@example.com' },
    job: null,
    billingStage: null,
    lines,
    taxRate,
    ...totals,
    paidCents,
    creditedCents,
    balanceCents: isDraft ? 0 : balanceOf({ totalCents: totals.totalCents, paidCents, creditedCents }),
    overpaidCents: 0,
    memo: '',
    payments: [],
    creditNotes: [],
    sends: [],
    issueRefusals: [],
    createdAt: MADE_AT,
    ...overrides,
  };
}

function withoutAmount({
  id,
  description,
  quantity,
  unitPriceCents,
  taxable,
}: Invoice['lines'][number]): InvoiceLine {
  return { id, description, quantity, unitPriceCents, taxable };
}
