/** A leading minus is descending. Pressing the column in use turns the order around, another one starts ascending. */
export function nextSort(current: string | undefined, key: string): string {
  return current === key ? `-${key}` : key;
}

/** For `aria-sort`, where only the column in use says anything. */
export function sortDirection(
  current: string | undefined,
  key: string | undefined,
): 'ascending' | 'descending' | null {
  if (!key || !current) return null;
  if (current === key) return 'ascending';
  return current === `-${key}` ? 'descending' : null;
}
