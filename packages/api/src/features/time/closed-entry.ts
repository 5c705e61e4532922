import { laborCost } from '@bookmatch/common/time/labor-cost';
import { elapsedMinutes } from '@bookmatch/common/time/punch';
import type { TimeKind } from '@bookmatch/common/time/time-contract';

type Costed = { kind: TimeKind; startedAt: Date; endedAt: Date | null; laborCostCentsPerHour: number | null };

/** What follows from an entry's ends: its minutes, and what they cost. Both empty while it has no end. */
export function measured({ kind, startedAt, endedAt, laborCostCentsPerHour }: Costed): {
  minutes: number | null;
  costCents: number | null;
} {
  if (endedAt === null) return { minutes: null, costCents: null };
  const minutes = elapsedMinutes(startedAt.toISOString(), endedAt.toISOString());
  if (kind === 'meal-break') return { minutes, costCents: 0 };
  return {
    minutes,
    costCents: laborCostCentsPerHour === null ? null : laborCost(minutes, laborCostCentsPerHour),
  };
}
