import { expect, test, type Page } from '@playwright/test';
import { troubleOn } from './support/console';
import { firstOf, signInAs } from './support/demo-shop';
import { run } from './support/errand';
import { shopRoot } from './support/people';
import { lookAt, lookAtDialog, settled } from './support/screen-look';

/** Below the shop; `{list}` stands for the id of that list's first row. */
const OFFICE = [
  ...['/today', '/leads', '/leads/board', '/leads/new', '/leads/{/leads}', '/leads/{/leads}/edit'],
  ...['/estimates', '/estimates/new', '/estimates/{/estimates?status=draft}'],
  ...['/estimates/{/estimates?status=accepted}', '/jobs', '/jobs/board', '/jobs/new', '/jobs/{/jobs}'],
];
const MONEY_AND_SHOP = [
  ...['/time', '/time/mine', '/time/entries', '/time/members/{/members}', '/invoices', '/invoices/aging'],
  ...['/invoices/payments', '/invoices/new', '/invoices/{/invoices?standing=draft}'],
  ...['/invoices/{/invoices?standing=draft}/edit', '/invoices/{/invoices?standing=paid}'],
  ...['/customers', '/customers/new', '/customers/{/customers}', '/customers/{/customers}/edit'],
  ...['/ledger', '/ledger/entries', '/ledger/entries/{/ledger/entries}', '/ledger/accounts/1200'],
  ...['/settings/shop', '/settings/members', '/settings/operations', '/settings/card-payments'],
  ...['/settings/subscription', '/account', '/nowhere'],
];
/** What another role sees otherwise than the owner. */
const BOOKKEEPER = [
  '/today',
  '/leads/{/leads}',
  '/estimates/{/estimates}',
  '/jobs/{/jobs}',
  '/settings/shop',
];
const LEAD_HAND = ['/today', '/jobs', '/jobs/{/jobs}', '/time', '/time/entries', '/leads'];
const CREW = ['/time/clock', '/time', '/jobs', '/jobs/{/jobs}', '/account', '/invoices'];

const WALKS = [
  ['Owner', 'from a lead to a job', OFFICE],
  ['Owner', 'from time to the ledger', MONEY_AND_SHOP],
  ['Bookkeeper', 'of their own', BOOKKEEPER],
  ['Lead hand', 'of their own', LEAD_HAND],
  ['Crew', 'of their own', CREW],
] as const;

test.describe.configure({ mode: 'parallel' });

for (const [role, part, screens] of WALKS) {
  test(`the screens of the ${role.toLowerCase()}, ${part}`, async ({ page }) => {
    test.setTimeout(400_000);
    await signInAs(page, role);
    const trouble = troubleOn(page);
    const root = shopRoot(page);
    for (const screen of screens) {
      await page.goto(root + (await addressOf(page, screen)));
      await lookAt(page, `${role} ${screen}`);
      expect.soft(trouble.splice(0), `${role} ${screen}`).toEqual([]);
    }
  });
}

test('what opens over the screens', async ({ page }) => {
  await signInAs(page, 'Owner');
  const trouble = troubleOn(page);
  const root = shopRoot(page);
  for (const [screen, opener] of DIALOGS) {
    await page.goto(root + (await addressOf(page, screen)));
    await settled(page);
    await page.getByRole('button', { name: opener }).first().click();
    await lookAtDialog(page, `${opener} at ${screen}`);
  }
  expect(trouble).toEqual([]);
});

test('what stands behind a link of a screen, and the choice between shops', async ({ page }) => {
  await signInAs(page, 'Bookkeeper');
  const trouble = troubleOn(page);
  await page.goto(shopRoot(page) + (await addressOf(page, '/estimates/{/estimates?status=accepted}')));
  await page.getByRole('link', { name: 'Revision 1', exact: true }).click();
  await expect(page).toHaveURL(/\/revisions\//);
  await lookAt(page, 'one revision');
  await page.goto('/');
  await lookAt(page, 'the choice between shops');
  expect(trouble).toEqual([]);
});

test('the pages outside of a shop', async ({ page }) => {
  for (const screen of OUTSIDE) {
    // Nobody is signed in, which the browser notes as a refusal.
    const trouble = troubleOn(page, { refused: true });
    await page.goto(screen);
    await lookAt(page, screen);
    expect.soft(trouble, screen).toEqual([]);
  }
});

test('what a customer sees behind a link', async ({ page, browser }) => {
  await signInAs(page, 'Owner');
  const visitor = await (await browser.newContext()).newPage();
  const trouble = troubleOn(visitor, { refused: true });
  for (const [subject, list] of LINKED) {
    const body = { subject, subjectId: await firstOf(page, list) };
    const { url } = await run<{ url: string }>(page, '/links', { method: 'POST', body });
    await visitor.goto(url);
    await lookAt(visitor, `${subject} of ${list}`);
  }
  expect(trouble).toEqual([]);
});

const OUTSIDE = [
  ...['/sign-in', '/sign-up', '/forgot-password', '/reset-password?token=old', '/confirm-email?token=old'],
  ...['/accept-invitation?token=old', '/c/old', '/nowhere'],
];

/** A screen, and the button on it that opens a dialog. */
const DIALOGS = [
  ['/today', 'Find a customer, job or invoice'],
  ['/leads/{/leads}', 'Lost'],
  ['/customers/{/customers}', 'Add site'],
  ['/estimates/{/estimates?status=draft}', 'Send to customer'],
  ['/jobs/{/jobs}', 'Enter cost'],
  ['/jobs/{/jobs}', 'Assign'],
  ['/invoices/{/invoices?standing=open}', 'Record payment'],
  ['/time/clock', 'Another job or operation'],
  ['/settings/members', 'Invite somebody'],
  ['/settings/operations', 'Add operation'],
] as const;

const LINKED = [
  ['estimate', '/estimates?status=sent'],
  ['estimate', '/estimates?status=accepted'],
  ['invoice', '/invoices?standing=open'],
  ['invoice', '/invoices?standing=paid'],
] as const;

async function addressOf(page: Page, screen: string): Promise<string> {
  const list = /\{(.+)\}/.exec(screen)?.[1];
  return list ? screen.replace(`{${list}}`, await firstOf(page, list)) : screen;
}
