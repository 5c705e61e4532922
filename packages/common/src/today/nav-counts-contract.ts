import * as z from 'zod';

/** What waits for somebody, beside the entries of the navigation; what the one who asks may not read is absent. */
export const navCountsSchema = z.object({
  /** Leads whose next step is today or overdue. */
  leads: z.int().optional(),
  /** Customers' questions about estimates without an answer. */
  estimates: z.int().optional(),
  /** Invoices overdue. */
  invoices: z.int().optional(),
});
export type NavCounts = z.infer<typeof navCountsSchema>;
