import {
  inject,
  provideAppInitializer,
  provideBrowserGlobalErrorListeners,
  provideEnvironmentInitializer,
  type ApplicationConfig,
} from '@angular/core';
import {
  MAT_FORM_FIELD_DEFAULT_OPTIONS,
  type MatFormFieldDefaultOptions,
} from '@angular/material/form-field';
import {
  provideRouter,
  TitleStrategy,
  withComponentInputBinding,
  withInMemoryScrolling,
} from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideStore } from '@ngrx/store';
import { sessionRenewal } from './accounts/accounts-public';
import { outsideRoutes, shopRoutes } from './app.routes';
import { provideApi } from './platform/api/api.providers';
import { SESSION_RENEWAL } from './platform/api/session-renewal';
import { PageTitle } from './platform/page/page-title';
import { shopSlugOf } from './platform/session/address';
import { CurrentShop } from './platform/session/current-shop';
import { provideSession } from './platform/session/session.providers';
import { BANNER_SLOT, CLOCK_SLOT } from './shell/slots';
import { subscriptionBanner } from './subscription/subscription-public';
import { clockSlot } from './time/time-public';
import { keepNavCounts } from './today/today-public';
import { registerIcons } from './ui/icons/register-icons';
import { SHOP_CURRENCY, SHOP_UNITS, SHOP_ZONE } from './ui/formats/shop-settings';

const formFields: MatFormFieldDefaultOptions = {
  appearance: 'outline',
  floatLabel: 'auto',
  subscriptSizing: 'dynamic',
};

/** The only place that wires the application: what the platform leaves open is filled here. */
export const appConfig: ApplicationConfig = {
  providers: [
    provideBrowserGlobalErrorListeners(),
    provideRouter(
      shopSlugOf(location.pathname) === null ? outsideRoutes : shopRoutes,
      withComponentInputBinding(),
      withInMemoryScrolling({ scrollPositionRestoration: 'enabled', anchorScrolling: 'enabled' }),
    ),
    provideStore(),
    provideEffects(),
    provideApi(),
    provideSession(),
    provideAppInitializer(registerIcons),
    provideEnvironmentInitializer(keepNavCounts),
    { provide: TitleStrategy, useExisting: PageTitle },
    { provide: MAT_FORM_FIELD_DEFAULT_OPTIONS, useValue: formFields },
    { provide: BANNER_SLOT, useValue: subscriptionBanner },
    { provide: SESSION_RENEWAL, useFactory: sessionRenewal },
    { provide: CLOCK_SLOT, useValue: clockSlot },
    { provide: SHOP_CURRENCY, useFactory: () => inject(CurrentShop).currency },
    { provide: SHOP_ZONE, useFactory: () => inject(CurrentShop).timeZone },
    { provide: SHOP_UNITS, useFactory: () => inject(CurrentShop).unitSystem },
  ],
};
