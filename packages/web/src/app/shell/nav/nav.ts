import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatIcon } from '@angular/material/icon';
import { RouterLink, RouterLinkActive } from '@angular/router';
import { NavCounts } from '../../platform/page/nav-counts';
import { injectCan } from '../../platform/session/ability';
import { Mark } from '../../ui/mark/mark';
import { NAV_ENTRIES, SETTINGS_ENTRY, type NavEntry } from './nav-entries';

/** The places of the shop that this member may go to. */
@Component({
  selector: 'bm-nav',
  imports: [Mark, MatIcon, RouterLink, RouterLinkActive],
  templateUrl: './nav.html',
  styleUrl: './nav.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Nav {
  private readonly can = injectCan();
  protected readonly counts = inject(NavCounts).all;
  protected readonly entries = computed(() => NAV_ENTRIES.filter((entry) => this.mayOpen(entry)));
  protected readonly settings = computed(() => (this.mayOpen(SETTINGS_ENTRY) ? SETTINGS_ENTRY : null));

  private mayOpen({ can }: NavEntry): boolean {
    return !can || this.can(can[0], can[1]);
  }
}
