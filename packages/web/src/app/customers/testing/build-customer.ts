import type {
  Customer,
  CustomerRow,
  CustomerWithSites,
  Site,
} from '@bookmatch/common/customers/customers-contract';
import * as common from '@bookmatch/common/testing/build-customer';

const ID = '01940000-0000-7000-8000-0000000000c1';
const SITE_ID = '01940000-0000-7000-8000-0000000000c2';
const createdAt = '2026-03-05T15:00:00.000Z';

/** The one customer of these tests: the same id each time, so that an answer is about who was asked for. */
export function buildCustomer(overrides: Partial<Customer> = {}): Customer {
  const wren = { id: ID, name: 'Tobias Wren', email: 'wren@example.test', phone: '', createdAt };
  return common.buildCustomer({ ...wren, ...overrides });
}

export function buildSite(overrides: Partial<Site> = {}): Site {
  return common.buildSite({ id: SITE_ID, customerId: ID, name: 'Main house', ...overrides });
}

export function buildCustomerWithSites(overrides: Partial<Customer> = {}): CustomerWithSites {
  return { ...buildCustomer(overrides), sites: [buildSite()] };
}

export function buildCustomerRow(overrides: Partial<CustomerRow> = {}): CustomerRow {
  const { id, kind, name, company, email, phone, archivedAt } = buildCustomer();
  return { id, kind, name, company, email, phone, city: 'Stowe', archivedAt, createdAt, ...overrides };
}
