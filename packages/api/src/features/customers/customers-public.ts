/** What other slices may use of `customers`. */
export { Customer } from './customer.entity.js';
export { Site } from './site.entity.js';
export { CustomersService } from './customers-service.js';
