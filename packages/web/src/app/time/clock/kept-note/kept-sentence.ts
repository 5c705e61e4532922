import type { Waiting } from '../../punches/settle-punches';

export type Kept = {
  /** Punches that may be sent. */
  count: number;
  waiting: Waiting | null;
  /** The first in the order was refused and holds up these. */
  behindRefused: boolean;
  outlivesPage: boolean;
};

const WHY: Record<Waiting, string> = {
  'no-network': 'No network.',
  'no-answer': 'Bookmatch does not answer right now.',
  'signed-out': 'You were signed out.',
  lapsed: 'The subscription has lapsed.',
};

/** What is said about the punches that wait; nothing while they are on their way. */
export function keptSentence({ count, waiting, behindRefused, outlivesPage }: Kept): string {
  if (count === 0 || (waiting === null && !behindRefused)) return '';
  const kept = count === 1 ? '1 punch is' : `${count} punches are`;
  const place = outlivesPage
    ? `${kept} kept on this device and will be sent.`
    : `${kept} kept while this page is open. Do not close it: this browser keeps nothing.`;
  return waiting === null ? place : `${WHY[waiting]} ${place}`;
}
