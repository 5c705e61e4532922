import { expect, test } from '@playwright/test';
import { expectAccessible } from './support/accessible';
import { signIn, signUp } from './support/people';

test('a stranger opens a shop, adds a customer and comes back', async ({ page }) => {
  const problems: string[] = [];
  page.on('console', (message) => {
    if (message.type() === 'error' && /Content Security Policy/.test(message.text()))
      problems.push(message.text());
  });
  await page.goto('/sign-up');
  await expectAccessible(page, 'sign up');
  await signUp(page, { shop: 'Quarry Road Cabinets', name: 'Odile Marsh', email: 'odile@quarry.test' });

  await page.getByRole('link', { name: 'Customers' }).first().click();
  await expect(page.getByRole('heading', { name: 'Customers', level: 1 })).toBeVisible();
  await expectAccessible(page, 'no customers yet');
  await page
    .getByRole('link', { name: /add (a |the first )?customer/i })
    .first()
    .click();
  await page.getByLabel('Name', { exact: false }).first().fill('<b>Ines</b> Calder');
  await expectAccessible(page, 'new customer');
  await page
    .getByRole('button', { name: /save|add/i })
    .last()
    .click();
  await expect(page.getByRole('heading', { name: '<b>Ines</b> Calder' })).toBeVisible();

  await page.getByRole('button', { name: /odile marsh|OM/i }).click();
  await page.getByRole('menuitem', { name: /^sign out$/i }).click();
  await expect(page).toHaveURL(/sign-in/);
  await page.goBack();
  await expect(page.getByText('Calder')).toHaveCount(0);
  await signIn(page, 'odile@quarry.test');
  await expect(page).toHaveURL(/\/s\/quarry-road-cabinets\//);
  expect(problems).toEqual([]);
});
