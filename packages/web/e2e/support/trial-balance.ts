import { expect, type Page } from '@playwright/test';
import { shopRoot } from './people';

/** What stands on the screen of the trial balance: by the account's name, its debit and credit as written. */
export type Balances = Record<string, [debit: string, credit: string]>;

export async function readTrialBalance(page: Page): Promise<Balances> {
  await page.goto(`${shopRoot(page)}/ledger`);
  const table = page.getByRole('region', { name: /^Trial balance/ }).getByRole('table');
  await expect(table).toBeVisible();
  const rows = await table.locator('tbody tr, tfoot tr').all();
  const read = rows.map(async (row): Promise<[string, [string, string]]> => {
    const [name, , debit, credit] = await row.locator('td').allInnerTexts();
    return [(name ?? '').replace(/^\d+/, '').trim(), [(debit ?? '').trim(), (credit ?? '').trim()]];
  });
  return Object.fromEntries(await Promise.all(read));
}
