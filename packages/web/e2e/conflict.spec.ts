import { expect, test, type Cookie, type Page } from '@playwright/test';
import { run } from './support/errand';
import { shopRoot, signUp, somebody } from './support/people';

type Made = { id: string };
const customer = (name: string) =>
  ({ method: 'POST', body: { name, kind: 'homeowner', phone: '555 0110' } }) as const;

let session: Cookie[] = [];
let shop = '';

/** One shop for all of these, opened by the first. */
test.beforeEach(async ({ page, context }) => {
  if (session.length === 0) {
    await signUp(page, { shop: 'Two Benches Joinery', ...somebody('Bela Strand') });
    [session, shop] = [await context.cookies(), shopRoot(page)];
  } else {
    await context.addCookies(session);
    await page.goto(`${shop}/customers`);
  }
});

test('two tabs change one customer', async ({ page, context }) => {
  const { id } = await run<Made>(page, '/customers', customer('Wren Halloran'));
  const other = await context.newPage();
  const form = `${shop}/customers/${id}/edit`;
  for (const tab of [page, other]) {
    await tab.goto(form);
    await expect(field(tab, 'Name')).toHaveValue('Wren Halloran');
  }
  await field(page, 'Phone').fill('555 0199');
  await save(page);
  await expect(page).toHaveURL(/\/customers\/[^/]+$/);

  await field(other, 'Name').fill('Wren Halloran-Voss');
  await field(other, 'Notes for the shop').fill('Gate code at the back');
  await save(other);
  await expect(other.getByText('Somebody else changed this meanwhile: phone.')).toBeVisible();
  await expect(other).toHaveURL(/\/edit$/);
  await expect(field(other, 'Name')).toHaveValue('Wren Halloran-Voss');
  await expect(field(other, 'Notes for the shop')).toHaveValue('Gate code at the back');

  await save(other);
  await expect(other.getByRole('heading', { name: 'Wren Halloran-Voss' })).toBeVisible();
  await expect(other.getByText('Gate code at the back')).toBeVisible();
});

test('two tabs write one estimate', async ({ page, context }) => {
  const { id: customerId } = await run<Made>(page, '/customers', customer('Tomas Quill'));
  const estimate = { title: 'Pantry wall', customerId };
  const { id } = await run<Made>(page, '/estimates', { method: 'POST', body: estimate });
  const other = await context.newPage();
  for (const tab of [page, other]) {
    await tab.goto(`${shop}/estimates/${id}`);
    await expect(tab.getByRole('button', { name: 'Add room' })).toBeVisible();
  }
  await nameRoom(page, 'Pantry');
  await expect(standing(page)).toHaveText(/^Saved/);

  await nameRoom(other, 'Scullery');
  await expect(other.getByText('Somebody else saved this estimate meanwhile')).toBeVisible();
  await expect(other.getByText(/They changed: rooms and lines/)).toBeVisible();
  await expect(rooms(other)).toHaveValue('Scullery');
  await other.getByRole('button', { name: 'Keep mine' }).click();
  await expect(standing(other)).toHaveText(/^Saved/);

  await nameRoom(page, 'Pantry and larder');
  await expect(page.getByText('Somebody else saved this estimate meanwhile')).toBeVisible();
  await page.getByRole('button', { name: 'Show theirs instead' }).click();
  await expect(rooms(page)).toHaveValue('Scullery');
});

test('saved twice in one breath is saved once', async ({ page }) => {
  await page.goto(`${shop}/customers/new`);
  await field(page, 'Name').fill('Maren Okafor');
  await page.getByRole('button', { name: 'Save customer' }).dblclick();
  await expect(page.getByRole('heading', { name: 'Maren Okafor' })).toBeVisible();
  const { rows } = await run<{ rows: unknown[] }>(page, '/customers?q=Maren');
  expect(rows).toHaveLength(1);
});

test('the network goes while saving, and nothing typed is lost or doubled', async ({ page, context }) => {
  await page.goto(`${shop}/customers/new`);
  await field(page, 'Name').fill('Ansel Brightwater');
  await field(page, 'Company').fill('Brightwater Homes');
  await context.setOffline(true);
  await save(page);
  await expect(page.getByText(/Nothing you typed is lost/)).toBeVisible();
  await expect(field(page, 'Company')).toHaveValue('Brightwater Homes');
  await context.setOffline(false);

  // The request arrives, but its answer does not: nobody here can know that the customer was added.
  let lost = 0;
  await page.route('**/api/shops/*/customers', async (route) => {
    if (route.request().method() !== 'POST' || lost > 0) return route.fallback();
    lost += 1;
    await route.fetch();
    return route.abort('connectionreset');
  });
  await save(page);
  await expect.poll(() => lost).toBe(1);
  await expect(page.getByText(/Nothing you typed is lost/)).toBeVisible();
  await expect(page.getByRole('button', { name: 'Save customer' })).toBeEnabled();
  await save(page);
  await expect(page.getByRole('heading', { name: 'Ansel Brightwater' })).toBeVisible();
  const { rows } = await run<{ rows: unknown[] }>(page, '/customers?q=Ansel');
  expect(rows).toHaveLength(1);
});

const field = (page: Page, label: string) => page.getByLabel(label, { exact: true });
const rooms = (page: Page) => page.getByLabel('Name of the room');
const standing = (page: Page) => page.getByRole('status').filter({ hasText: /saved|saving/i });

async function save(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Save customer' }).click();
}

/** Names the only room of the draft, adding it first where there is none. */
async function nameRoom(page: Page, name: string): Promise<void> {
  if ((await rooms(page).count()) === 0) await page.getByRole('button', { name: 'Add room' }).click();
  await rooms(page).fill(name);
}
