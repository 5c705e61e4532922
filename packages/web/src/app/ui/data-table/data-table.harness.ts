import { ComponentHarness, type TestKey } from '@angular/cdk/testing';

/** Reads and works a `bm-data-table` as a person does. */
export class DataTableHarness extends ComponentHarness {
  static readonly hostSelector = 'bm-data-table';

  private readonly rows = this.locatorForAll('tbody tr.row');
  private readonly links = this.locatorForAll('a.row-link');
  private readonly heads = this.locatorForAll('thead th');

  /** The text of every cell, row by row. */
  async cellTexts(): Promise<string[][]> {
    const cells = await this.locatorForAll('tbody tr.row td')();
    const texts = await Promise.all(cells.map(async (cell) => (await cell.text()).trim()));
    const width = (await this.heads()).length;
    return Array.from({ length: texts.length / width }, (_, row) =>
      texts.slice(row * width, (row + 1) * width),
    );
  }

  async rowCount(): Promise<number> {
    return (await this.rows()).length;
  }

  async sortOf(header: string): Promise<string | null> {
    return (await this.head(header)).getAttribute('aria-sort');
  }

  async sortBy(header: string): Promise<void> {
    for (const button of await this.locatorForAll('thead button.sort')())
      if ((await button.text()).trim() === header) return button.click();
    throw new Error(`${header} cannot be sorted by`);
  }

  async press(name: string): Promise<void> {
    for (const button of await this.locatorForAll('button')())
      if ((await button.text()).trim() === name) return button.click();
    throw new Error(`no button ${name}`);
  }

  /** Sends a key to the row's link and tells which row has the focus then. */
  async walk(row: number, key: TestKey): Promise<number> {
    const link = (await this.links())[row];
    await link?.focus();
    await link?.sendKeys(key);
    const focused = await Promise.all((await this.links()).map((each) => each.isFocused()));
    return focused.indexOf(true);
  }

  private async head(header: string) {
    for (const head of await this.heads()) if ((await head.text()).trim() === header) return head;
    throw new Error(`no column ${header}`);
  }
}
