import type { NewRow, Patch, ShopRepository } from '../../platform/database/shop-repository.js';
import type { ShopRow } from '../../platform/database/rows.js';

/**
 * Makes the stored rows what is wanted, told apart by id: inserts the new and updates those that differ.
 * Answers how many were written and which stored rows nobody wants any more, for the caller to remove in due order.
 */
export async function putRows<Row extends ShopRow>(
  repository: ShopRepository<Row>,
  stored: readonly Row[],
  wanted: readonly NewRow<Row>[],
): Promise<{ written: number; left: Row[] }> {
  const byId = new Map(stored.map((row) => [row.id, row]));
  const fresh: NewRow<Row>[] = [];
  let written = 0;
  for (const row of wanted) {
    const { id, ...values } = row as NewRow<Row> & { id: string };
    const known = byId.get(id);
    if (known) written += (await repository.update(known, values as unknown as Patch<Row>)) === known ? 0 : 1;
    else fresh.push(row);
    byId.delete(id);
  }
  await repository.insertMany(fresh);
  return { written: written + fresh.length, left: [...byId.values()] };
}

export async function removeRows<Row extends ShopRow>(
  repository: ShopRepository<Row>,
  rows: readonly Row[],
): Promise<void> {
  for (const row of rows) await repository.delete(row);
}
