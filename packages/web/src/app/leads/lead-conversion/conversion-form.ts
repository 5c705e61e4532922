import type { NonNullableFormBuilder } from '@angular/forms';
import type { CustomerKind } from '@bookmatch/common/customers/customers-contract';
import { convertLeadSchema, type Lead, type LeadSource } from '@bookmatch/common/leads/leads-contract';
import { addressForm } from '../../customers/customers-public';

/** The form of a conversion, filled from what the lead knows. */
export function conversionForm(builder: NonNullableFormBuilder, lead: Lead) {
  const { street, city } = lead.siteAddress;
  return builder.group({
    who: builder.control<'new' | 'known'>('new'),
    customerId: '',
    customer: builder.group({
      kind: builder.control<CustomerKind>(KIND_OF_SOURCE[lead.source] ?? 'homeowner'),
      name: lead.contactName,
      company: lead.company,
      email: lead.email,
      phone: lead.phone,
    }),
    withSite: street !== '' || city !== '',
    site: builder.group({
      name: street || lead.title,
      address: addressForm(builder, lead.siteAddress),
    }),
  });
}
export type ConversionForm = ReturnType<typeof conversionForm>;

/** Checks what is sent and not what was filled in and then not chosen. */
export const conversionSchema = {
  safeParse: (value: unknown) => convertLeadSchema.safeParse(conversionOf(value as Typed)),
};

type Typed = ReturnType<ConversionForm['getRawValue']>;

function conversionOf({ who, customerId, customer, withSite, site }: Typed) {
  return {
    ...(who === 'new' ? { customer } : { customerId: customerId || undefined }),
    ...(withSite ? { site } : {}),
  };
}

const KIND_OF_SOURCE: Partial<Record<LeadSource, CustomerKind>> = {
  contractor: 'contractor',
  designer: 'designer',
};
