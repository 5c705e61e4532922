import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { RouterLink, RouterLinkActive } from '@angular/router';
import { injectCan } from '../../platform/session/ability';
import { CurrentShop } from '../../platform/session/current-shop';
import { CREW_ENTRIES, NAV_ENTRIES, PHONE_ENTRIES, SETTINGS_ENTRY, type NavEntry } from '../nav/nav-entries';

/** The navigation of a phone, within reach of a thumb. */
@Component({
  selector: 'bm-bottom-bar',
  imports: [MatIcon, MatMenu, MatMenuItem, MatMenuTrigger, RouterLink, RouterLinkActive],
  templateUrl: './bottom-bar.html',
  styleUrl: './bottom-bar.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BottomBar {
  private readonly can = injectCan();
  private readonly membership = inject(CurrentShop).membership;
  private readonly isCrew = computed(() => this.membership()?.role === 'crew');

  protected readonly entries = computed(() =>
    this.isCrew() ? CREW_ENTRIES : PHONE_ENTRIES.filter((entry) => this.mayOpen(entry)),
  );
  protected readonly more = computed(() => {
    if (this.isCrew()) return [];
    const shown = new Set(this.entries().map(({ path }) => path));
    return [...NAV_ENTRIES, SETTINGS_ENTRY].filter((entry) => !shown.has(entry.path) && this.mayOpen(entry));
  });

  private mayOpen({ can }: NavEntry): boolean {
    return !can || this.can(can[0], can[1]);
  }
}
