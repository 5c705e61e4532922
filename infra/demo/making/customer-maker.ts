import type { ShopScope } from '@bookmatch/api/platform/database/scope';
import {
  createCustomerSchema,
  siteFieldsSchema,
  type CreateCustomer,
  type SiteFields,
} from '@bookmatch/common/customers/customers-contract';
import type { Contact } from '../cast/contacts.js';
import type { Services } from './desk.js';
import type { Trail } from './trail.js';

export type CustomerIds = { customerId: string; siteId: string };

export function customerInput(contact: Contact): CreateCustomer {
  const { kind, name, company, email, phone, address, taxExempt } = contact;
  const certificate = taxExempt ? { exemptionCertificate: 'KV-EX-20418' } : {};
  return createCustomerSchema.parse({
    ...{ kind, name, company, email, phone, taxExempt, billingAddress: address },
    ...certificate,
  });
}

export function siteInput({ address, company }: Contact): SiteFields {
  const notes = SITE_NOTES[address.street.length % SITE_NOTES.length];
  return siteFieldsSchema.parse({ name: company === '' ? 'Home' : company, address, notes });
}
const SITE_NOTES = [
  'Park in the alley. Dog is friendly.',
  'Key box by the side door, ask for the code.',
  '',
  'Stairs turn once, nothing longer than 8 ft goes up.',
  'Floors are new: paper and runners.',
];

/** Whoever is known keeps their row; for somebody new, customer and site are made. */
export async function customerFor(
  scope: ShopScope,
  { customers }: Services,
  trail: Trail,
  contact: Contact,
): Promise<CustomerIds> {
  const known = knownCustomer(trail, contact);
  if (known) return known;
  const { id: customerId } = await customers.create(scope, customerInput(contact));
  const { id: siteId } = await customers.addSite(scope, customerId, siteInput(contact));
  return keepCustomer(trail, contact, { customerId, siteId });
}

export function knownCustomer(trail: Trail, { email }: Contact): CustomerIds | null {
  const customerId = trail.find(`customer ${email}`);
  return customerId === undefined ? null : { customerId, siteId: trail.id(`site ${email}`) };
}

export function keepCustomer(trail: Trail, { email }: Contact, ids: CustomerIds): CustomerIds {
  trail.keep(`customer ${email}`, ids.customerId);
  trail.keep(`site ${email}`, ids.siteId);
  return ids;
}
