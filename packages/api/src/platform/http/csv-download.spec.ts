import type { Readable } from 'node:stream';
import { amountCell, csvDownload, everyRow } from './csv-download.js';

async function* rowsOf<Row>(...rows: Row[]): AsyncGenerator<Row> {
  yield* rows;
}
async function textOf(body: Readable | Buffer): Promise<string> {
  let text = '';
  for await (const chunk of body as Readable) text += String(chunk);
  return text;
}

describe('a CSV download', () => {
  it('quotes as RFC 4180 says and neutralizes formulas', async () => {
    const rows = rowsOf({ name: 'Calder, "Ines"', sum: 5 }, { name: '=HYPERLINK("x")', sum: 0 });
    const { download } = csvDownload('list', { Name: (row) => row.name, Sum: (row) => row.sum }, rows);
    expect(download.name).toBe('list.csv');
    expect(await textOf(download.body)).toBe(
      'Name,Sum\r\n"Calder, ""Ines""",5\r\n"\'=HYPERLINK(""x"")",0\r\n',
    );
  });

  it('breaks off instead of ending as if it were whole when a row cannot be read', async () => {
    async function* broken(): AsyncGenerator<{ name: string }> {
      yield { name: 'first' };
      throw new TypeError('gone');
    }
    const { download } = csvDownload('list', { Name: (row) => row.name }, broken());
    await expect(textOf(download.body)).rejects.toThrow('gone');
  });

  it('walks all pages', async () => {
    const pages = { first: { rows: [1, 2], next: 'b' }, b: { rows: [3], next: null } };
    const seen: number[] = [];
    for await (const row of everyRow(async ({ after }) => pages[(after ?? 'first') as 'first' | 'b']))
      seen.push(row);
    expect(seen).toEqual([1, 2, 3]);
  });

  it('writes amounts to the cent', () => {
    expect([0, 5, 125_000, 9_999_999_999].map(amountCell)).toEqual([
      '0.00',
      '0.05',
      '1250.00',
      '99999999.99',
    ]);
  });
});
