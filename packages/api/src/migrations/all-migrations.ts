import type { MigrationClass } from '../platform/database/migration-class.js';
import { Ground1796145890667 } from './202612011724-ground.js';
import { JobsAndOperations1796146507100 } from './202612011735-jobs-and-operations.js';
import { EstimatesAndLinks1796146823778 } from './202612011740-estimates-and-links.js';
import { JobsKnowTheirEstimate1796147211547 } from './202612011746-jobs-know-their-estimate.js';
import { InvoicesAndLedger1796147362217 } from './202612011749-invoices-and-ledger.js';
import { LeadsAndTheirEstimates1796147529297 } from './202612011752-leads-and-their-estimates.js';
import { InvitationsAndCheckout1796147597485 } from './202612011753-invitations-and-checkout.js';
import { TimeEntries1796147912788 } from './202612011758-time-entries.js';
import { EntriesKnowTheirInvoice1796148861361 } from './202612011814-entries-know-their-invoice.js';

/** Every migration, oldest first. */
export const MIGRATIONS: readonly MigrationClass[] = [
  Ground1796145890667,
  JobsAndOperations1796146507100,
  EstimatesAndLinks1796146823778,
  JobsKnowTheirEstimate1796147211547,
  InvoicesAndLedger1796147362217,
  LeadsAndTheirEstimates1796147529297,
  InvitationsAndCheckout1796147597485,
  TimeEntries1796147912788,
  EntriesKnowTheirInvoice1796148861361,
];
