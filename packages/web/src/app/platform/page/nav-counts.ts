import { Injectable, signal } from '@angular/core';

export type NavCountName = 'leads' | 'estimates' | 'jobs' | 'time' | 'invoices';

/** The small counts beside the entries of the navigation: what waits for somebody. A slice sets its own. */
@Injectable({ providedIn: 'root' })
export class NavCounts {
  private readonly counts = signal<Partial<Record<NavCountName, number>>>({});
  readonly all = this.counts.asReadonly();

  set(name: NavCountName, count: number): void {
    this.counts.update((counts) => ({ ...counts, [name]: count }));
  }
}
