import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { ActivatedRoute } from '@angular/router';
import { ROLE_NAMES } from '@bookmatch/common/access/roles';
import { Store } from '@ngrx/store';
import { LastShop } from '../../platform/session/last-shop';
import { PageLoad } from '../../platform/session/page-load';
import { sessionFeature } from '../../platform/session/session.state';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { Mark } from '../../ui/mark/mark';

/** Leads on to the shop used last, or the only one; otherwise asks which. */
@Component({
  selector: 'bm-front-door',
  imports: [EmptyState, Mark],
  templateUrl: './front-door.html',
  styleUrl: './front-door.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FrontDoor {
  protected readonly memberships = inject(Store).selectSignal(sessionFeature.selectMemberships);
  protected readonly roleNames = ROLE_NAMES;
  protected readonly unknownShop = inject(ActivatedRoute).snapshot.queryParamMap.has('unknown-shop');

  constructor() {
    const found = this.unknownShop ? null : inject(LastShop).pick(this.memberships());
    if (found) inject(PageLoad).go(`/s/${found.slug}/`);
  }
}
