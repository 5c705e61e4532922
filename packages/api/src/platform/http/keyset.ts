import type { Page } from '@bookmatch/common/wire/list';
import { DEFAULT_LIMIT } from '@bookmatch/common/wire/list';
import type { ShopQuery } from '../database/shop-query.js';
import { ProblemError } from './problem-error.js';

/** A list's allowed sort keys: what the client says → the column, which must be NOT NULL and picked under this name. */
export type SortColumns<Key extends string> = Record<Key, string>;
type ListRequest = { sort?: string; after?: string; limit?: number };
type Cursor = [value: string | number, id: string];

/**
 * One page of a list, by keyset: `a <= ? and (a < ? or id < ?)` uses the index where a row tuple would not.
 *
 * The query must pick `id`. Sorting is by an allow-listed column, then by id. `total` is counted on the first page.
 */
export async function keysetPage<Row extends { id: string }, Key extends string>(
  query: ShopQuery,
  columns: { id: string; sorts: SortColumns<Key>; standard: Key | `-${Key}` },
  request: ListRequest,
): Promise<Page<Row>> {
  const sort = request.sort ?? columns.standard;
  const descending = sort.startsWith('-');
  const column = columns.sorts[sort.replace(/^-/, '') as Key];
  const limit = request.limit ?? DEFAULT_LIMIT;

  if (request.after !== undefined)
    applyCursor(query, column, columns.id, descending, readCursor(request.after));
  const direction = descending ? 'DESC' : 'ASC';
  const rows = await query
    .pick({ _sortValue: column })
    .orderBy(column, direction)
    .orderBy(columns.id, direction)
    .limit(limit + 1)
    .all<Row & { _sortValue: unknown }>();

  const last = rows.length > limit ? rows[limit - 1] : undefined;
  const total =
    request.after === undefined ? await totalOf(query, rows.length, last !== undefined) : undefined;
  return {
    rows: rows.slice(0, limit),
    next: last ? writeCursor([cursorValue(last._sortValue), last.id]) : null,
    ...(total === undefined ? {} : { total }),
  };
}

/** Counted only when there is more than the page shows. */
function totalOf(query: ShopQuery, shown: number, hasMore: boolean): Promise<number> | number {
  return hasMore ? query.count() : shown;
}

function applyCursor(
  query: ShopQuery,
  column: string,
  id: string,
  descending: boolean,
  [value, lastId]: Cursor,
): void {
  const sign = descending ? '<' : '>';
  query.where(
    `${column} ${sign}= :afterValue and (${column} ${sign} :afterValue or ${id} ${sign} :afterId)`,
    {
      afterValue: value,
      afterId: lastId,
    },
  );
}

const cursorValue = (value: unknown) =>
  value instanceof Date ? value.toISOString().replace('T', ' ').replace('Z', '') : (value as string | number);
const writeCursor = (cursor: Cursor) => Buffer.from(JSON.stringify(cursor)).toString('base64url');

function readCursor(text: string): Cursor {
  try {
    const cursor = JSON.parse(Buffer.from(text, 'base64url').toString()) as unknown;
    if (
      Array.isArray(cursor) &&
      cursor.length === 2 &&
      ['string', 'number'].includes(typeof cursor[0]) &&
      typeof cursor[1] === 'string'
    )
      return cursor as Cursor;
  } catch {
    // falls through to the refusal
  }
  throw new ProblemError('malformed-request', 'This page marker is not one of ours.');
}

/** A search text for LIKE: `%`, `_` and `\` stand for themselves. */
export function likePattern(text: string): string {
  return `%${text.replace(/[\\%_]/g, '\\$&')}%`;
}
