/** What other slices may use of `invoices`. */
export { agingBars } from './aging-strip/aging-bars';
export { AgingStrip } from './aging-strip/aging-strip';
