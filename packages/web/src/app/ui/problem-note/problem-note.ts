import { booleanAttribute, ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import type { Problem } from '@bookmatch/common/problems/problem';

/** What went wrong, in the server's own sentence, with a way to try again. Read out when it appears. */
@Component({
  selector: 'bm-problem-note',
  imports: [MatButton, MatIcon],
  template: `
    <mat-icon svgIcon="error" />
    <p>
      {{ problem().detail }}
      @if (problem().reference; as reference) {
        <span class="reference">Reference {{ reference }}</span>
      }
    </p>
    @if (retryable()) {
      <button matButton="outlined" type="button" (click)="retry.emit()">Try again</button>
    }
  `,
  styleUrl: './problem-note.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'alert' },
})
export class ProblemNote {
  readonly problem = input.required<Problem>();
  readonly retryable = input(false, { transform: booleanAttribute });
  readonly retry = output();
}
