import { Pipe, type PipeTransform } from '@angular/core';
import type { Cents } from '@bookmatch/common/money/cents';
import { moneyText, type MoneyStyle } from './money-text';

/** `{{ job.priceCents | money }}`; nothing for an amount that is not there. */
@Pipe({ name: 'money' })
export class MoneyPipe implements PipeTransform {
  transform(cents: Cents | null | undefined, style: MoneyStyle = 'exact'): string {
    return cents === null || cents === undefined ? '' : moneyText(cents, style);
  }
}
