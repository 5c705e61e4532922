import { InjectionToken } from '@angular/core';
import { EMPTY, type Observable } from 'rxjs';

/** Lets the person sign in again in place; emits once when the session is there again, completes empty if not. */
export type SessionRenewal = () => Observable<void>;

/** Filled where the application is wired, since the API client must not know the screens of signing in. */
export const SESSION_RENEWAL = new InjectionToken<SessionRenewal>('SESSION_RENEWAL', {
  providedIn: 'root',
  factory: () => () => EMPTY,
});
