import { expect, type Page } from '@playwright/test';

/** Something done in the signed-in person's own session without its screens, to set the scene of a journey. */
type Errand = { method?: 'GET' | 'POST' | 'PATCH'; body?: unknown; version?: number };

/**
 * Asks the API as the page's person would.
 *
 * @param path below the shop, such as `/customers`
 */
export async function run<Answer>(page: Page, path: string, errand: Errand = {}): Promise<Answer> {
  const answer = await send(page, path, errand);
  expect(answer.ok(), `${path}: ${answer.status()} ${await answer.text()}`).toBe(true);
  return (await answer.json()) as Answer;
}

/** The same without insisting that it succeeds. */
export async function send(page: Page, path: string, { method = 'GET', body, version }: Errand) {
  const { origin } = new URL(page.url());
  const headers: Record<string, string> = { Origin: origin, 'X-CSRF-Token': await forgeryToken(page) };
  if (method === 'POST') headers['Idempotency-Key'] = crypto.randomUUID();
  if (version !== undefined) headers['If-Match'] = `"${version}"`;
  return page.request.fetch(`/api/shops/${await shopId(page)}${path}`, { method, headers, data: body });
}

export async function shopId(page: Page): Promise<string> {
  const answer = await page.request.get('/api/account/session');
  const { memberships } = (await answer.json()) as { memberships: { shopId: string; slug: string }[] };
  const slug = /\/s\/([\w-]+)/.exec(page.url())?.[1];
  const here = memberships.find((one) => one.slug === slug);
  expect(here, `a membership in ${slug}`).toBeTruthy();
  return (here as { shopId: string }).shopId;
}

async function forgeryToken(page: Page): Promise<string> {
  const cookies = await page.context().cookies();
  return cookies.find(({ name }) => name.endsWith('bookmatch-csrf'))?.value ?? '';
}
