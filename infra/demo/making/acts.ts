import type { ShopScope } from '@bookmatch/api/platform/database/scope';
import type { Person } from '../cast/people.js';
import type { Desk } from './desk.js';
import type { Trail } from './trail.js';

/** What somebody did at a moment, in the transaction it is given. It may run twice when a transaction lost a race. */
export type SharedAct = { at: Date; by: Person; run: (scope: ShopScope) => Promise<void> };
/** What talks to others than the database, and opens its transactions itself. */
export type OwnAct = { at: Date; alone: () => Promise<void> };
export type Act = SharedAct | OwnAct;

const byTime = (one: Act, other: Act): number => one.at.getTime() - other.at.getTime();

/** In the order of time; of the same moment in the order given. */
export function inOrder(acts: readonly Act[]): Act[] {
  return [...acts].sort(byTime);
}

/**
 * Carries acts out one after another. What follows each other shares a transaction, since a commit costs more than an
 * act; each act still has its own moment and its own author.
 */
export async function carryOut(desk: Desk, trail: Trail, acts: readonly Act[]): Promise<void> {
  for (const batch of batches(inOrder(acts))) {
    const [first] = batch;
    if (first === undefined) continue;
    if ('alone' in first) await first.alone();
    else await together(desk, trail, batch as readonly SharedAct[]);
  }
}

async function together(desk: Desk, trail: Trail, acts: readonly SharedAct[]): Promise<void> {
  const [first] = acts;
  if (first === undefined) return;
  const back = trail.bookmark();
  await desk.platform.work.transaction(desk.stampOf(first.by, first.at), async (scope) => {
    back();
    for (const { by, at, run } of acts) await run(desk.memberScope(scope, by, at));
  });
}

function batches(acts: readonly Act[]): Act[][] {
  const found: Act[][] = [];
  for (const act of acts) {
    const last = found.at(-1);
    const joins = last !== undefined && !('alone' in act) && !last.some((one) => 'alone' in one);
    if (joins) last.push(act);
    else found.push([act]);
  }
  return found;
}
