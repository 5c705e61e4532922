import { expect, type Page } from '@playwright/test';

/** On the screen of a draft: gives it its number and mails it to the customer. */
export async function issueAndSend(page: Page, to: string): Promise<void> {
  await page.getByRole('button', { name: 'Issue and send' }).click();
  const dialog = page.getByRole('dialog');
  await expect(dialog.getByLabel('To', { exact: true })).toHaveValue(to);
  await dialog.getByRole('button', { name: 'Issue and send' }).click();
  await expect(dialog).toBeHidden();
  await expect(page.getByRole('region', { name: 'Letters' })).toContainText(to);
}

/** @param amount as typed, such as `1,500`; all that is owed when left out */
export async function recordCheck(page: Page, number: string, amount?: string): Promise<void> {
  await page.getByRole('button', { name: 'Record payment' }).click();
  const dialog = page.getByRole('dialog');
  if (amount) await dialog.getByLabel('Amount').fill(amount);
  await dialog.getByLabel('Check number or reference').fill(number);
  await dialog.getByRole('button', { name: 'Record payment' }).click();
  await expect(dialog).toBeHidden();
  await expect(page.getByRole('region', { name: 'Payments' })).toContainText(number);
}
