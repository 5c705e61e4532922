import type {
  CreateCustomer,
  Customer as CustomerView,
  CustomerWithSites,
  Site as SiteView,
  SiteFields,
} from '@bookmatch/common/customers/customers-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { isBrokenReference } from '../../platform/database/retry.js';
import { conflict, notFound } from '../../platform/http/problem-error.js';
import { Customer } from './customer.entity.js';
import { Site } from './site.entity.js';

/** Customers and their sites. */
export class CustomersService {
  async get(scope: ShopScope, id: string): Promise<CustomerWithSites> {
    const customer = await scope.rows(Customer).get(id);
    const sites = await scope.rows(Site).findBy({ customerId: id }, 'name');
    return { ...viewCustomer(customer), sites: sites.map(viewSite) };
  }

  async create(scope: ShopScope, input: CreateCustomer): Promise<CustomerView> {
    const row = await scope.rows(Customer).insert({ ...stored(input), id: scope.newId(), archivedAt: null });
    return viewCustomer(row);
  }

  async update(scope: ShopScope, id: string, input: CreateCustomer, version: number): Promise<CustomerView> {
    const customers = scope.rows(Customer);
    return viewCustomer(await customers.update(await customers.getForUpdate(id), stored(input), version));
  }

  /** An archived customer is left out of lists and choices; nothing of theirs is lost. */
  async archive(scope: ShopScope, id: string, archived: boolean): Promise<CustomerView> {
    const customers = scope.rows(Customer);
    const customer = await customers.getForUpdate(id);
    return viewCustomer(await customers.update(customer, { archivedAt: archived ? scope.now : null }));
  }

  async addSite(scope: ShopScope, customerId: string, input: SiteFields): Promise<SiteView> {
    await scope.rows(Customer).get(customerId);
    return viewSite(await scope.rows(Site).insert({ ...input, id: scope.newId(), customerId }));
  }

  async updateSite(scope: ShopScope, key: SiteKey, input: SiteFields, version: number): Promise<SiteView> {
    const site = await this.site(scope, key);
    return viewSite(await scope.rows(Site).update(site, input, version));
  }

  /** A site that work went to stays. */
  async deleteSite(scope: ShopScope, key: SiteKey, version: number): Promise<void> {
    const site = await this.site(scope, key);
    try {
      await scope.rows(Site).delete(site, version);
    } catch (error) {
      throw isBrokenReference(error)
        ? conflict('Estimates or jobs belong to this site, so it stays.')
        : error;
    }
  }

  private async site(scope: ShopScope, { customerId, siteId }: SiteKey): Promise<Site> {
    await scope.rows(Customer).get(customerId);
    const site = await scope.rows(Site).findOneBy({ id: siteId, customerId }, true);
    if (!site) throw notFound('This site');
    return site;
  }
}
export type SiteKey = { customerId: string; siteId: string };

function stored(input: CreateCustomer) {
  return { ...input, city: input.billingAddress.city };
}

function viewCustomer(row: Customer): CustomerView {
  return {
    ...row,
    archivedAt: row.archivedAt?.toISOString() ?? null,
    createdAt: row.createdAt.toISOString(),
  };
}

function viewSite(row: Site): SiteView {
  return { ...row };
}
