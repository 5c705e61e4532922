import { injectCan } from '../../platform/session/ability';

/** What quick find looks through for this role. */
export function injectFindWords(): string {
  const can = injectCan();
  if (can('read', 'Invoice')) return 'Find a customer, job or invoice';
  return can('read', 'Customer') ? 'Find a customer or job' : 'Find a job';
}
