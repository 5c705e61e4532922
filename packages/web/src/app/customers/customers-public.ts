/** What other slices may use of `customers`. */
export { AddressFields } from './address-fields/address-fields';
export { addressForm, type AddressForm } from './address-fields/address-form';
export { CustomerChoice } from './customer-choice/customer-choice';
export { addressLines, CUSTOMER_KIND_NAMES } from './customer-names';
export { CustomersApiClient } from './customers-api';
