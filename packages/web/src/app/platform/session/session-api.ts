import { inject, Injectable } from '@angular/core';
import { sessionSchema, type Session } from '@bookmatch/common/accounts/accounts-contract';
import type { Observable } from 'rxjs';
import { ApiClient } from '../api/api-client';

@Injectable({ providedIn: 'root' })
export class SessionApiClient {
  private readonly api = inject(ApiClient);

  /** Also sets the anti-forgery cookie that every later post needs. */
  read(): Observable<Session> {
    return this.api.get('/api/account/session', { answer: sessionSchema, whenSignedOut: 'fail' });
  }

  signOut(everywhere: boolean): Observable<void> {
    return this.api.post(everywhere ? '/api/account/sign-out-everywhere' : '/api/account/sign-out', {});
  }
}
