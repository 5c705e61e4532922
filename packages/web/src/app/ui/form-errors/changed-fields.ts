/**
 * After a conflict: the names of the fields that somebody else changed between what this form started from and what
 * is stored now.
 *
 * @param labels the field's name on the screen, in the order to tell them
 */
export function changedFields<Fields extends object>(
  before: Fields,
  now: Fields,
  labels: Partial<Record<keyof Fields, string>>,
): string[] {
  const keys = Object.keys(labels) as (keyof Fields)[];
  return keys
    .filter((key) => JSON.stringify(before[key]) !== JSON.stringify(now[key]))
    .map((key) => labels[key] ?? String(key));
}
