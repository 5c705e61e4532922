import type { Address, Customer, Site } from '../customers/customers-contract.js';
import { MADE_AT, nextId } from './ids.js';

export function buildAddress(overrides: Partial<Address> = {}): Address {
  return {
    street: '14 Quarry Road',
    street2: '',
    city: 'Alder Falls',
    region: 'MN',
    postalCode: '55999',
    ...overrides,
  };
}

export function buildCustomer(overrides: Partial<Customer> = {}): Customer {
  return {
    id: nextId(),
    version: 1,
    kind: 'homeowner',
    name: 'Wren Halloway',
    company: '',
    email: 'wren@example.com',
    phone: '555 0114',
    billingAddress: buildAddress(),
    taxExempt: false,
    exemptionCertificate: '',
    notes: '',
    archivedAt: null,
    createdAt: MADE_AT,
    ...overrides,
  };
}

export function buildSite(overrides: Partial<Site> = {}): Site {
  return {
    id: nextId(),
    version: 1,
    customerId: nextId(),
    name: 'Quarry Road house',
    address: buildAddress(),
    notes: '',
    ...overrides,
  };
}
