import type { InstantText } from '@bookmatch/common/calendar/shop-dates';
import type { Problem } from '@bookmatch/common/problems/problem';
import type { KeptPunch, PunchedWork } from './punch';

/** Why punches wait on the device, although nothing is wrong with them. */
export type Waiting = 'no-network' | 'no-answer' | 'signed-out' | 'lapsed';

/** Codes that say nothing about the punch itself: it is sent again later. */
const LATER = new Set(['in-progress', 'too-many-requests', 'cross-site', 'not-ready']);

/** What a failure means for the punch that was being sent: it waits, or it was refused and a person must settle it. */
export function afterFailure({ status, code }: Problem): Waiting | 'refused' {
  if (status === 0) return 'no-network';
  if (code === 'not-signed-in') return 'signed-out';
  if (code === 'subscription-lapsed') return 'lapsed';
  return status >= 500 || status === 408 || LATER.has(code) ? 'no-answer' : 'refused';
}

export function withRefusal(order: number, sentence: string) {
  return (punches: readonly KeptPunch[]): KeptPunch[] =>
    change(punches, order, (punch) => ({ ...punch, refused: sentence }));
}

/** The same stretch of time on something else. It is sent again at its place in the order. */
export function putOn(order: number, work: PunchedWork) {
  return (punches: readonly KeptPunch[]): KeptPunch[] =>
    change(punches, order, (punch) => ({ ...punch, work, refused: null }));
}

/** The same punch at another instant. */
export function movedTo(order: number, at: InstantText) {
  return (punches: readonly KeptPunch[]): KeptPunch[] =>
    change(punches, order, (punch) => ({ ...punch, at, refused: null }));
}

export function without(order: number) {
  return (punches: readonly KeptPunch[]): KeptPunch[] => punches.filter((punch) => punch.order !== order);
}

/**
 * Gives a refused punch up. When it was to begin an entry, the later punch that was to end that entry ends what had
 * been open before; nothing was, so it goes too.
 */
export function letGo(order: number) {
  return (punches: readonly KeptPunch[]): KeptPunch[] => {
    const gone = punches.find((punch) => punch.order === order);
    const rest = without(order)(punches);
    if (gone?.type !== 'in') return rest;
    const { entryId, before } = gone;
    return rest.flatMap((punch): KeptPunch[] => {
      if (punch.type === 'in') return [punch.before === entryId ? { ...punch, before } : punch];
      if (punch.entryId !== entryId) return [punch];
      return before === null ? [] : [{ ...punch, entryId: before, refused: null }];
    });
  };
}

function change(
  punches: readonly KeptPunch[],
  order: number,
  to: (punch: KeptPunch) => KeptPunch,
): KeptPunch[] {
  return punches.map((punch) => (punch.order === order ? to(punch) : punch));
}
