import { expect, type Locator, type Page } from '@playwright/test';

export type Line = {
  what: string;
  kind: string;
  quantity: string;
  unit: string;
  cost: string;
  price: string;
  /** The operation and its hours for one unit. */
  work?: [operation: string, hours: string];
  untaxed?: boolean;
};

/** The builder of a draft on an owner's screen. */
export class EstimateDesk {
  constructor(private readonly page: Page) {}

  async addRoom(name: string, lines: Line[]): Promise<void> {
    const { page } = this;
    const names = page.getByLabel('Name of the room');
    const at = await names.count();
    await page.getByRole('button', { name: 'Add room' }).click();
    await names.nth(at).fill(name);
    const room = page.locator('bm-room-editor').nth(at);
    const rows = room.locator('bm-line-row');
    for (const [index, line] of lines.entries()) {
      if ((await rows.count()) <= index) await room.getByRole('button', { name: 'Add line' }).click();
      await this.write(rows.nth(index), line);
    }
  }

  /** @param rate in percent, such as `8.25` */
  async setTaxRate(rate: string): Promise<void> {
    await this.page.getByLabel('Tax rate').fill(rate);
  }

  async expectSaved(): Promise<void> {
    await expect(this.page.getByRole('status').filter({ hasText: /sav/i })).toHaveText(/^Saved/);
  }

  /** A row of the price, such as `Price before tax`, and what stands beside it. */
  price(row: string): Locator {
    return this.page
      .getByRole('region', { name: 'Price' })
      .locator('dl > div')
      .filter({ has: this.page.locator('dt', { hasText: new RegExp(`^\\s*${row}`) }) })
      .locator('dd');
  }

  /** What the stages of the billing schedule come to. */
  stageAmounts(): Locator {
    return this.page.getByRole('region', { name: 'Billing schedule' }).locator('li .amount');
  }

  async send(to: string): Promise<void> {
    const { page } = this;
    await page.getByRole('button', { name: 'Send to customer' }).click();
    const dialog = page.getByRole('dialog');
    await expect(dialog.getByLabel('E-mail address')).toHaveValue(to);
    await dialog.getByLabel('Message').fill('As we talked it over on site.');
    await dialog.getByRole('button', { name: 'Send', exact: true }).click();
    await expect(dialog).toBeHidden();
  }

  private async write(row: Locator, line: Line): Promise<void> {
    await row.getByRole('textbox', { name: 'Description' }).fill(line.what);
    await row.getByRole('combobox', { name: 'Kind' }).selectOption({ label: line.kind });
    await row.getByRole('textbox', { name: 'Quantity' }).fill(line.quantity);
    await row.getByRole('combobox', { name: 'Unit', exact: true }).selectOption({ label: line.unit });
    await row.getByRole('textbox', { name: 'Unit cost' }).fill(line.cost);
    await row.getByRole('textbox', { name: 'Unit price' }).fill(line.price);
    if (!line.work && !line.untaxed) return;
    await row.getByRole('button', { name: /^Menu of line/ }).click();
    await this.page.getByRole('menuitem', { name: 'Hours, markup and tax' }).click();
    if (line.work)
      await row.getByRole('combobox', { name: 'Operation' }).selectOption({ label: line.work[0] });
    if (line.work) await row.getByRole('textbox', { name: 'Hours a unit' }).fill(line.work[1]);
    if (line.untaxed) await row.getByRole('checkbox', { name: 'Taxable' }).uncheck();
  }
}
