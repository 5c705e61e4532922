import * as z from 'zod';

export const DEFAULT_LIMIT = 50;
export const MAX_LIMIT = 200;

/**
 * The query of a list route. `sort` is one of the slice's allowed keys, with a leading minus for descending.
 * Values arrive as text from the address line, so numbers are read from text.
 */
export function listQuerySchema<const Keys extends readonly [string, ...string[]]>(sortKeys: Keys) {
  const directed = sortKeys.flatMap((key) => [key, `-${key}`]) as [SortOf<Keys>, ...SortOf<Keys>[]];
  return z.strictObject({
    q: z.string().trim().max(100, 'Search for at most 100 characters.').optional(),
    sort: z.enum(directed, { error: `Sort by one of ${sortKeys.join(', ')}.` }).optional(),
    after: z.string().max(600).optional(),
    limit: z
      .string()
      .regex(/^\d{1,3}$/, 'Give a whole number.')
      .transform(Number)
      .pipe(z.int().min(1).max(MAX_LIMIT, `Ask for at most ${MAX_LIMIT} rows.`))
      .optional(),
  });
}
export type SortOf<Keys extends readonly string[]> = Keys[number] | `-${Keys[number]}`;

/** What the client passes to build a list's address: the query before text is read into numbers. */
export type ListRequest<Sort extends string = string> = {
  q?: string;
  sort?: Sort;
  after?: string;
  limit?: number;
};

/** The answer of a list route. */
export function pageSchema<Row extends z.ZodType>(row: Row) {
  return z.object({ rows: z.array(row), next: z.string().nullable(), total: z.int().optional() });
}
export type Page<Row> = { rows: Row[]; next: string | null; total?: number };

/** The answer of a list that is short by nature and always given whole (members, operations, own sessions). */
export function rowsSchema<Row extends z.ZodType>(row: Row) {
  return z.object({ rows: z.array(row) });
}
export type Rows<Row> = { rows: Row[] };
