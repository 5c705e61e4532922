import type { Page } from '@bookmatch/common/wire/list';
import { stringify } from 'csv-stringify';
import { Readable } from 'node:stream';
import type { Download } from './route.js';

export const EXPORT_BATCH = 1000;
type Cell = string | number | null;
/** Column heads in order, each with what stands in it. */
export type CsvColumns<Row> = Record<string, (row: Row) => Cell>;

/**
 * A CSV file (RFC 4180) that is written while it is sent, row by row, so that its length costs no memory. Cells that a
 * spreadsheet would run as a formula are neutralized; give amounts that go both ways as two columns, since a leading
 * minus counts as one.
 *
 * @param name without the suffix
 */
export function csvDownload<Row>(name: string, columns: CsvColumns<Row>, rows: AsyncIterable<Row>): Download {
  const heads = Object.keys(columns);
  const csv = stringify({ header: true, columns: heads, escape_formulas: true, record_delimiter: '\r\n' });
  const source = Readable.from(cellsOf(columns, rows));
  source.on('error', (error) => csv.destroy(error));
  csv.on('close', () => source.destroy());
  return { download: { name: `${name}.csv`, type: 'text/csv; charset=utf-8', body: source.pipe(csv) } };
}

async function* cellsOf<Row>(columns: CsvColumns<Row>, rows: AsyncIterable<Row>): AsyncGenerator<string[]> {
  for await (const row of rows) yield Object.values(columns).map((cell) => String(cell(row) ?? ''));
}

/** Every row of a list, page by page. */
export async function* everyRow<Row>(
  read: (after: { after?: string }) => Promise<Page<Row>>,
): AsyncGenerator<Row> {
  let after: { after?: string } | null = {};
  while (after !== null) {
    const page: Page<Row> = await read(after);
    yield* page.rows;
    after = page.next === null ? null : { after: page.next };
  }
}

/** `125000` cents as `1250.00`, the way spreadsheets read amounts. Empty for nothing. */
export function amountCell(cents: number): string {
  return (cents / 100).toFixed(2);
}
