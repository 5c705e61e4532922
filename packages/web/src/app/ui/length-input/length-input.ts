import { Directive, ElementRef, forwardRef, inject, signal } from '@angular/core';
import {
  NG_VALIDATORS,
  NG_VALUE_ACCESSOR,
  type ControlValueAccessor,
  type ValidationErrors,
  type Validator,
} from '@angular/forms';
import { formatLength } from '@bookmatch/common/measure/format-length';
import { storedMillimeters } from '@bookmatch/common/measure/length';
import { parseLength } from '@bookmatch/common/measure/parse-length';
import { SHOP_UNITS } from '../formats/shop-settings';

/**
 * A length in a text field: `<input matInput bmLengthInput #width="bmLengthInput" formControlName="widthMm" />` holds
 * millimeters as the decimal text that is stored, or null. Takes what a maker types and, when left, writes it in the
 * shop's unit; `<mat-hint>{{ width.echo() }}</mat-hint>` shows it while typing.
 */
@Directive({
  selector: 'input[bmLengthInput]',
  exportAs: 'bmLengthInput',
  providers: [
    { provide: NG_VALUE_ACCESSOR, useExisting: forwardRef(() => LengthInput), multi: true },
    { provide: NG_VALIDATORS, useExisting: forwardRef(() => LengthInput), multi: true },
  ],
  host: { autocomplete: 'off', '(input)': 'read()', '(blur)': 'settle()' },
})
export class LengthInput implements ControlValueAccessor, Validator {
  private readonly input = inject<ElementRef<HTMLInputElement>>(ElementRef).nativeElement;
  private readonly units = inject(SHOP_UNITS);
  private readonly shown = signal('');
  /** What was typed, in the shop's unit; `about` when no mark of the rule is exactly there. */
  readonly echo = this.shown.asReadonly();

  private problem: string | null = null;
  private onChange: (millimeters: string | null) => void = () => undefined;
  private onTouched: () => void = () => undefined;
  private onValidity: () => void = () => undefined;

  writeValue(millimeters: string | null): void {
    this.problem = null;
    this.input.value = millimeters === null ? '' : formatLength(millimeters, this.units()).text;
    this.shown.set('');
  }

  registerOnChange(onChange: (millimeters: string | null) => void): void {
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
    this.shown.set('problem' in reading ? '' : echoOf(reading.shown));
    this.onChange('problem' in reading ? null : reading.stored);
    this.onValidity();
  }

  /** Text that the rule cannot show exactly stays as it was typed. */
  protected settle(): void {
    const reading = this.reading();
    if (!('problem' in reading) && reading.shown?.exact !== false) this.writeValue(reading.stored);
    this.onTouched();
  }

  private reading() {
    if (this.input.value.trim() === '') return { stored: null, shown: null };
    const reading = parseLength(this.input.value, this.units());
    if ('problem' in reading) return reading;
    return {
      stored: storedMillimeters(reading.millimeters),
      shown: formatLength(reading.millimeters, this.units()),
    };
  }
}

function echoOf(shown: { text: string; exact: boolean } | null): string {
  if (!shown) return '';
  return shown.exact ? shown.text : `about ${shown.text}`;
}
