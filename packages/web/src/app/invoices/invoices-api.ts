import { inject, Injectable } from '@angular/core';
import {
  customerPageSchema,
  customerWithSitesSchema,
  type CustomerRow,
  type CustomerWithSites,
} from '@bookmatch/common/customers/customers-contract';
import { createdLinkSchema, type CreatedLink } from '@bookmatch/common/customer-page/links-contract';
import { agingSchema, type Aging } from '@bookmatch/common/invoices/aging-contract';
import {
  invoiceListTotalsSchema,
  invoicePageSchema,
  invoiceSchema,
  paymentPageSchema,
  type CreateInvoice,
  type CreditInvoice,
  type Invoice,
  type InvoiceListTotals,
  type InvoiceRow,
  type PaymentRow,
  type RecordPayment,
  type RefundOverpayment,
  type SendInvoice,
  type UpdateInvoice,
} from '@bookmatch/common/invoices/invoices-contract';
import { jobPageSchema, jobSchema, type Job, type JobRow } from '@bookmatch/common/jobs/jobs-contract';
import { shopSchema, type Shop } from '@bookmatch/common/shops/shops-contract';
import type { Page } from '@bookmatch/common/wire/list';
import { map, type Observable } from 'rxjs';
import { ApiClient } from '../platform/api/api-client';
import { withQuery } from '../platform/api/query-params';
import type { ListQuery } from '../platform/lists/list-address';
import { injectShopUrl } from '../platform/session/current-shop';

/** Which invoice, as it was read. */
export type InvoiceRef = Pick<Invoice, 'id' | 'version'>;
/** What has a PDF and can be sent by itself. */
export type LetterSubject = { document: 'credit-note' | 'payment-receipt'; id: string };

const LETTER_PATHS = { 'credit-note': 'credit-notes', 'payment-receipt': 'payments' } as const;

/** The routes of invoices, payments and credit notes, and the few of other slices that their screens ask. */
@Injectable({ providedIn: 'root' })
export class InvoicesApiClient {
  private readonly api = inject(ApiClient);
  private readonly shopUrl = injectShopUrl();

  list(query: ListQuery): Observable<Page<InvoiceRow>> {
    return this.api.get(this.shopUrl('/invoices'), { answer: invoicePageSchema, query });
  }

  totals(query: { customerId?: string; jobId?: string } = {}): Observable<InvoiceListTotals> {
    return this.api.get(this.shopUrl('/invoices/totals'), { answer: invoiceListTotalsSchema, query });
  }

  aging(query: ListQuery): Observable<Aging> {
    return this.api.get(this.shopUrl('/invoices/aging'), { answer: agingSchema, query });
  }

  payments(query: ListQuery): Observable<Page<PaymentRow>> {
    return this.api.get(this.shopUrl('/payments'), { answer: paymentPageSchema, query });
  }

  read(id: string): Observable<Invoice> {
    return this.api.get(this.shopUrl(`/invoices/${id}`), { answer: invoiceSchema });
  }

  create(fields: CreateInvoice): Observable<Invoice> {
    return this.api.post(this.shopUrl('/invoices'), fields, { answer: invoiceSchema });
  }

  update({ id, version }: InvoiceRef, fields: UpdateInvoice): Observable<Invoice> {
    return this.api.patch(this.shopUrl(`/invoices/${id}`), fields, { answer: invoiceSchema, version });
  }

  remove({ id, version }: InvoiceRef): Observable<void> {
    return this.api.delete(this.shopUrl(`/invoices/${id}`), { version });
  }

  issue(invoice: InvoiceRef): Observable<Invoice> {
    return this.command(invoice, 'issue', {});
  }

  send(invoice: InvoiceRef, letter: SendInvoice): Observable<Invoice> {
    return this.command(invoice, 'send', letter);
  }

  recordPayment(invoice: InvoiceRef, payment: RecordPayment): Observable<Invoice> {
    return this.command(invoice, 'payments', payment);
  }

  refund(invoice: InvoiceRef, refund: RefundOverpayment): Observable<Invoice> {
    return this.command(invoice, 'refunds', refund);
  }

  credit(invoice: InvoiceRef, credit: CreditInvoice): Observable<Invoice> {
    return this.command(invoice, 'credit-notes', credit);
  }

  reversePayment(paymentId: string, reason: string): Observable<Invoice> {
    const url = this.shopUrl(`/payments/${paymentId}/reverse`);
    return this.api.post(url, { reason }, { answer: invoiceSchema });
  }

  sendDocument({ document, id }: LetterSubject, to: string): Observable<void> {
    return this.api.post(this.shopUrl(`/${LETTER_PATHS[document]}/${id}/send`), { to });
  }

  /** A new link to the customer's page; its address is given this once. */
  createLink(invoiceId: string): Observable<CreatedLink> {
    const body = { subject: 'invoice', subjectId: invoiceId };
    return this.api.post(this.shopUrl('/links'), body, { answer: createdLinkSchema });
  }

  /** Where a list with these filters downloads. */
  csvUrl(path: '/invoices' | '/payments' | '/invoices/aging', { after: _, ...query }: ListQuery): string {
    return withQuery(this.shopUrl(`${path}/export`), query);
  }

  pdfUrl(document: 'invoice' | LetterSubject['document'], id: string): string {
    const path = document === 'invoice' ? 'invoices' : LETTER_PATHS[document];
    return this.shopUrl(`/${path}/${id}/pdf`);
  }

  findCustomers(q: string): Observable<CustomerRow[]> {
    const query = { q, limit: 20 };
    return this.api
      .get(this.shopUrl('/customers'), { answer: customerPageSchema, query })
      .pipe(map(({ rows }) => rows));
  }

  customer(id: string): Observable<CustomerWithSites> {
    return this.api.get(this.shopUrl(`/customers/${id}`), { answer: customerWithSitesSchema });
  }

  jobsOf(customerId: string): Observable<JobRow[]> {
    const query = { customerId, sort: '-number', limit: 100 };
    return this.api
      .get(this.shopUrl('/jobs'), { answer: jobPageSchema, query })
      .pipe(map(({ rows }) => rows));
  }

  job(id: string): Observable<Job> {
    return this.api.get(this.shopUrl(`/jobs/${id}`), { answer: jobSchema });
  }

  shop(): Observable<Shop> {
    return this.api.get(this.shopUrl('/shop'), { answer: shopSchema });
  }

  private command({ id, version }: InvoiceRef, verb: string, body: object): Observable<Invoice> {
    return this.api.post(this.shopUrl(`/invoices/${id}/${verb}`), body, { answer: invoiceSchema, version });
  }
}
