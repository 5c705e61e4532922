import { ChangeDetectorRef, Directive, effect, ElementRef, inject, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import type { AbstractControl } from '@angular/forms';
import { map, startWith, switchMap } from 'rxjs';
import { messageOf } from './field-problems';

/** `<mat-error [bmErrorOf]="form.controls.name" />`: the plain sentence of what is wrong with a field. */
@Directive({ selector: '[bmErrorOf]' })
export class ErrorOf {
  readonly control = input.required<AbstractControl>({ alias: 'bmErrorOf' });

  constructor() {
    const host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
    const message = toSignal(
      toObservable(this.control).pipe(
        switchMap((control) =>
          control.events.pipe(
            startWith(null),
            map(() => messageOf(control)),
          ),
        ),
      ),
      { initialValue: '' },
    );
    const view = inject(ChangeDetectorRef);
    effect(() => {
      host.textContent = message();
      // A field learns of errors set from outside only when the view it stands in is looked at.
      view.markForCheck();
    });
  }
}
