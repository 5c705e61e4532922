import type { HttpInterceptorFn } from '@angular/common/http';
import { computed, inject, Injectable, signal } from '@angular/core';
import { finalize } from 'rxjs';

/** Counts the requests under way, for the progress bar at the top of the page. */
@Injectable({ providedIn: 'root' })
export class RequestsInFlight {
  private readonly count = signal(0);
  readonly any = computed(() => this.count() > 0);

  begin(): void {
    this.count.update((count) => count + 1);
  }

  end(): void {
    this.count.update((count) => count - 1);
  }
}

export const countRequests: HttpInterceptorFn = (request, next) => {
  const requests = inject(RequestsInFlight);
  requests.begin();
  return next(request).pipe(finalize(() => requests.end()));
};
