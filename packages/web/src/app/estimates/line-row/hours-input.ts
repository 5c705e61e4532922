import { Directive, ElementRef, forwardRef, inject } from '@angular/core';
import {
  NG_VALIDATORS,
  NG_VALUE_ACCESSOR,
  type ControlValueAccessor,
  type ValidationErrors,
  type Validator,
} from '@angular/forms';
import { hoursToMinutes, minutesToHours } from './hours';

/** Hours in a text field, `1.5`; the control holds exact minutes in text, `"90"`, or null while the field is empty. */
@Directive({
  selector: 'input[bmHoursInput]',
  providers: [
    { provide: NG_VALUE_ACCESSOR, useExisting: forwardRef(() => HoursInput), multi: true },
    { provide: NG_VALIDATORS, useExisting: forwardRef(() => HoursInput), multi: true },
  ],
  host: {
    inputmode: 'decimal',
    autocomplete: 'off',
    '[style.text-align]': '"end"',
    '(input)': 'read()',
    '(blur)': 'onTouched()',
  },
})
export class HoursInput implements ControlValueAccessor, Validator {
  private readonly input = inject<ElementRef<HTMLInputElement>>(ElementRef).nativeElement;
  private problem: string | null = null;
  private onChange: (minutes: string | null) => void = () => undefined;
  private onValidity: () => void = () => undefined;
  protected onTouched: () => void = () => undefined;

  writeValue(minutes: string | null): void {
    this.problem = null;
    this.input.value = minutes === null ? '' : minutesToHours(minutes);
  }

  registerOnChange(onChange: (minutes: string | null) => void): void {
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
    const text = this.input.value.trim();
    const minutes = text === '' ? null : hoursToMinutes(text);
    this.problem = text !== '' && minutes === null ? 'Give hours, such as 1.5.' : null;
    this.onChange(minutes);
    this.onValidity();
  }
}
