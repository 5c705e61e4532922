import { expect, type Page } from '@playwright/test';

const NOTICE = 'Test payment page - no real card is charged';

/** On the payment provider's hosted page: chooses a card by its words and presses the button. */
export async function payByCard(page: Page, card: RegExp, button: RegExp): Promise<void> {
  await expect(page.getByText(NOTICE)).toBeVisible();
  await page.getByRole('radio', { name: card }).check();
  await page.getByRole('button', { name: button }).click();
}

/** On the provider's pages where a shop says who it is: everything is in order. */
export async function finishOnboarding(page: Page, business: string): Promise<void> {
  await expect(page.getByText(NOTICE)).toBeVisible();
  await page.getByLabel('Business name').fill(business);
  await page.getByRole('button', { name: 'Finish: payments can begin' }).click();
}
