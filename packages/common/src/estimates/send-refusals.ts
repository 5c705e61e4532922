import { refuseSchedule } from './billing-schedule.js';
import { estimateTotals } from './estimate-totals.js';
import type { RevisionContent } from './revision-contract.js';

/**
 * All that keeps a draft from being sent, each as a sentence for the person who writes it; empty when nothing does.
 *
 * @param today the date in the shop's zone
 */
export function sendRefusals(revision: RevisionContent, today: string): string[] {
  const totals = estimateTotals(revision);
  const schedule = refuseSchedule(revision.billingSchedule, totals.totalCents);
  const refusals: [boolean, string][] = [
    [revision.rooms.every((room) => room.lines.length === 0), 'Add a line: there is nothing to offer yet.'],
    [revision.discountCents > totals.subtotalCents, 'The discount is more than the price.'],
    [revision.validUntil < today, 'The date it is valid until has passed.'],
    [schedule !== null, schedule?.detail ?? ''],
  ];
  return refusals.filter(([holds]) => holds).map(([, sentence]) => sentence);
}
