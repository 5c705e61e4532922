import { Directive, ElementRef, forwardRef, inject } from '@angular/core';
import { NG_VALUE_ACCESSOR, type ControlValueAccessor } from '@angular/forms';

/** `<input type="date" bmDayInput formControlName="installOn">` holds `YYYY-MM-DD`, or null while no day is given. */
@Directive({
  selector: 'input[bmDayInput]',
  providers: [{ provide: NG_VALUE_ACCESSOR, useExisting: forwardRef(() => DayInput), multi: true }],
  host: { '(input)': 'read()', '(blur)': 'onTouched()' },
})
export class DayInput implements ControlValueAccessor {
  private readonly input = inject<ElementRef<HTMLInputElement>>(ElementRef).nativeElement;
  private onChange: (day: string | null) => void = () => undefined;
  protected onTouched: () => void = () => undefined;

  writeValue(day: string | null): void {
    this.input.value = day ?? '';
  }

  registerOnChange(onChange: (day: string | null) => void): void {
    this.onChange = onChange;
  }

  registerOnTouched(onTouched: () => void): void {
    this.onTouched = onTouched;
  }

  setDisabledState(disabled: boolean): void {
    this.input.disabled = disabled;
  }

  protected read(): void {
    this.onChange(this.input.value === '' ? null : this.input.value);
  }
}
