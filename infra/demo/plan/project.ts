import type { LeadSource } from '@bookmatch/common/leads/leads-contract';
import type { Work } from '../catalog/work.js';
import type { Contact } from '../cast/contacts.js';

/** A day in working days back from today: 0 is today or the last working day. */
export type WorkdayIndex = number;

/** What goes otherwise than usual on the way from the estimate to the last check. */
export type Turn =
  /** The first estimate was changed and sent again. */
  | 'revised'
  /** The customer asked before accepting. */
  | 'asked'
  /** The billing schedule has a fourth stage. */
  | 'four-stages'
  /** Extra work was billed by itself. */
  | 'extra-work';

/** How the last invoices stand. Without one, all that fell due was paid in the usual time. */
export type Trouble =
  | 'final-overdue-long'
  | 'final-overdue'
  | 'final-part-paid'
  | 'final-part-credited'
  | 'progress-overdue'
  | 'progress-part-paid'
  | 'check-returned'
  | 'deposit-not-issued';

/** One job of the year with all that came before it. */
export type Project = {
  key: string;
  title: string;
  contact: Contact;
  work: Work;
  /** The day the customer accepted; for a job taken on by hand, the day it was entered. */
  acceptedOn: WorkdayIndex;
  /** By hand: taken on without an estimate. Otherwise where the inquiry came from, or none when they just called again. */
  origin: 'by-hand' | 'estimate-only' | LeadSource;
  turns: readonly Turn[];
  trouble: Trouble | null;
  /** Working days from acceptance to the site measure, the approval of drawings and the material. */
  pace: { measure: number; approval: number; material: number };
  /** What the hours come to beside the plan: 1 is as planned. */
  tempo: number;
};
