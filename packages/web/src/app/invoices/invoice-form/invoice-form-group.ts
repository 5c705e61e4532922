import type { FormArray, NonNullableFormBuilder } from '@angular/forms';
import { invoiceTotals } from '@bookmatch/common/invoices/invoice-totals';
import type { InvoiceLine } from '@bookmatch/common/invoices/invoices-contract';

export type LineForm = ReturnType<typeof lineForm>;
export type InvoiceFormGroup = ReturnType<typeof invoiceForm>;
type LineValue = {
  id: string;
  description: string;
  quantity: string;
  unitPriceCents: number | null;
  taxable: boolean;
};

/** The fields a person types, named as the contract names them, so that the server's sentences find their field. */
export function invoiceForm(builder: NonNullableFormBuilder) {
  return builder.group({
    customerId: '',
    jobId: builder.control<string | null>(null),
    taxRate: '0',
    dueOn: '',
    memo: '',
    lines: builder.array<LineForm>([]) as FormArray<LineForm>,
  });
}

export function lineForm(builder: NonNullableFormBuilder, line: Partial<LineValue> = {}) {
  return builder.group({
    id: line.id ?? crypto.randomUUID(),
    description: line.description ?? '',
    quantity: line.quantity ?? '1',
    unitPriceCents: builder.control<number | null>(line.unitPriceCents ?? null),
    taxable: line.taxable ?? true,
  });
}

/** What the lines come to so far: a line that cannot be read yet counts nothing. */
export function totalsSoFar({ lines, taxRate }: { lines: readonly LineValue[]; taxRate: string }) {
  const readable = lines.filter(
    (line): line is InvoiceLine => line.unitPriceCents !== null && READABLE.test(line.quantity.trim()),
  );
  return invoiceTotals(readable, READABLE.test(taxRate) ? taxRate : '0');
}
const READABLE = /^\d{1,9}(\.\d+)?$/;
