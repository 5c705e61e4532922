import { expect, type Browser, type Page } from '@playwright/test';
import { letterTo, linkIn } from './mailbox';

export const PASSWORD = 'plenty of sawdust';
/** Tells the people of one run from those of the next, for who runs journeys against a Bookmatch that goes on. */
const run = Date.now().toString(36);

export type Person = { name: string; email: string };
export type NewShop = Person & { shop: string };

/** Somebody nobody knows yet, with an address of their own in this run. */
export function somebody(name: string): Person {
  const local = name.toLowerCase().replaceAll(/[^a-z]+/g, '-');
  return { name, email: `${local}-${run}@example.test` };
}

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

/** Ends in the shop, or for somebody of several shops at the choice between them. */
export async function signIn(page: Page, email: string, password = PASSWORD): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page).not.toHaveURL(/sign-in/);
}

export async function signOut(page: Page, { name }: Person): Promise<void> {
  await page.getByRole('button', { name: `Menu of ${name}` }).click();
  await page.getByRole('menuitem', { name: /^sign out$/i }).click();
  await expect(page).toHaveURL(/sign-in/);
}

/** The owner's side of an invitation, on the screen of the members. */
export async function invite(owner: Page, { email }: Person, role: string): Promise<void> {
  await owner.goto(`${shopRoot(owner)}/settings/members`);
  await owner.getByRole('button', { name: 'Invite somebody' }).click();
  const dialog = owner.getByRole('dialog');
  await dialog.getByLabel('E-mail').fill(email);
  await dialog.getByRole('radio', { name: new RegExp(`^${role}`) }).check();
  await dialog.getByRole('button', { name: 'Send the invitation' }).click();
  await expect(dialog).toBeHidden();
  await expect(owner.getByRole('table', { name: 'Open invitations' })).toContainText(email);
}

/** Somebody new follows the letter's link and is in. */
export async function join(page: Page, { name, email }: Person): Promise<void> {
  await page.goto(linkIn(await letterTo(email, ''), '/accept-invitation'));
  await page.getByLabel('Your name').fill(name);
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Join' }).click();
  await expect(page).toHaveURL(/\/s\/[\w-]+\//);
}

/** `/s/<slug>` of the shop a page is in. */
export function shopRoot(page: Page): string {
  const root = /\/s\/[\w-]+/.exec(new URL(page.url()).pathname)?.[0];
  expect(root, `a shop in ${page.url()}`).toBeTruthy();
  return root as string;
}

/** A phone in the hand: narrow, touched, with a session of its own. */
export async function phone(browser: Browser): Promise<Page> {
  const size = { width: 390, height: 844 };
  const context = await browser.newContext({ viewport: size, hasTouch: true, isMobile: true });
  return context.newPage();
}

/** Another desk, with a session of its own. */
export async function desk(browser: Browser): Promise<Page> {
  return (await browser.newContext()).newPage();
}
