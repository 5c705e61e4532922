import type { JobBillingRow } from '@bookmatch/common/jobs/jobs-contract';
import type { Tone } from '../ui/status-chip/status-chip';

export type InvoiceChip = { text: string; tone: Tone };

/** How a stage's invoice stands, in a word or two; null while there is none. */
export function invoiceChip({ invoice }: JobBillingRow): InvoiceChip | null {
  switch (invoice?.standing) {
    case undefined:
      return null;
    case 'draft':
      return { text: 'Draft', tone: 'neutral' };
    case 'due':
      return { text: 'Due', tone: 'planned' };
    case 'part-paid':
      return { text: 'Part paid', tone: 'planned' };
    case 'overdue':
      return { text: daysLate(invoice?.daysOverdue ?? 0), tone: 'over' };
    case 'paid':
      return { text: 'Paid', tone: 'good' };
    case 'credited':
      return { text: 'Credited', tone: 'neutral' };
  }
}

function daysLate(days: number): string {
  return days === 1 ? '1 day late' : `${days} days late`;
}
