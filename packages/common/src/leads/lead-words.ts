import type { LeadSource, LostReason } from './leads-contract.js';

export const LEAD_SOURCE_NAMES: Record<LeadSource, string> = {
  referral: 'Referral',
  'repeat-customer': 'Repeat customer',
  website: 'Website',
  'walk-in': 'Walk-in',
  contractor: 'Contractor',
  designer: 'Designer',
  'show-or-fair': 'Show or fair',
  other: 'Other',
};

export const LOST_REASON_NAMES: Record<LostReason, string> = {
  price: 'Price',
  timing: 'Timing',
  'went-elsewhere': 'Went elsewhere',
  'out-of-scope': 'Not our kind of work',
  'no-answer': 'No answer',
  other: 'Other',
};
