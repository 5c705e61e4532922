import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatDivider } from '@angular/material/divider';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { RouterLink } from '@angular/router';
import { ROLE_NAMES } from '@bookmatch/common/access/roles';
import { Store } from '@ngrx/store';
import { SessionPage } from '../../platform/session/session.actions';
import { sessionFeature } from '../../platform/session/session.state';
import { initialsOf } from './initials';

/** Who is signed in, where else they may go, and the way out. */
@Component({
  selector: 'bm-person-menu',
  imports: [MatDivider, MatIcon, MatMenu, MatMenuItem, MatMenuTrigger, RouterLink],
  templateUrl: './person-menu.html',
  styleUrl: './person-menu.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PersonMenu {
  private readonly store = inject(Store);
  protected readonly person = this.store.selectSignal(sessionFeature.selectPerson);
  protected readonly membership = this.store.selectSignal(sessionFeature.selectMembership);
  private readonly memberships = this.store.selectSignal(sessionFeature.selectMemberships);
  protected readonly roleNames = ROLE_NAMES;
  protected readonly initials = computed(() => initialsOf(this.person()?.name ?? ''));
  protected readonly otherShops = computed(() =>
    this.memberships().filter(({ slug }) => slug !== this.membership()?.slug),
  );

  protected signOut(everywhere: boolean): void {
    this.store.dispatch(SessionPage.signOutPressed({ everywhere }));
  }
}
