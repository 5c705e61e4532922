import { inject, Pipe, type PipeTransform } from '@angular/core';
import type { Cents } from '@bookmatch/common/money/cents';
import { moneyText, type MoneyStyle } from './money-text';
import { SHOP_CURRENCY } from './shop-settings';

/** `{{ job.priceCents | money }}`, in the shop's currency; nothing for an amount that is not there. */
@Pipe({ name: 'money' })
export class MoneyPipe implements PipeTransform {
  private readonly currency = inject(SHOP_CURRENCY);

  transform(cents: Cents | null | undefined, style: MoneyStyle = 'exact'): string {
    return cents === null || cents === undefined ? '' : moneyText(cents, this.currency(), style);
  }
}
