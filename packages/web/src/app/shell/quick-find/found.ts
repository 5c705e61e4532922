import * as z from 'zod';

const foundRowSchema = z.object({
  kind: z.enum(['customer', 'lead', 'estimate', 'job', 'invoice']),
  id: z.string(),
  title: z.string(),
  facts: z.string(),
});
export const foundSchema = z.object({ rows: z.array(foundRowSchema) });
export type FoundRow = z.infer<typeof foundRowSchema>;

/** Where each kind of thing has its screen, and its sign. */
export const PLACES: Record<FoundRow['kind'], { path: string; icon: string; name: string }> = {
  customer: { path: '/customers', icon: 'customers', name: 'Customer' },
  lead: { path: '/leads', icon: 'leads', name: 'Lead' },
  estimate: { path: '/estimates', icon: 'estimates', name: 'Estimate' },
  job: { path: '/jobs', icon: 'jobs', name: 'Job' },
  invoice: { path: '/invoices', icon: 'invoices', name: 'Invoice' },
};
