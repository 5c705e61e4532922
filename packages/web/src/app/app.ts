import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { RouterOutlet } from '@angular/router';
import { Store } from '@ngrx/store';
import { PageLoad } from './platform/session/page-load';
import { sessionFeature } from './platform/session/session.state';
import { RequestProgress } from './shell/request-progress/request-progress';
import { ProblemNote } from './ui/problem-note/problem-note';

@Component({
  selector: 'bm-root',
  imports: [RouterOutlet, RequestProgress, ProblemNote],
  template: `
    <bm-request-progress />
    @if (problem(); as problem) {
      <main class="stopped">
        <bm-problem-note [problem]="problem" [retryable]="true" (retry)="page.reload()" />
      </main>
    } @else {
      <router-outlet />
    }
  `,
  styles: '.stopped { max-width: 560px; margin: 20vh auto 0; padding: 16px; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class App {
  protected readonly page = inject(PageLoad);
  protected readonly problem = inject(Store).selectSignal(sessionFeature.selectProblem);
}
