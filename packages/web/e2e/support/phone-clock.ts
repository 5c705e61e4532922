import { expect, type Locator, type Page } from '@playwright/test';

/** What the phone says is running. */
export const clockOn = (hand: Page): Locator => hand.getByRole('region', { name: 'The clock' });

/** Begins with something by the way that always works: the job first, then what is done on it. */
export async function clockIn(hand: Page, job: string, operation: string): Promise<void> {
  await hand.getByRole('button', { name: 'Another job or operation' }).click();
  const dialog = hand.getByRole('dialog');
  await dialog.getByRole('button', { name: job }).click();
  await dialog.getByRole('button', { name: operation }).click();
  await expect(dialog).toBeHidden();
  await expect(clockOn(hand)).toContainText(operation);
}

export async function clockOut(hand: Page): Promise<void> {
  await clockOn(hand).getByRole('button', { name: 'Clock out' }).click();
  await expect(clockOn(hand)).toContainText('Not clocked in');
}
