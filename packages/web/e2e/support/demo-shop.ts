import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, type Page } from '@playwright/test';
import { send } from './errand';
import { signIn } from './people';

type SignIn = { role: string; email: string; password: string; shop: string };
const file = join(import.meta.dirname, '../../../../infra/demo/sign-ins.json');
const signIns = JSON.parse(readFileSync(file, 'utf8')) as SignIn[];

/** Signs in as the first member of the demo shop who has the role. */
export async function signInAs(page: Page, role: string): Promise<void> {
  const found = signIns.find((one) => one.role === role);
  expect(found, `a demo sign-in as ${role}`).toBeTruthy();
  const { email, password } = found as SignIn;
  await signIn(page, email, password);
  const choice = page.getByRole('link', { name: 'Quillback Cabinet Works' });
  await expect(choice.or(page.getByRole('navigation', { name: 'Shop' })).first()).toBeVisible();
  if (await choice.isVisible()) await choice.click();
  await expect(page).toHaveURL(/\/s\/quillback[\w-]*\//);
}

/** The id of the first row of a list, such as `/estimates?status=draft`. */
export async function firstOf(page: Page, list: string): Promise<string> {
  const answer = await send(page, list, {});
  const { rows } = (await answer.json()) as { rows: { id: string }[] };
  expect(rows[0], `a row in ${list}`).toBeTruthy();
  return (rows[0] as { id: string }).id;
}
