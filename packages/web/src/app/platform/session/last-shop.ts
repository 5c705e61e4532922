import { DOCUMENT, inject, Injectable } from '@angular/core';
import type { Membership } from '@bookmatch/common/accounts/accounts-contract';

const KEY = 'bookmatch-last-shop';

/** Remembers in this browser which shop was open last, for whoever comes back to the front door. */
@Injectable({ providedIn: 'root' })
export class LastShop {
  private readonly storage = inject(DOCUMENT).defaultView?.localStorage;

  remember(slug: string): void {
    this.storage?.setItem(KEY, slug);
  }

  /** The shop to open without asking: the last one used, or the only one. */
  pick(memberships: readonly Membership[]): Membership | null {
    const last = this.storage?.getItem(KEY);
    const found = memberships.find(({ slug }) => slug === last);
    return found ?? (memberships.length === 1 ? (memberships[0] ?? null) : null);
  }
}
