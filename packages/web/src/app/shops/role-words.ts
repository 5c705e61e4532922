import type { Role } from '@bookmatch/common/access/roles';

/** What each role is for, told to whoever gives it. */
export const ROLE_WORDS: Record<Role, { does: string; never: string }> = {
  owner: {
    does: 'Everything: prices, margins, members, settings and the subscription.',
    never: '',
  },
  bookkeeper: {
    does: 'Customers, estimates, invoices, payments, the ledger and everybody’s time.',
    never: 'Does not change members, settings or the subscription.',
  },
  'lead-hand': {
    does: 'Every job on the floor, its files and stages, and everybody’s time.',
    never: 'Sees no prices, margins, costs of an hour or invoices.',
  },
  crew: {
    does: 'Clocks in and out, the own week, and the jobs assigned to them or open to the crew.',
    never: 'Sees no money and nobody else’s time.',
  },
};
