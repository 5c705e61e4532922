import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { ROLE_NAMES } from '@bookmatch/common/access/roles';
import { CurrentShop } from '../../platform/session/current-shop';
import { EmptyState } from '../../ui/empty-state/empty-state';

@Component({
  selector: 'bm-no-access',
  imports: [EmptyState, MatButton, RouterLink],
  template: `
    <h1 class="bm-spoken">Not for your role</h1>
    <bm-empty-state icon="lock" title="This screen is not for your role" [text]="text()">
      <a matButton="outlined" routerLink="/">Go to the first page</a>
    </bm-empty-state>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NoAccess {
  private readonly membership = inject(CurrentShop).membership;
  protected readonly text = computed(() => {
    const here = this.membership();
    if (!here) return 'Ask the owner of the shop.';
    return `You are signed in as ${ROLE_NAMES[here.role].toLowerCase()}. Ask the owner of ${here.shopName} if you need it.`;
  });
}
