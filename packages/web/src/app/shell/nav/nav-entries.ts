import type { Action, Subject } from '@bookmatch/common/access/ability';
import type { NavCountName } from '../../platform/page/nav-counts';

export type NavEntry = {
  path: string;
  name: string;
  icon: string;
  /** Who may go there; absent for everybody. */
  can?: readonly [Action, Subject];
  count?: NavCountName;
};

export const NAV_ENTRIES: readonly NavEntry[] = [
  { path: '/today', name: 'Today', icon: 'today' },
  { path: '/leads', name: 'Leads', icon: 'leads', can: ['read', 'Lead'], count: 'leads' },
  { path: '/estimates', name: 'Estimates', icon: 'estimates', can: ['read', 'Estimate'], count: 'estimates' },
  { path: '/jobs', name: 'Jobs', icon: 'jobs', can: ['read', 'Job'], count: 'jobs' },
  { path: '/time', name: 'Time', icon: 'time', can: ['read', 'TimeEntry'], count: 'time' },
  { path: '/invoices', name: 'Invoices', icon: 'invoices', can: ['read', 'Invoice'], count: 'invoices' },
  { path: '/customers', name: 'Customers', icon: 'customers', can: ['read', 'Customer'] },
  { path: '/ledger', name: 'Ledger', icon: 'ledger', can: ['read', 'LedgerEntry'] },
];

export const SETTINGS_ENTRY: NavEntry = {
  path: '/settings',
  name: 'Settings',
  icon: 'settings',
  can: ['read', 'Shop'],
};

/** At the foot of a phone. The crew's whole day is three places; the others find the rest under More. */
export const CREW_ENTRIES: readonly NavEntry[] = [
  { path: '/time/clock', name: 'Clock', icon: 'timer' },
  { path: '/time', name: 'My week', icon: 'time' },
  { path: '/jobs', name: 'My jobs', icon: 'jobs' },
];
export const PHONE_ENTRIES: readonly NavEntry[] = [
  { path: '/today', name: 'Today', icon: 'today' },
  { path: '/jobs', name: 'Jobs', icon: 'jobs', can: ['read', 'Job'] },
  { path: '/time/clock', name: 'Clock', icon: 'timer', can: ['create', 'TimeEntry'] },
];
