import { Directive, ElementRef, forwardRef, inject } from '@angular/core';
import {
  NG_VALIDATORS,
  NG_VALUE_ACCESSOR,
  type ControlValueAccessor,
  type ValidationErrors,
  type Validator,
} from '@angular/forms';
import type { Cents } from '@bookmatch/common/money/cents';
import { formatAmount } from '@bookmatch/common/money/format';
import { parseMoney } from '@bookmatch/common/money/parse';

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
  private problem: string | null = null;
  private onChange: (cents: Cents | null) => void = () => undefined;
  private onTouched: () => void = () => undefined;
  private onValidity: () => void = () => undefined;

  writeValue(cents: Cents | null): void {
    this.problem = null;
    this.input.value = cents === null ? '' : formatAmount(cents);
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
    return this.problem === null ? null : { problem: this.problem };
  }

  protected read(): void {
    const reading = this.reading();
    this.problem = 'problem' in reading ? reading.problem : null;
    this.onChange('problem' in reading ? null : reading.cents);
    this.onValidity();
  }

  protected settle(): void {
    const reading = this.reading();
    if (!('problem' in reading)) this.writeValue(reading.cents);
    this.onTouched();
  }

  /** An empty field is no amount; whether one is needed is for the form to say. */
  private reading(): { cents: Cents | null } | { problem: string } {
    return this.input.value.trim() === '' ? { cents: null } : parseMoney(this.input.value);
  }
}
