/** What other slices may use of `ledger`. */
export { openBooks, postEntry, type NewEntry } from './ledger-posting.js';
