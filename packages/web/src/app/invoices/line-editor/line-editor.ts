import { ChangeDetectionStrategy, Component, ElementRef, inject, input } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule, type FormArray } from '@angular/forms';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatIcon } from '@angular/material/icon';
import { MatInput } from '@angular/material/input';
import { extend } from '@bookmatch/common/money/cents';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { MoneyInput } from '../../ui/money-input/money-input';
import { lineForm, type LineForm } from '../invoice-form/invoice-form-group';

/** The lines of a free draft, each with what it comes to while it is typed. */
@Component({
  selector: 'bm-line-editor',
  imports: [
    ErrorOf,
    MatButton,
    MatCheckbox,
    MatError,
    MatFormField,
    MatIcon,
    MatIconButton,
    MatInput,
    MatLabel,
    MoneyInput,
    MoneyPipe,
    ReactiveFormsModule,
  ],
  templateUrl: './line-editor.html',
  styleUrl: './line-editor.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LineEditor {
  readonly lines = input.required<FormArray<LineForm>>();

  private readonly builder = inject(NonNullableFormBuilder);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  protected amountOf(line: LineForm): number | null {
    const { quantity, unitPriceCents } = line.getRawValue();
    if (unitPriceCents === null || !/^\d{1,9}(\.\d+)?$/.test(quantity.trim())) return null;
    return extend(quantity.trim(), unitPriceCents);
  }

  protected add(): void {
    const lines = this.lines();
    lines.push(lineForm(this.builder));
    lines.markAsDirty();
    // The new line is drawn after this turn.
    setTimeout(() => [...this.host.querySelectorAll<HTMLElement>('.description')].at(-1)?.focus());
  }

  protected remove(index: number): void {
    this.lines().removeAt(index);
    this.lines().markAsDirty();
  }
}
