import { expect, type Page } from '@playwright/test';
import { letterTo, linkIn } from './mailbox';
import { payByCard } from './payment-pages';

/** Opens what the newest letter with these words in its subject links to. */
export async function followLetter(page: Page, address: string, subject: string): Promise<void> {
  await page.goto(linkIn(await letterTo(address, subject), '/c/'));
}

export async function ask(page: Page, question: string): Promise<void> {
  await page.getByLabel('Your question').fill(question);
  await page.getByRole('button', { name: 'Send question' }).click();
  await expect(page.getByText('You asked')).toBeVisible();
  await expect(page.getByLabel('Your question')).toHaveValue('');
}

export async function accept(page: Page, name: string): Promise<void> {
  await page.getByRole('button', { name: 'Accept this estimate' }).click();
  await page.getByLabel('Your name').fill(name);
  await page.getByRole('checkbox', { name: /^I accept this estimate/ }).check();
  await page.getByRole('button', { name: 'Accept estimate' }).click();
  await expect(page.getByRole('heading', { name: `Thank you, ${name}` })).toBeVisible();
}

/** Pays what is owed, first with a card that is declined. */
export async function payInvoice(page: Page, amount: string): Promise<void> {
  await page.getByRole('button', { name: `Pay ${amount} by card` }).click();
  await payByCard(page, /0002, is declined/, /^Pay/);
  await expect(page.getByRole('alert')).toContainText('Your card was declined.');
  await payByCard(page, /4242, goes through/, /^Pay/);
  await expect(page.getByText('Your payment came through')).toBeVisible();
  await expect(page.getByText('Nothing is owed')).toBeVisible();
}
