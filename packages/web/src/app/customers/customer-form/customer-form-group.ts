import type { NonNullableFormBuilder } from '@angular/forms';
import type { CustomerKind } from '@bookmatch/common/customers/customers-contract';
import { addressForm } from '../address-fields/address-form';

/** The fields a person types, named as the contract names them, so that the server's sentences find their field. */
export function customerFormGroup(builder: NonNullableFormBuilder) {
  return builder.group({
    kind: builder.control<CustomerKind>('homeowner'),
    name: '',
    company: '',
    email: '',
    phone: '',
    billingAddress: addressForm(builder),
    taxExempt: false,
    exemptionCertificate: '',
    notes: '',
  });
}

/** For telling which fields somebody else changed. */
export const CUSTOMER_FIELD_LABELS = {
  kind: 'kind',
  name: 'name',
  company: 'company',
  email: 'e-mail',
  phone: 'phone',
  billingAddress: 'billing address',
  taxExempt: 'sales tax',
  exemptionCertificate: 'certificate number',
  notes: 'notes',
} as const;
