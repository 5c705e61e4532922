import { LiveAnnouncer } from '@angular/cdk/a11y';
import { DOCUMENT, inject } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { Title } from '@angular/platform-browser';
import { NavigationEnd, Router } from '@angular/router';
import { distinctUntilChanged, filter, map, skip } from 'rxjs';

/**
 * Puts the focus on the new screen after each change of screen and reads its title out, since a browser does so only
 * for whole pages. A change of filters is no new screen and leaves the focus where it is.
 */
export function focusOnArrival(selector: string): void {
  const document = inject(DOCUMENT);
  const title = inject(Title);
  const announcer = inject(LiveAnnouncer);
  inject(Router)
    .events.pipe(
      filter((event) => event instanceof NavigationEnd),
      map((event) => event.urlAfterRedirects.split(/[?#]/)[0]),
      distinctUntilChanged(),
      skip(1),
      takeUntilDestroyed(),
    )
    .subscribe(() => {
      document.querySelector<HTMLElement>(selector)?.focus({ preventScroll: true });
      // The router sets the title just after it has said that it arrived.
      queueMicrotask(() => void announcer.announce(title.getTitle()));
    });
}
