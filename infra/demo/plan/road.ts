import type { Generator } from '../chance/generator.js';
import type { Project, WorkdayIndex } from './project.js';

/** The days on the way from the inquiry to the acceptance. */
export type Road = {
  leadOn: WorkdayIndex;
  contactedOn: WorkdayIndex;
  visitOn: WorkdayIndex;
  estimateOn: WorkdayIndex;
  sentOn: WorkdayIndex;
  /** Of a first offer that was changed. */
  sentAgainOn: WorkdayIndex | null;
};

/** Three to five weeks for most; the first ones came as soon as the shop could write them down. */
export function roadOf({ acceptedOn, turns }: Project, firstDay: WorkdayIndex, random: Generator): Road {
  const leadOn = Math.max(firstDay, acceptedOn - random.whole(14, 26));
  const days = acceptedOn - leadOn;
  const part = (share: number) => leadOn + Math.floor(days * share);
  return {
    leadOn,
    contactedOn: part(0.08),
    visitOn: part(0.3),
    estimateOn: part(0.45),
    sentOn: part(0.6),
    sentAgainOn: turns.includes('revised') ? part(0.82) : null,
  };
}
