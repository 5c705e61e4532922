import type { Address, CustomerKind } from '@bookmatch/common/customers/customers-contract';

export const CUSTOMER_KIND_NAMES: Record<CustomerKind, string> = {
  homeowner: 'Homeowner',
  contractor: 'Contractor',
  designer: 'Designer',
};

/** The lines of an address as on an envelope, without the empty ones. */
export function addressLines({ street, street2, city, region, postalCode }: Address): string[] {
  const place = [city, [region, postalCode].filter(Boolean).join(' ')].filter(Boolean).join(', ');
  return [street, street2, place].filter(Boolean);
}
