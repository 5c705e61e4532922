/** One step over the board: to the next column, or within one. */
export type CardStep = { column: -1 | 0 | 1; row: -1 | 0 | 1 };
type Columns = readonly { rows: readonly { id: string }[] }[];

/** The card beside another one; empty columns are passed over. Null at the edge of the board. */
export function cardBeside(columns: Columns, id: string, { column, row }: CardStep): string | null {
  const from = columns.findIndex(({ rows }) => rows.some((card) => card.id === id));
  const place = columns[from]?.rows.findIndex((card) => card.id === id) ?? -1;
  if (place < 0) return null;
  if (column === 0) return columns[from]?.rows[place + row]?.id ?? null;
  for (let at = from + column; at >= 0 && at < columns.length; at += column) {
    const rows = columns[at]?.rows ?? [];
    if (rows.length > 0) return rows[Math.min(place, rows.length - 1)]?.id ?? null;
  }
  return null;
}
