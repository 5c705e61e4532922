import { signal } from '@angular/core';
import type { Problem } from '@bookmatch/common/problems/problem';
import type { Observable } from 'rxjs';
import { toProblem } from '../api/api-problem';

/** One form's way to the server, for forms whose answer is no part of the store: busy, refused, or done. */
export class Submission {
  private readonly underWay = signal(false);
  private readonly refused = signal<Problem | null>(null);
  readonly busy = this.underWay.asReadonly();
  readonly problem = this.refused.asReadonly();

  /** Does nothing while the same form is under way already. */
  run<Answer>(request: Observable<Answer>, done: (answer: Answer) => void): void {
    if (this.underWay()) return;
    this.underWay.set(true);
    this.refused.set(null);
    request.subscribe({
      next: (answer) => {
        this.underWay.set(false);
        done(answer);
      },
      error: (error: unknown) => {
        this.underWay.set(false);
        this.refused.set(toProblem(error));
      },
    });
  }
}
