import { Directive, ElementRef, forwardRef, inject } from '@angular/core';
import {
  NG_VALIDATORS,
  NG_VALUE_ACCESSOR,
  type ControlValueAccessor,
  type ValidationErrors,
  type Validator,
} from '@angular/forms';
import { percentToRate, rateToPercent } from '@bookmatch/common/money/percent';

/**
 * A rate in a text field: `<input matInput bmPercentInput formControlName="defaultTaxRate">` holds the decimal fraction in
 * text (`"0.0825"`), takes and writes percents (`8.25`). The sign stands beside it, as `<span matTextSuffix>%</span>`.
 */
@Directive({
  selector: 'input[bmPercentInput]',
  providers: [
    { provide: NG_VALUE_ACCESSOR, useExisting: forwardRef(() => PercentInput), multi: true },
    { provide: NG_VALIDATORS, useExisting: forwardRef(() => PercentInput), multi: true },
  ],
  host: {
    inputmode: 'decimal',
    autocomplete: 'off',
    '[style.text-align]': '"end"',
    '(input)': 'read()',
    '(blur)': 'settle()',
  },
})
export class PercentInput implements ControlValueAccessor, Validator {
  private readonly input = inject<ElementRef<HTMLInputElement>>(ElementRef).nativeElement;
  private problem: string | null = null;
  private onChange: (rate: string) => void = () => undefined;
  private onTouched: () => void = () => undefined;
  private onValidity: () => void = () => undefined;

  writeValue(rate: string | null): void {
    this.problem = null;
    this.input.value = rate ? rateToPercent(rate) : '';
  }

  registerOnChange(onChange: (rate: string) => void): void {
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
    const reading = percentToRate(this.input.value);
    this.problem = 'problem' in reading ? reading.problem : null;
    this.onChange('problem' in reading ? '' : reading.rate);
    this.onValidity();
  }

  protected settle(): void {
    const reading = percentToRate(this.input.value);
    if (!('problem' in reading)) this.writeValue(reading.rate);
    this.onTouched();
  }
}
