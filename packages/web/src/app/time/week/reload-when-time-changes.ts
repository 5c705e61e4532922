import { inject } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { Actions, ofType } from '@ngrx/effects';
import { ClockApi } from '../state/clock.actions';
import { WeeksApi } from '../state/weeks.actions';

/** While the component lives: reads a week's sums again after something in it was punched or put right. */
export function reloadWhenTimeChanges(load: () => void): void {
  inject(Actions)
    .pipe(ofType(WeeksApi.saved, WeeksApi.voided, ClockApi.punchTaken), takeUntilDestroyed())
    .subscribe(load);
}
