import { inject, Injectable } from '@angular/core';
import {
  customerPageSchema,
  customerSchema,
  customerWithSitesSchema,
  siteSchema,
  type CreateCustomer,
  type Customer,
  type CustomerRow,
  type CustomerWithSites,
  type Site,
  type SiteFields,
} from '@bookmatch/common/customers/customers-contract';
import type { Page } from '@bookmatch/common/wire/list';
import type { Observable } from 'rxjs';
import { ApiClient } from '../platform/api/api-client';
import type { ListQuery } from '../platform/lists/list-address';
import { injectShopUrl } from '../platform/session/current-shop';

/** The routes of customers and their sites, one method each. */
@Injectable({ providedIn: 'root' })
export class CustomersApiClient {
  private readonly api = inject(ApiClient);
  private readonly shopUrl = injectShopUrl();

  list(query: ListQuery): Observable<Page<CustomerRow>> {
    return this.api.get(this.shopUrl('/customers'), { answer: customerPageSchema, query });
  }

  read(id: string): Observable<CustomerWithSites> {
    return this.api.get(this.shopUrl(`/customers/${id}`), { answer: customerWithSitesSchema });
  }

  create(fields: CreateCustomer): Observable<Customer> {
    return this.api.post(this.shopUrl('/customers'), fields, { answer: customerSchema });
  }

  update(id: string, version: number, fields: CreateCustomer): Observable<Customer> {
    return this.api.patch(this.shopUrl(`/customers/${id}`), fields, { answer: customerSchema, version });
  }

  archive(id: string): Observable<Customer> {
    return this.api.post(this.shopUrl(`/customers/${id}/archive`), undefined, { answer: customerSchema });
  }

  restore(id: string): Observable<Customer> {
    return this.api.post(this.shopUrl(`/customers/${id}/restore`), undefined, { answer: customerSchema });
  }

  addSite(customerId: string, fields: SiteFields): Observable<Site> {
    return this.api.post(this.shopUrl(`/customers/${customerId}/sites`), fields, { answer: siteSchema });
  }

  updateSite({ customerId, id, version }: SiteRef, fields: SiteFields): Observable<Site> {
    const url = this.shopUrl(`/customers/${customerId}/sites/${id}`);
    return this.api.patch(url, fields, { answer: siteSchema, version });
  }

  removeSite({ customerId, id, version }: SiteRef): Observable<void> {
    return this.api.delete(this.shopUrl(`/customers/${customerId}/sites/${id}`), { version });
  }
}

/** Which site, as it was read. */
export type SiteRef = Pick<Site, 'customerId' | 'id' | 'version'>;
