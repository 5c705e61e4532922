import { DOCUMENT, inject, Injectable } from '@angular/core';

/** Leaves this page for another of ours by a full load, which drops all state of the shop left behind. */
@Injectable({ providedIn: 'root' })
export class PageLoad {
  private readonly document = inject(DOCUMENT);

  go(path: string): void {
    this.document.location.assign(path);
  }

  toSignIn(): void {
    const { pathname, search } = this.document.location;
    this.go(`/sign-in?return=${encodeURIComponent(pathname + search)}`);
  }

  reload(): void {
    this.document.location.reload();
  }
}
