import { APP_BASE_HREF } from '@angular/common';
import {
  DOCUMENT,
  inject,
  makeEnvironmentProviders,
  provideAppInitializer,
  type EnvironmentProviders,
} from '@angular/core';
import { PureAbility } from '@casl/ability';
import { AbilityServiceSignal } from '@casl/angular';
import { defineAbility } from '@bookmatch/common/access/ability';
import { provideEffects } from '@ngrx/effects';
import { provideState, Store } from '@ngrx/store';
import { filter, firstValueFrom } from 'rxjs';
import { ABILITY, emptyAbility } from './ability';
import { routerBaseOf, SHOP_SLUG } from './address';
import { LastShop } from './last-shop';
import { SessionPage } from './session.actions';
import * as effects from './session.effects';
import { sessionFeature } from './session.state';

const BEHIND_A_LINK = /^\/c\//;

/** The session, the abilities that follow from it, and the router's base; read before the first screen shows. */
export function provideSession(): EnvironmentProviders {
  return makeEnvironmentProviders([
    provideState(sessionFeature),
    provideEffects(effects),
    { provide: ABILITY, useFactory: emptyAbility },
    { provide: PureAbility, useExisting: ABILITY },
    AbilityServiceSignal,
    { provide: APP_BASE_HREF, useFactory: () => routerBaseOf(inject(DOCUMENT).location.pathname) },
    provideAppInitializer(startSession),
  ]);
}

/** A customer behind a link has no account, so there is nothing to ask for. */
function startSession(): Promise<unknown> | void {
  followAbility();
  if (BEHIND_A_LINK.test(inject(DOCUMENT).location.pathname)) return;
  const store = inject(Store);
  store.dispatch(SessionPage.started({ slug: inject(SHOP_SLUG) }));
  return firstValueFrom(
    store.select(sessionFeature.selectStatus).pipe(filter((status) => status !== 'loading')),
  );
}

function followAbility(): void {
  const ability = inject(ABILITY);
  const lastShop = inject(LastShop);
  inject(Store)
    .select(sessionFeature.selectMembership)
    .subscribe((membership) => {
      ability.update(membership ? defineAbility(membership).rules : []);
      if (membership) lastShop.remember(membership.slug);
    });
}
