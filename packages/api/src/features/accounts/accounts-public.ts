/** What other slices may use of `accounts`. */
export { Person } from './person.entity.js';
export { confirmedPerson, openConfirmedAccount } from './invited-person.js';
export { hashPassword } from './passwords.js';
