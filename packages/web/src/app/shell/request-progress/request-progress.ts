import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { MatProgressBar } from '@angular/material/progress-bar';
import { of, switchMap, timer, map } from 'rxjs';
import { RequestsInFlight } from '../../platform/api/requests-in-flight';

const PATIENCE_MS = 800;

/** A bar along the top for whatever takes longer than a moment; quick answers never flash it. */
@Component({
  selector: 'bm-request-progress',
  imports: [MatProgressBar],
  template: `
    @if (shown()) {
      <mat-progress-bar mode="indeterminate" aria-label="Working" />
    }
  `,
  styles: ':host { position: fixed; z-index: 1200; inset: 0 0 auto; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RequestProgress {
  protected readonly shown = toSignal(
    toObservable(inject(RequestsInFlight).any).pipe(
      switchMap((any) => (any ? timer(PATIENCE_MS).pipe(map(() => true)) : of(false))),
    ),
    { initialValue: false },
  );
}
