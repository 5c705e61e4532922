import type { FormControl, FormGroup, NonNullableFormBuilder } from '@angular/forms';
import type { Address } from '@bookmatch/common/customers/customers-contract';

export type AddressForm = FormGroup<Record<keyof Address, FormControl<string>>>;

export function addressForm(builder: NonNullableFormBuilder, address?: Address): AddressForm {
  return builder.group({
    street: address?.street ?? '',
    street2: address?.street2 ?? '',
    city: address?.city ?? '',
    region: address?.region ?? '',
    postalCode: address?.postalCode ?? '',
  });
}
