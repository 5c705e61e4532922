import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { ReactiveFormsModule, type FormControl } from '@angular/forms';
import type { EstimateTotals, RevisionContent } from '@bookmatch/common/estimates/revision-contract';
import { taxWords } from '@bookmatch/common/estimates/tax-words';
import { formatRate } from '@bookmatch/common/money/format';
import { DurationPipe } from '../../ui/formats/duration.pipe';
import { moneyText } from '../../ui/formats/money-text';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { SHOP_CURRENCY } from '../../ui/formats/shop-settings';
import { MoneyInput } from '../../ui/money-input/money-input';
import { Panel } from '../../ui/panel/panel';
import { Working, type WorkingLine } from '../../ui/working/working';
import { costRows, roomParts, taxableParts, type PricePart } from '../draft/price-rows';

/** The price from its cost upward. Every figure opens what it is made of. */
@Component({
  selector: 'bm-price-panel',
  imports: [DurationPipe, MoneyInput, MoneyPipe, Panel, ReactiveFormsModule, Working],
  templateUrl: './price-panel.html',
  styleUrl: './price-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PricePanel {
  readonly content = input.required<RevisionContent>();
  readonly totals = input.required<EstimateTotals>();
  /** Given while the draft is edited. */
  readonly discount = input<FormControl<number | null> | null>(null);

  private readonly currency = inject(SHOP_CURRENCY);

  protected readonly costs = computed(() =>
    costRows(this.content()).map((row) => ({ ...row, lines: this.linesOf(row.parts) })),
  );
  protected readonly costLines = computed(() =>
    this.linesOf(this.costs().map(({ name, cents }) => ({ name, note: '', cents }))),
  );
  protected readonly roomLines = computed(() => this.linesOf(roomParts(this.content())));
  protected readonly marginLines = computed(() => {
    const { netCents, plannedCostCents } = this.totals();
    return this.linesOf([
      { name: 'Price before tax', note: '', cents: netCents },
      { name: 'Cost', note: '', cents: -plannedCostCents },
    ]);
  });
  protected readonly tax = computed(() => {
    const { taxRule, taxRate } = this.content();
    return taxWords({
      taxRule,
      taxRate,
      taxableCents: this.totals().taxableCents,
      currency: this.currency(),
    });
  });
  protected readonly taxLines = computed((): WorkingLine[] => [
    ...this.linesOf(taxableParts(this.content())),
    { name: 'Taxable', note: '', figure: this.money(this.totals().taxableCents) },
    { name: 'Rate', note: '', figure: formatRate(this.content().taxRate) },
  ]);
  protected readonly priceLines = computed(() => {
    const { subtotalCents, discountCents, taxCents } = this.totals();
    return this.linesOf([
      { name: 'Rooms', note: '', cents: subtotalCents },
      ...(discountCents === 0 ? [] : [{ name: 'Discount', note: '', cents: -discountCents }]),
      { name: 'Sales tax', note: '', cents: taxCents },
    ]);
  });
  protected readonly shares = computed(() => {
    const { margin, markup } = this.totals();
    return [margin && formatRate(margin, 1), markup && `markup ${formatRate(markup, 1)}`]
      .filter(Boolean)
      .join(', ');
  });
  protected readonly money = (cents: number): string => moneyText(cents, this.currency());

  private linesOf(parts: readonly PricePart[]): WorkingLine[] {
    return parts.map(({ name, note, cents }) => ({ name, note, figure: this.money(cents) }));
  }
}
