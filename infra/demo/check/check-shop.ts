import { dateIn } from '@bookmatch/common/calendar/shop-dates';
import type { Person } from '../cast/people.js';
import type { Desk } from '../making/desk.js';
import { reading } from '../making/opening.js';
import { checkBooks } from './books.js';
import type { Finding } from './finding.js';
import { checkWork } from './work.js';

/** Everything that has to be so in a shop, as its owner sees it at a moment. */
export function checkShop(desk: Desk, owner: Person, now: Date): Promise<Finding[]> {
  const today = dateIn(desk.zone, now.toISOString());
  return reading(desk, owner, now, async (scope) => [
    ...(await checkBooks(scope, today)),
    ...(await checkWork(scope, desk.services, now)),
  ]);
}

/** @throws with every fault, named */
export function refuseFaults(findings: readonly Finding[]): void {
  const wrong = findings.filter(({ faults }) => faults.length > 0);
  if (wrong.length === 0) return;
  const lines = wrong.map(({ name, faults }) => `  not so: ${name}: ${faults.slice(0, 5).join(', ')}`);
  throw new Error(`The demo shop does not add up.\n${lines.join('\n')}`);
}
