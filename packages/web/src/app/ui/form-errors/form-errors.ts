import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  ElementRef,
  inject,
  Injector,
  input,
} from '@angular/core';
import type { AbstractControl } from '@angular/forms';
import type { Problem } from '@bookmatch/common/problems/problem';
import { ProblemNote } from '../problem-note/problem-note';
import { placeFieldProblems } from './field-problems';

/**
 * Shows the server's refusal of a form: each field's sentence at its field, the rest here, read out. Stands inside its
 * `<form>` and moves the focus to the first field that needs correcting, or itself into view.
 */
@Component({
  selector: 'bm-form-errors',
  imports: [ProblemNote],
  template: `
    @if (problem(); as refused) {
      <bm-problem-note [problem]="refused" />
    }
  `,
  styles: ':host:not([hidden]) { display: block; margin-bottom: 16px; }',
  host: { '[hidden]': '!problem()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FormErrors {
  readonly form = input.required<AbstractControl>();
  readonly problem = input<Problem | null>(null);
  protected readonly fields = computed(() => this.problem()?.fields ?? []);

  constructor() {
    const host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
    const injector = inject(Injector);
    effect(() => {
      placeFieldProblems(this.form(), this.fields());
      if (!this.problem()) return;
      afterNextRender(
        () =>
          this.fields().length > 0 ? focusFirstInvalid(host) : host.scrollIntoView?.({ block: 'center' }),
        { injector },
      );
    });
  }
}

/** @param within the form element or anything inside it */
export function focusFirstInvalid(within: Element): void {
  const form = within.closest('form') ?? within;
  form.querySelector<HTMLElement>('input.ng-invalid, textarea.ng-invalid, mat-select.ng-invalid')?.focus();
}
