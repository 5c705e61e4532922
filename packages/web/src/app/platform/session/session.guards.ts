import { inject } from '@angular/core';
import { type CanActivateFn, type CanMatchFn, RedirectCommand, Router } from '@angular/router';
import type { Action, Subject } from '@bookmatch/common/access/ability';
import { Store } from '@ngrx/store';
import { ABILITY } from './ability';
import { CurrentShop } from './current-shop';
import { PageLoad } from './page-load';
import { sessionFeature } from './session.state';

/** Screens of a shop need a session; without one the person signs in and comes back to this address. */
export const signedIn: CanActivateFn = () => {
  if (inject(Store).selectSignal(sessionFeature.selectStatus)() !== 'signed-out') return true;
  inject(PageLoad).toSignIn();
  return false;
};

/** A shop that is not the person's looks like one that does not exist: back to the front door, which lists theirs. */
export const memberHere: CanActivateFn = () => {
  if (inject(CurrentShop).membership()) return true;
  inject(PageLoad).go('/?unknown-shop');
  return false;
};

/** A role that may not see a screen gets told so, at the address it asked for. The server never relies on this. */
export function canMatchAbility(action: Action, subject: Subject): CanMatchFn {
  return () => {
    const ability = inject(ABILITY);
    const router = inject(Router);
    if (ability.can(action, subject)) return true;
    return new RedirectCommand(router.parseUrl('/no-access'), { skipLocationChange: true });
  };
}
