import { inject } from '@angular/core';
import { NavigationEnd, Router } from '@angular/router';
import { navCountsSchema, type NavCounts as Counts } from '@bookmatch/common/today/nav-counts-contract';
import { catchError, EMPTY, filter, switchMap, throttleTime } from 'rxjs';
import { ApiClient } from '../platform/api/api-client';
import { NavCounts, type NavCountName } from '../platform/page/nav-counts';
import { CurrentShop } from '../platform/session/current-shop';

/** Whoever goes from screen to screen sees counts no older than this. */
const FRESH_MS = 20_000;

/** Keeps the counts beside the navigation fresh while somebody moves about the shop. A count that fails is left as it was. */
export function keepNavCounts(): void {
  const api = inject(ApiClient);
  const shop = inject(CurrentShop);
  const counts = inject(NavCounts);
  const read = () => api.get(shop.url('/today/counts'), { answer: navCountsSchema, whenSignedOut: 'fail' });
  inject(Router)
    .events.pipe(
      filter((event) => event instanceof NavigationEnd && shop.membership() !== null),
      throttleTime(FRESH_MS, undefined, { leading: true, trailing: true }),
      switchMap(() => read().pipe(catchError(() => EMPTY))),
    )
    .subscribe((fresh) => setNavCounts(counts, fresh));
}

export function setNavCounts(counts: NavCounts, fresh: Counts): void {
  for (const [name, count] of Object.entries(fresh)) counts.set(name as NavCountName, count);
}
