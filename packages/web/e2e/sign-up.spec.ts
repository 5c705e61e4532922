import { expect, test } from '@playwright/test';
import { expectAccessible } from './support/accessible';
import { troubleOn } from './support/console';
import { signIn, signOut, signUp, somebody } from './support/people';

test('a stranger opens a shop, adds a customer and comes back', async ({ page }) => {
  const trouble = troubleOn(page, { refused: true });
  const odile = somebody('Odile Marsh');
  await page.goto('/sign-up');
  await expectAccessible(page, 'sign up');
  await signUp(page, { shop: 'Quarry Road Cabinets', ...odile });

  await page.getByRole('link', { name: 'Customers' }).first().click();
  await expect(page.getByRole('heading', { name: 'Customers', level: 1 })).toBeVisible();
  await expect(page.locator('.cdk-live-announcer-element')).toHaveText('Customers · Quarry Road Cabinets');
  await expectAccessible(page, 'no customers yet');
  await page.getByRole('link', { name: 'Add the first customer' }).click();
  await page.getByLabel('Name', { exact: true }).fill('<b>Ines</b> Calder');
  await expectAccessible(page, 'new customer');
  await page.getByRole('button', { name: 'Save customer' }).click();
  await expect(page.getByRole('heading', { name: '<b>Ines</b> Calder' })).toBeVisible();

  await signOut(page, odile);
  await page.goBack();
  await expect(page.getByText('Calder')).toHaveCount(0);
  await signIn(page, odile.email);
  await expect(page).toHaveURL(/\/s\/quarry-road-cabinets/);
  expect(trouble).toEqual([]);
});
