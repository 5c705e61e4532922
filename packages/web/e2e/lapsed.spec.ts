import { readFile } from 'node:fs/promises';
import { expect, test, type Page } from '@playwright/test';
import { expectAccessible } from './support/accessible';
import { run, send } from './support/errand';
import { payByCard } from './support/payment-pages';
import { shopRoot, signUp, somebody } from './support/people';
import { endTrial } from './support/trial';

const LAPSED = 'The subscription has lapsed. Everything can be read and exported, nothing changed.';
const lead = { title: 'Window seat', source: 'referral', contactName: 'Hester Vane' };

test('a trial that ends leaves the shop readable until it subscribes', async ({ page }) => {
  await signUp(page, { shop: 'Hollow Oak Millwork', ...somebody('Gwen Sandoval') });
  const root = shopRoot(page);
  const slug = root.replace('/s/', '');
  const made = await run<{ id: string }>(page, '/leads', { method: 'POST', body: lead });

  await test.step('the end comes near', async () => {
    await endTrial(slug, 1.5);
    await page.goto(`${root}/leads`);
    await expect(page.getByText('The trial ends in 2 days.')).toBeVisible();
    await expect(page.getByRole('link', { name: 'Subscribe' })).toBeVisible();
    await expect(page.getByRole('link', { name: 'Add lead' })).toBeVisible();
  });

  await test.step('what is being typed when it comes is refused and kept', async () => {
    await page.goto(`${root}/customers/new`);
    await page.getByLabel('Name', { exact: true }).fill('Lorne Whitby');
    await endTrial(slug, -1);
    await page.getByRole('button', { name: 'Save customer' }).click();
    await expect(page.getByRole('alert')).toContainText(/subscription has lapsed/);
    await expect(page.getByLabel('Name', { exact: true })).toHaveValue('Lorne Whitby');
    page.once('dialog', (dialog) => void dialog.accept());
  });

  await test.step('everything can be read, nothing begun', async () => {
    await page.goto(`${root}/leads`);
    await expect(page.getByText(LAPSED)).toBeVisible();
    await expect(page.getByRole('link', { name: 'Window seat' })).toBeVisible();
    await expectAccessible(page, 'a lapsed shop');
    for (const [list, action] of Object.entries(beginnings)) {
      await page.goto(`${root}/${list}`);
      await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
      await expect(page.getByRole('table').first()).toHaveAttribute('aria-busy', 'false');
      await expect(page.getByRole('link', { name: action })).toHaveCount(0);
    }
    await page.goto(`${root}/leads/${made.id}`);
    await expect(page.getByRole('heading', { name: 'Window seat' })).toBeVisible();
    await expect(page.getByRole('button', { name: 'Make a customer' })).toHaveCount(0);
    await expect(page.getByLabel('Add a note')).toHaveCount(0);
  });

  await test.step('the server refuses what the screens no longer offer', async () => {
    const answer = await send(page, '/leads', { method: 'POST', body: lead });
    expect(answer.status()).toBe(402);
    expect(await answer.json()).toMatchObject({ code: 'subscription-lapsed' });
  });

  await test.step('exporting stays open', async () => {
    await page.goto(`${root}/leads`);
    expect(await exported(page)).toContain('Window seat');
  });

  await test.step('subscribing opens the shop again', async () => {
    await page.getByRole('link', { name: 'See the subscription' }).click();
    await expect(page.getByText('Trial over')).toBeVisible();
    await expectAccessible(page, 'the subscription');
    await page.getByRole('button', { name: 'Subscribe' }).click();
    await payByCard(page, /0002, is declined/, /subscribe/i);
    await expect(page.getByRole('alert')).toContainText('Your card was declined.');
    await payByCard(page, /4242, goes through/, /subscribe/i);
    await expect(page).toHaveURL(new RegExp(`${root}/`));
    await expect(page.getByText(/Paid until/)).toBeVisible();
    await expect(page.getByText(LAPSED)).toHaveCount(0);
  });

  await test.step('and work goes on where it stopped', async () => {
    await page.goto(`${root}/leads/${made.id}`);
    await page.getByLabel('Add a note').fill('Back at it');
    await page.getByRole('button', { name: 'Add note' }).click();
    await expect(page.getByRole('listitem').filter({ hasText: 'Back at it' })).toBeVisible();
  });
});

/** By list, the way to begin something there. */
const beginnings = {
  leads: 'Add lead',
  estimates: 'New estimate',
  jobs: 'Add job',
  invoices: 'New invoice',
  customers: 'Add customer',
};

async function exported(page: Page): Promise<string> {
  const download = page.waitForEvent('download');
  await page.getByRole('link', { name: 'Export CSV' }).click();
  return readFile(await (await download).path(), 'utf8');
}
