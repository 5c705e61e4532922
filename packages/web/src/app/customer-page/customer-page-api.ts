import { inject, Injectable } from '@angular/core';
import {
  customerEstimateSchema,
  customerPageSchema,
  type AcceptEstimate,
  type CustomerDecline,
  type CustomerEstimate,
  type CustomerPage,
} from '@bookmatch/common/customer-page/customer-page-contract';
import { questionSchema, type Question } from '@bookmatch/common/customer-page/questions-contract';
import type { Observable } from 'rxjs';
import { ApiClient } from '../platform/api/api-client';

/** What can be done behind a customer's link. Nobody is signed in here. */
@Injectable({ providedIn: 'root' })
export class CustomerPageApiClient {
  private readonly api = inject(ApiClient);

  read(token: string): Observable<CustomerPage> {
    return this.api.get(urlOf(token), { answer: customerPageSchema, whenSignedOut: 'fail' });
  }

  accept(token: string, acceptance: AcceptEstimate): Observable<CustomerEstimate> {
    const answer = customerEstimateSchema;
    return this.api.post(urlOf(token, '/accept'), acceptance, { answer, whenSignedOut: 'fail' });
  }

  decline(token: string, refusal: CustomerDecline): Observable<CustomerEstimate> {
    const answer = customerEstimateSchema;
    return this.api.post(urlOf(token, '/decline'), refusal, { answer, whenSignedOut: 'fail' });
  }

  ask(token: string, body: string): Observable<Question> {
    const answer = questionSchema;
    return this.api.post(urlOf(token, '/questions'), { body }, { answer, whenSignedOut: 'fail' });
  }

  /** Where the browser opens the estimate's pages. */
  estimatePdfUrl(token: string): string {
    return urlOf(token, '/estimate.pdf');
  }
}

/** A token is taken from the address as it stands there: whatever it is, it stays one part of the path. */
function urlOf(token: string, path = ''): string {
  return `/api/links/${encodeURIComponent(token)}${path}`;
}
