import { inject, Pipe, type PipeTransform } from '@angular/core';
import { dateText, type DateStyle } from './date-text';
import { SHOP_ZONE } from './shop-settings';

/** `{{ lead.createdAt | dateText }}`, in the shop's zone. */
@Pipe({ name: 'dateText' })
export class DateTextPipe implements PipeTransform {
  private readonly zone = inject(SHOP_ZONE);

  transform(value: string | null | undefined, style: DateStyle = 'day'): string {
    return value ? dateText(value, this.zone(), style, new Date()) : '';
  }
}
