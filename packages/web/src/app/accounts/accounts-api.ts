import { inject, Injectable } from '@angular/core';
import type { SignIn } from '@bookmatch/common/accounts/accounts-contract';
import type { Observable } from 'rxjs';
import { ApiClient } from '../platform/api/api-client';

/** What a person does about themselves, in no shop or in any. */
@Injectable({ providedIn: 'root' })
export class AccountsApi {
  private readonly api = inject(ApiClient);

  signIn(credentials: SignIn): Observable<void> {
    return this.api.post('/api/account/sign-in', credentials, { whenSignedOut: 'fail' });
  }
}
