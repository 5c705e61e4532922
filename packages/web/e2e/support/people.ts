import { expect, type Page } from '@playwright/test';
import { letterTo, linkIn } from './mailbox';

export const PASSWORD = 'plenty of sawdust';
export type NewShop = { shop: string; name: string; email: string };

/** Opens a shop the way its owner does: the form, the letter, its link. Ends on the shop's first page. */
export async function signUp(page: Page, { shop, name, email }: NewShop): Promise<void> {
  await page.goto('/sign-up');
  await page.getByLabel('Shop name').fill(shop);
  await page.getByLabel('Your name').fill(name);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Open the shop' }).click();
  await expect(page.getByRole('heading', { name: 'Look into your mail' })).toBeVisible();
  await page.goto(linkIn(await letterTo(email, 'Confirm'), '/confirm-email'));
  await expect(page).toHaveURL(/\/s\/[\w-]+\//);
}

export async function signIn(page: Page, email: string, password = PASSWORD): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page).toHaveURL(/\/s\/[\w-]+\//);
}
