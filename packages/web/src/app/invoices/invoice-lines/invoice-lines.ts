import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { Invoice } from '@bookmatch/common/invoices/invoices-contract';
import { formatRate } from '@bookmatch/common/money/format';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { SHOP_CURRENCY } from '../../ui/formats/shop-settings';

/** The lines of an invoice and what they come to, down to what is still owed. */
@Component({
  selector: 'bm-invoice-lines',
  imports: [MoneyPipe],
  templateUrl: './invoice-lines.html',
  styleUrl: './invoice-lines.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InvoiceLines {
  readonly invoice = input.required<Invoice>();
  protected readonly currency = inject(SHOP_CURRENCY);
  protected readonly taxName = computed(() => {
    const { taxRate } = this.invoice();
    if (taxRate === null) return 'Sales tax, as agreed';
    return Number(taxRate) === 0 ? 'Sales tax' : `Sales tax, ${formatRate(taxRate)}`;
  });
  /** With one line and no difference between lines it needs no mark. */
  protected readonly someUntaxed = computed(() => {
    const { lines, taxCents } = this.invoice();
    return taxCents !== 0 && lines.some(({ taxable }) => !taxable);
  });
}
