import { inject, Injectable } from '@angular/core';
import {
  customerInvoiceSchema,
  type CustomerInvoice,
} from '@bookmatch/common/customer-page/customer-page-contract';
import { redirectSchema, type Redirect } from '@bookmatch/common/wire/fields';
import type { Observable } from 'rxjs';
import { ApiClient } from '../platform/api/api-client';

/** What the customer's page of an invoice asks the server; there is no session behind a link. */
@Injectable({ providedIn: 'root' })
export class InvoicePageApi {
  private readonly api = inject(ApiClient);

  /** The address of the payment provider's page, for all that is owed. */
  startCardPayment(token: string): Observable<Redirect> {
    return this.api.post(linkUrl(token, '/card-payments'), {}, { answer: redirectSchema, ...SIGNED_OUT });
  }

  /** Asks the provider whether a payment has come through, and answers the invoice as it stands then. */
  checkCardPayment(token: string): Observable<CustomerInvoice> {
    const url = linkUrl(token, '/card-payments/check');
    return this.api.post(url, {}, { answer: customerInvoiceSchema, ...SIGNED_OUT });
  }

  pdfUrl(token: string): string {
    return linkUrl(token, '/invoice.pdf');
  }
}

const SIGNED_OUT = { whenSignedOut: 'fail' } as const;
const linkUrl = (token: string, path: string): string => `/api/links/${encodeURIComponent(token)}${path}`;
