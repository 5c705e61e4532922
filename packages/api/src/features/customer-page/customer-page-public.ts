/** What `compose.ts` and other slices may use of `customer-page`. */
export { CustomerLink } from './customer-link.entity.js';
export { CustomerLinks, type LinkTarget } from './customer-links.js';
