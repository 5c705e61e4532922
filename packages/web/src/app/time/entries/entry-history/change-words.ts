import { formatInstant } from '@bookmatch/common/calendar/format';
import type { Correction, TimeEntryFacts } from '@bookmatch/common/time/time-contract';

const FIELDS: readonly [keyof TimeEntryFacts, string][] = [
  ['startedAt', 'Start'],
  ['endedAt', 'End'],
  ['kind', 'Kind'],
  ['note', 'Note'],
];

/** What a correction did, a sentence a field: `End: Thu, Jan 14, 2027, 5:00 pm → …, 3:15 pm`. */
export function changeWords({ before, after }: Pick<Correction, 'before' | 'after'>, zone: string): string[] {
  if (!before) return ['The entry was added.'];
  if (!after) return ['The entry was voided.'];
  const words = FIELDS.filter(([key]) => before[key] !== after[key]).map(
    ([key, name]) => `${name}: ${valueOf(before, key, zone)} → ${valueOf(after, key, zone)}`,
  );
  if (before.jobId !== after.jobId) words.push('It was put on another job.');
  if (before.operationId !== after.operationId) words.push('It was put on another operation.');
  return words;
}

function valueOf(facts: TimeEntryFacts, key: keyof TimeEntryFacts, zone: string): string {
  const value = facts[key];
  if (value === null || value === '') return key === 'endedAt' ? 'open' : 'empty';
  if (key === 'startedAt' || key === 'endedAt') return formatInstant(value, zone);
  if (key === 'kind') return value === 'work' ? 'work' : 'meal break';
  return value;
}
