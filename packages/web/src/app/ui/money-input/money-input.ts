import { Directive, ElementRef, forwardRef, inject } from '@angular/core';
import {
  NG_VALIDATORS,
  NG_VALUE_ACCESSOR,
  type ControlValueAccessor,
  type ValidationErrors,
  type Validator,
} from '@angular/forms';
import type { Cents } from '@bookmatch/common/money/cents';
import { moneyText } from '../formats/money-text';
import { parseMoney } from './parse-money';

/**
 * Money in a text field: `<input matInput bmMoneyInput formControlName="priceCents">` holds whole cents or null, takes
 * `1,250` and `1250.00`, and writes `1,250.00` when left. The currency stands beside it, as `<span matTextPrefix>$</span>`.
 */
@Directive({
  selector: 'input[bmMoneyInput]',
  providers: [
    { provide: NG_VALUE_ACCESSOR, useExisting: forwardRef(() => MoneyInput), multi: true },
    { provide: NG_VALIDATORS, useExisting: forwardRef(() => MoneyInput), multi: true },
  ],
  host: {
    inputmode: 'decimal',
    autocomplete: 'off',
    '[style.text-align]': '"end"',
    '(input)': 'read()',
    '(blur)': 'settle()',
  },
})
export class MoneyInput implements ControlValueAccessor, Validator {
  private readonly input = inject<ElementRef<HTMLInputElement>>(ElementRef).nativeElement;
  private unreadable = false;
  private onChange: (cents: Cents | null) => void = () => undefined;
  private onTouched: () => void = () => undefined;
  private onValidity: () => void = () => undefined;

  writeValue(cents: Cents | null): void {
    this.unreadable = false;
    this.input.value = cents === null ? '' : moneyText(cents, 'bare');
  }

  registerOnChange(onChange: (cents: Cents | null) => void): void {
    this.onChange = onChange;
  }

  registerOnTouched(onTouched: () => void): void {
    this.onTouched = onTouched;
  }

  registerOnValidatorChange(onValidity: () => void): void {
    this.onValidity = onValidity;
  }

  setDisabledState(disabled: boolean): void {
    this.input.disabled = disabled;
  }

  validate(): ValidationErrors | null {
    return this.unreadable ? { problem: 'Give an amount, such as 1,250.00.' } : null;
  }

  protected read(): void {
    const cents = parseMoney(this.input.value);
    this.unreadable = cents === undefined;
    this.onChange(cents ?? null);
    this.onValidity();
  }

  protected settle(): void {
    const cents = parseMoney(this.input.value);
    if (cents !== undefined) this.writeValue(cents);
    this.onTouched();
  }
}
