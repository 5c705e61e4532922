import type { NonNullableFormBuilder } from '@angular/forms';
import type { LeadSource } from '@bookmatch/common/leads/leads-contract';
import { addressForm } from '../../customers/customers-public';

/** The fields a person types, named as the contract names them, so that the server's sentences find their field. */
export function leadFormGroup(builder: NonNullableFormBuilder) {
  return builder.group({
    title: '',
    contactName: '',
    company: '',
    email: '',
    phone: '',
    siteAddress: addressForm(builder),
    source: builder.control<LeadSource | null>(null),
    nextStep: '',
    nextStepOn: builder.control<string | null>(null),
    customerId: builder.control<string | null>(null),
    expectedCents: builder.control<number | null>(null),
  });
}

/** For telling which fields somebody else changed. */
export const LEAD_FIELD_LABELS = {
  title: 'title',
  contactName: 'name',
  company: 'company',
  email: 'e-mail',
  phone: 'phone',
  siteAddress: 'site address',
  source: 'source',
  nextStep: 'next step',
  nextStepOn: 'date of the next step',
  customerId: 'customer',
  expectedCents: 'expected amount',
} as const;
