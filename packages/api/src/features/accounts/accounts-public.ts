/** What other slices may use of `accounts`. */
export { Person } from './person.entity.js';
