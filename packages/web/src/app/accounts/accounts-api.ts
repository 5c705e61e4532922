import { inject, Injectable } from '@angular/core';
import {
  ownSessionsSchema,
  personSchema,
  sessionSchema,
  type ChangePassword,
  type ConfirmEmail,
  type OwnSession,
  type Person,
  type RequestPasswordReset,
  type ResetPassword,
  type Session,
  type SignIn,
  type SignUp,
} from '@bookmatch/common/accounts/accounts-contract';
import {
  invitationOfferSchema,
  type AcceptInvitation,
  type InvitationOffer,
} from '@bookmatch/common/shops/members-contract';
import type { Observable } from 'rxjs';
import { ApiClient, type CallOptions } from '../platform/api/api-client';

/** Whoever is at the door has no session that could be renewed. */
const atTheDoor = { whenSignedOut: 'fail' } as const satisfies CallOptions<void>;

/** What a person does about themselves, in no shop or in any. */
@Injectable({ providedIn: 'root' })
export class AccountsApiClient {
  private readonly api = inject(ApiClient);

  signUp(fields: SignUp): Observable<void> {
    return this.api.post('/api/account/sign-up', fields, atTheDoor);
  }

  resendConfirmation(email: string): Observable<void> {
    return this.api.post('/api/account/resend-confirmation', { email }, atTheDoor);
  }

  confirmEmail(fields: ConfirmEmail): Observable<Session> {
    return this.api.post('/api/account/confirm-email', fields, { ...atTheDoor, answer: sessionSchema });
  }

  signIn(credentials: SignIn): Observable<Session> {
    return this.api.post('/api/account/sign-in', credentials, { ...atTheDoor, answer: sessionSchema });
  }

  requestPasswordReset(fields: RequestPasswordReset): Observable<void> {
    return this.api.post('/api/account/request-password-reset', fields, atTheDoor);
  }

  resetPassword(fields: ResetPassword): Observable<void> {
    return this.api.post('/api/account/reset-password', fields, atTheDoor);
  }

  /** The link's secret travels in the body, out of logs and histories. */
  invitationOffer(token: string): Observable<InvitationOffer> {
    const options = { ...atTheDoor, answer: invitationOfferSchema };
    return this.api.post('/api/account/invitation-offer', { token }, options);
  }

  acceptInvitation(fields: AcceptInvitation): Observable<Session> {
    return this.api.post('/api/account/accept-invitation', fields, { ...atTheDoor, answer: sessionSchema });
  }

  rename(name: string): Observable<Person> {
    return this.api.patch('/api/account/person', { name }, { answer: personSchema });
  }

  changePassword(fields: ChangePassword): Observable<void> {
    return this.api.post('/api/account/change-password', fields);
  }

  sessions(): Observable<{ rows: OwnSession[] }> {
    return this.api.get('/api/account/sessions', { answer: ownSessionsSchema });
  }

  endSession(id: string): Observable<void> {
    return this.api.delete(`/api/account/sessions/${id}`);
  }
}
