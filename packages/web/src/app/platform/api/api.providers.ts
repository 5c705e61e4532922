import { provideHttpClient, withInterceptors, withXsrfConfiguration } from '@angular/common/http';
import type { EnvironmentProviders } from '@angular/core';
import { countRequests } from './requests-in-flight';

/** HTTP with the double-submit token of this application on every unsafe method. */
export function provideApi(): EnvironmentProviders {
  return provideHttpClient(
    withInterceptors([countRequests]),
    withXsrfConfiguration({ cookieName: 'bookmatch-csrf', headerName: 'X-CSRF-Token' }),
  );
}
