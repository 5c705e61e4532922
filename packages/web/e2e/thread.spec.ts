import { expect, test, type Page } from '@playwright/test';
import { troubleOn } from './support/console';
import { accept, ask, followLetter, payInvoice } from './support/customer-page';
import { EstimateDesk, type Line } from './support/estimate-desk';
import { issueAndSend, recordCheck } from './support/invoice-desk';
import { letterTo } from './support/mailbox';
import { finishOnboarding } from './support/payment-pages';
import { desk, invite, join, phone, shopRoot, signUp, somebody } from './support/people';
import { clockIn, clockOut } from './support/phone-clock';
import { readTrialBalance } from './support/trial-balance';

const owner = somebody('Marisol Vega');
const bookkeeper = somebody('Ottoline Pryce');
const crew = somebody('Dag Ellery');
const customer = somebody('Corwin Ashdown');
const TWO_HOURS_MS = 7_200_000;
const TITLE = 'Kitchen and mudroom in white oak';

/** 7 x 689.99 + 22.5 x 9.35 and 2,150.00 + 16 x 75.00 make 8,390.31, of which 7,190.31 is taxed. */
const KITCHEN: Line[] = [
  {
    ...{ what: 'Base cabinets, white oak', kind: 'Material', quantity: '7', unit: 'each' },
    ...{ cost: '412.50', price: '689.99', work: ['Assemble boxes', '6'] },
  },
  {
    ...{ what: 'Crown molding', kind: 'Material', quantity: '22.5', unit: 'ft' },
    ...{ cost: '4.10', price: '9.35' },
  },
];
const MUDROOM: Line[] = [
  {
    ...{ what: 'Locker wall', kind: 'Material', quantity: '1', unit: 'each' },
    ...{ cost: '900', price: '2,150', work: ['Cut sheet goods', '14'] },
  },
  {
    ...{ what: 'Hanging it all', kind: 'Install', quantity: '16', unit: 'hour' },
    ...{ cost: '42', price: '75', work: ['Install', '1'], untaxed: true },
  },
];
/** 8.25 % of 7,190.31 is 593.20; 40, 40 and 20 percent of 8,983.51 by largest remainder. */
const [NET, TAX, TOTAL] = ['$8,390.31', '$593.20', '$8,983.51'];
const [DEPOSIT, SECOND, LAST] = ['$3,593.41', '$3,593.40', '$1,796.70'];

/** From the first call to the last check, by the hands of everybody it takes. */
test('one job runs through the shop', async ({ page, browser }) => {
  test.setTimeout(300_000);
  const [books, hand, visitor] = [await desk(browser), await phone(browser), await desk(browser)];
  const trouble = [page, books, hand, visitor].map((one) => troubleOn(one, { refused: true }));
  let jobPath = '';

  await test.step('the owner opens the shop and asks two people in', async () => {
    await signUp(page, { shop: 'Saltbox Cabinet Shop', ...owner });
    await invite(page, bookkeeper, 'Bookkeeper');
    await invite(page, crew, 'Crew');
    await join(books, bookkeeper);
    await join(hand, crew);
  });

  await test.step('a lead comes in and is followed up', async () => {
    await page.goto(`${shopRoot(page)}/leads`);
    await page.getByRole('link', { name: 'Add lead' }).click();
    await page.getByLabel('Title').fill(TITLE);
    await choose(page, 'Where it came from', 'Referral');
    await page.getByLabel('Expected amount').fill('9,000');
    await page.getByLabel('Name', { exact: true }).fill(customer.name);
    await page.getByLabel('E-mail').fill(customer.email);
    await page.getByLabel('Street').fill('14 Tanner Row');
    await page.getByLabel('City').fill('Millbrook');
    await page.getByRole('button', { name: 'Save lead' }).click();
    await expect(page.getByRole('heading', { name: TITLE, level: 1 })).toBeVisible();
    await page.getByRole('button', { name: 'Set the next step' }).click();
    await page.getByLabel('What', { exact: true }).fill('Measure on site');
    await page.getByRole('button', { name: 'Tomorrow' }).click();
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await expect(page.getByRole('region', { name: 'Next step' })).toContainText('Measure on site');
  });

  await test.step('the lead becomes a customer with a site, and an estimate', async () => {
    await page.getByRole('button', { name: 'Make a customer' }).click();
    const dialog = page.getByRole('dialog');
    await expect(dialog.getByLabel('Name', { exact: true })).toHaveValue(customer.name);
    const withSite = dialog.getByRole('checkbox', { name: 'Add the site' });
    await withSite.check();
    await dialog.getByLabel('Name of the site').fill('Tanner Row house');
    await dialog.getByRole('button', { name: 'Make the customer' }).click();
    await expect(dialog).toBeHidden();
    await expect(page.getByText('Tanner Row house')).toBeVisible();
    await page.getByRole('button', { name: 'Start an estimate' }).click();
    await page.getByRole('button', { name: 'Start the estimate' }).click();
    await expect(page).toHaveURL(/\/estimates\/[\w-]+$/);
  });

  await test.step('the estimate is written, priced and sent', async () => {
    const estimate = new EstimateDesk(page);
    await estimate.addRoom('Kitchen', KITCHEN);
    await estimate.addRoom('Mudroom', MUDROOM);
    await estimate.setTaxRate('8.25');
    await expect(estimate.price('Price before tax')).toContainText(NET);
    await expect(estimate.price('Sales tax')).toContainText(TAX);
    await expect(estimate.price('Price$')).toContainText(TOTAL);
    await expect(estimate.stageAmounts()).toHaveText([DEPOSIT, SECOND, LAST]);
    await estimate.expectSaved();
    await estimate.send(customer.email);
    await expect(page.getByText('Sent', { exact: true }).first()).toBeVisible();
  });

  await test.step('the customer reads, asks, is answered and accepts', async () => {
    await followLetter(visitor, customer.email, 'Estimate');
    await expect(visitor.getByRole('heading', { name: TITLE, level: 1 })).toBeVisible();
    await expect(visitor.getByText(TOTAL).first()).toBeVisible();
    await expect(visitor.getByText('412.50')).toHaveCount(0);
    await ask(visitor, 'Is the oak quarter sawn?');
    await page.reload();
    await page.getByLabel('Answer').fill('It is, on every face you see.');
    await page.getByRole('button', { name: 'Send answer' }).click();
    await expect(page.getByRole('region', { name: 'Questions' })).toContainText(`${owner.name},`);
    await letterTo(customer.email, 'Your question');
    await visitor.reload();
    await expect(visitor.getByText('It is, on every face you see.')).toBeVisible();
    await accept(visitor, customer.name);
  });

  await test.step('there is a job with the hours that were planned', async () => {
    await page.reload();
    await page.getByRole('link', { name: /^Open job/ }).click();
    await expect(page).toHaveURL(/\/jobs\//);
    jobPath = new URL(page.url()).pathname;
    await expectHours(page, ['14.0 h Cut sheet goods 0.0 h', '42.0 h Assemble boxes 0.0 h']);
    await expectHours(page, ['16.0 h Install 0.0 h', '72.0 h Total 0.0 h']);
  });

  await test.step('the shop sets up card payments', async () => {
    await page.goto(`${shopRoot(page)}/settings/card-payments`);
    await page.getByRole('button', { name: 'Set up card payments' }).click();
    await finishOnboarding(page, 'Saltbox Cabinet Shop');
    await expect(page.getByText('Every invoice carries a button to pay it by card.')).toBeVisible();
  });

  await test.step('the deposit is billed and paid by card', async () => {
    await page.goto(jobPath);
    await page.getByRole('button', { name: 'Issue the deposit' }).click();
    await issueAndSend(page, customer.email);
    await followLetter(visitor, customer.email, 'Invoice 2001 ');
    await payInvoice(visitor, DEPOSIT);
    await letterTo(customer.email, 'Receipt');
    await page.reload();
    await expect(page.getByText('Paid', { exact: true }).first()).toBeVisible();
    const before = await readTrialBalance(page);
    expect(before['Customer deposits']).toEqual(['', bare(DEPOSIT)]);
    expect(before['Sales']).toEqual(['', '']);
  });

  await test.step('the crew works on it', async () => {
    await hand.getByRole('link', { name: 'Clock', exact: true }).click();
    await hand.clock.setFixedTime(Date.now() - TWO_HOURS_MS);
    await clockIn(hand, TITLE, 'Cut sheet goods');
    await hand.clock.setFixedTime(Date.now());
    await clockOut(hand);
    await page.goto(jobPath);
    await expectHours(page, ['14.0 h Cut sheet goods 2.0 h', '72.0 h Total 2.0 h']);
  });

  await test.step('the owner moves the job through its stages', async () => {
    for (const [step, stage] of STEPS) {
      await page.getByRole('button', { name: step }).click();
      await expect(page.locator('[aria-current="step"]')).toContainText(stage);
    }
    await page.getByRole('list', { name: 'Stages of the job' }).getByText('Finishing').click();
    const skipping = page.getByRole('dialog');
    await expect(skipping).toContainText('This skips Building.');
    await skipping.getByRole('button', { name: 'Move to Finishing' }).click();
    await expect(page.locator('[aria-current="step"]')).toContainText('Finishing');
  });

  await test.step('the bookkeeper bills the second stage and takes two checks', async () => {
    await books.goto(jobPath);
    await books.getByRole('button', { name: 'Bill this stage , Ready to finish' }).click();
    await issueAndSend(books, customer.email);
    await recordCheck(books, 'Check 2231', '1,500');
    await expect(books.getByText('$2,093.40').first()).toBeVisible();
    await recordCheck(books, 'Check 2240');
    await expect(books.getByText('Paid', { exact: true }).first()).toBeVisible();
  });

  await test.step('the last stage is billed and paid, and the job is closed', async () => {
    await page.goto(jobPath);
    await page.getByRole('button', { name: 'Start installing' }).click();
    await page.getByRole('button', { name: 'Bill Installed' }).first().click();
    await issueAndSend(page, customer.email);
    await followLetter(visitor, customer.email, 'Invoice 2003 ');
    await payInvoice(visitor, LAST);
    await page.goto(jobPath);
    await page.getByRole('button', { name: 'Close job' }).click();
    await expect(page.locator('[aria-current="step"]')).toContainText('Closed');
  });

  await test.step('the books balance to the cent', async () => {
    const balance = await readTrialBalance(books);
    expect(balance).toEqual({
      'Cash and bank': [bare(SECOND), ''],
      'Card clearing': ['5,390.11', ''],
      'Accounts receivable': ['', ''],
      'Sales tax payable': ['', bare(TAX)],
      'Customer deposits': ['', ''],
      'Customer overpayments': ['', ''],
      Sales: ['', bare(NET)],
      'Credits and allowances': ['', ''],
      Total: [bare(TOTAL), bare(TOTAL)],
    });
  });
  expect(trouble.flat()).toEqual([]);
});

/** The button that leads on, and the stage it leads to. */
const STEPS = [
  ['Site is measured', 'Measured'],
  ['Drawings are approved', 'Drawings approved'],
  ['Materials are in', 'Materials in'],
] as const;

/** Rows of the mirrored pair: what is planned, of what, what is clocked. */
async function expectHours(page: Page, rows: string[]): Promise<void> {
  const pair = page.getByRole('table', { name: /^Hours by operation/ });
  for (const row of rows) await expect(pair.getByRole('row', { name: row })).toBeVisible();
}

const bare = (money: string): string => money.replace('$', '');

/** In one of Material's selects. */
async function choose(page: Page, label: string, option: string): Promise<void> {
  await page.getByRole('combobox', { name: label }).click();
  await page.getByRole('option', { name: option }).click();
}
