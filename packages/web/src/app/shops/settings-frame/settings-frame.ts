import { ChangeDetectionStrategy, Component, computed } from '@angular/core';
import { MatTabLink, MatTabNav, MatTabNavPanel } from '@angular/material/tabs';
import { RouterLink, RouterLinkActive, RouterOutlet } from '@angular/router';
import type { Action, Subject } from '@bookmatch/common/access/ability';
import { injectCan } from '../../platform/session/ability';

type Section = { path: string; name: string; can: readonly [Action, Subject] };

const SECTIONS: readonly Section[] = [
  { path: '/settings/shop', name: 'Shop', can: ['read', 'Shop'] },
  { path: '/settings/members', name: 'Members', can: ['read', 'Member'] },
  { path: '/settings/operations', name: 'Operations', can: ['read', 'Operation'] },
  { path: '/settings/card-payments', name: 'Card payments', can: ['read', 'PaymentAccount'] },
  { path: '/settings/subscription', name: 'Subscription', can: ['read', 'Subscription'] },
];

/** The sections of the shop's own house, above the one that is open. */
@Component({
  selector: 'bm-settings-frame',
  imports: [MatTabLink, MatTabNav, MatTabNavPanel, RouterLink, RouterLinkActive, RouterOutlet],
  template: `
    <nav mat-tab-nav-bar aria-label="Settings" mat-stretch-tabs="false" [tabPanel]="panel">
      @for (section of sections(); track section.path) {
        <a
          #link="routerLinkActive"
          mat-tab-link
          routerLinkActive
          [routerLink]="section.path"
          [active]="link.isActive"
        >
          {{ section.name }}
        </a>
      }
    </nav>
    <mat-tab-nav-panel #panel><router-outlet /></mat-tab-nav-panel>
  `,
  styles: `
    nav {
      margin-bottom: 24px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SettingsFrame {
  private readonly can = injectCan();
  protected readonly sections = computed(() => SECTIONS.filter(({ can }) => this.can(...can)));
}
