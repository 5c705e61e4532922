import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import type { SubscriptionStanding } from '@bookmatch/common/subscription/subscription-contract';
import { injectCan } from '../../platform/session/ability';
import { CurrentShop } from '../../platform/session/current-shop';

type Banner = { tone: 'near' | 'over'; icon: string; text: string; action: string };

/** Above every screen when the subscription needs somebody. What only an owner can mend, only an owner is told early. */
@Component({
  selector: 'bm-subscription-banner',
  imports: [MatIcon, RouterLink],
  template: `
    @if (banner(); as shown) {
      <p role="status" [class]="shown.tone">
        <mat-icon [svgIcon]="shown.icon" />
        <span>
          {{ shown.text }}
          @if (mayManage()) {
            <a routerLink="/settings/subscription">{{ shown.action }}</a>
          }
        </span>
      </p>
    }
  `,
  styleUrl: './subscription-banner.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SubscriptionBanner {
  private readonly membership = inject(CurrentShop).membership;
  private readonly can = injectCan();
  protected readonly mayManage = computed(() => this.can('manage', 'Subscription'));
  protected readonly banner = computed(() => {
    const standing = this.membership()?.subscription;
    return standing ? bannerOf(standing, this.mayManage()) : null;
  });
}

function bannerOf({ banner, daysLeft }: SubscriptionStanding, mayManage: boolean): Banner | null {
  if (banner === 'read-only')
    return {
      tone: 'over',
      icon: 'lock',
      text: 'The subscription has lapsed. Everything can be read and exported, nothing changed.',
      action: 'See the subscription',
    };
  if (banner === 'none' || !mayManage) return null;
  const days = `${daysLeft ?? 0} ${daysLeft === 1 ? 'day' : 'days'}`;
  return banner === 'trial-ending'
    ? { tone: 'near', icon: 'date', text: `The trial ends in ${days}.`, action: 'Subscribe' }
    : {
        tone: 'over',
        icon: 'warning',
        text: `A payment did not go through. In ${days} the shop becomes read-only.`,
        action: 'Pay or change the card',
      };
}
