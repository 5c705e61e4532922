import type { FoundKind } from '@bookmatch/common/today/quick-find-contract';

/** Where each kind of thing has its screen, and its sign. */
export const PLACES: Record<FoundKind, { path: string; icon: string; name: string }> = {
  customer: { path: '/customers', icon: 'customers', name: 'Customer' },
  lead: { path: '/leads', icon: 'leads', name: 'Lead' },
  estimate: { path: '/estimates', icon: 'estimates', name: 'Estimate' },
  job: { path: '/jobs', icon: 'jobs', name: 'Job' },
  invoice: { path: '/invoices', icon: 'invoices', name: 'Invoice' },
};
