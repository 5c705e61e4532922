import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import type { EnvironmentProviders, Provider } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { MATERIAL_ANIMATIONS } from '@angular/material/core';
import { provideRouter, withComponentInputBinding, type Routes } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { PureAbility } from '@casl/ability';
import { AbilityServiceSignal } from '@casl/angular';
import { defineAbility } from '@bookmatch/common/access/ability';
import type { Membership } from '@bookmatch/common/accounts/accounts-contract';
import { provideEffects } from '@ngrx/effects';
import { provideStore, Store } from '@ngrx/store';
import { ABILITY, emptyAbility } from '../platform/session/ability';
import { SessionApi, SessionPage } from '../platform/session/session.actions';
import { sessionFeature } from '../platform/session/session.state';
import { provideIcons } from './icons';
import { buildMembership, buildSession } from './session';

/**
 * A slice's real routes, state and effects at an address, for a member of the shop; only the network is not there.
 * `http.expectOne(shop('/customers'))` answers for the server.
 */
export async function openShopScreen(
  routes: Routes,
  url: string,
  membership: Membership = buildMembership(),
  providers: (Provider | EnvironmentProviders)[] = [],
) {
  TestBed.configureTestingModule({
    providers: [
      provideRouter(routes, withComponentInputBinding()),
      provideStore({ [sessionFeature.name]: sessionFeature.reducer }),
      provideEffects(),
      provideHttpClient(),
      provideHttpClientTesting(),
      provideIcons(),
      { provide: ABILITY, useFactory: emptyAbility },
      { provide: PureAbility, useExisting: ABILITY },
      AbilityServiceSignal,
      { provide: MATERIAL_ANIMATIONS, useValue: { animationsDisabled: true } },
      ...providers,
    ],
  });
  const store = TestBed.inject(Store);
  store.dispatch(SessionPage.started({ slug: membership.slug }));
  store.dispatch(SessionApi.loaded({ session: buildSession([membership]) }));
  TestBed.inject(ABILITY).update(defineAbility(membership).rules);
  const harness = await RouterTestingHarness.create();
  await harness.navigateByUrl(url);
  const element = harness.fixture.nativeElement as HTMLElement;
  document.body.append(element);
  return {
    harness,
    fixture: harness.fixture,
    element,
    store,
    http: TestBed.inject(HttpTestingController),
    /** `/customers` as the API's address in this shop. */
    shop: (path: string) => `/api/shops/${membership.shopId}${path}`,
  };
}
