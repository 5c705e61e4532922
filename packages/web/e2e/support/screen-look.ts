import { expect, type Page } from '@playwright/test';
import { BY_LOOK, expectAccessible } from './accessible';

const DESK = { width: 1360, height: 900 };
const HAND = { width: 390, height: 844 };
const SMALLEST = { width: 360, height: 740 };

/** A screen on a desk and in the hand, by day and by night, and on the smallest phone without sliding sideways. */
export async function lookAt(page: Page, screen: string): Promise<void> {
  await settled(page);
  await dress(page, DESK, 'light');
  await expectAccessible(page, `${screen}, desk, light`);
  await dress(page, DESK, 'dark');
  await expectAccessible(page, `${screen}, desk, dark`, BY_LOOK);
  await dress(page, HAND, 'dark');
  await expectAccessible(page, `${screen}, phone, dark`);
  await dress(page, HAND, 'light');
  await expectAccessible(page, `${screen}, phone, light`, BY_LOOK);
  await dress(page, SMALLEST, 'light');
  await expectNoSlide(page, screen);
  await dress(page, DESK, 'light');
}

/** What opened over a screen: axe by day on a desk, by night in the hand. */
export async function lookAtDialog(page: Page, screen: string): Promise<void> {
  await expect(page.getByRole('dialog')).toBeVisible();
  await dress(page, DESK, 'light');
  await expectAccessible(page, `${screen}, desk, light`);
  await dress(page, HAND, 'dark');
  await expectAccessible(page, `${screen}, phone, dark`);
  await dress(page, DESK, 'light');
}

/** Everything has come in. */
export async function settled(page: Page): Promise<void> {
  await expect(page.getByRole('heading', { level: 1 }).first()).toBeVisible();
  await expect(page.locator('bm-skeleton, [aria-busy="true"]')).toHaveCount(0);
}

async function dress(page: Page, size: typeof DESK, colorScheme: 'light' | 'dark'): Promise<void> {
  await page.setViewportSize(size);
  await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
  await page.evaluate(changesOfColor);
}

/** Colors fade into each other: what is measured half way is neither the one nor the other. */
async function changesOfColor(): Promise<void> {
  await new Promise((done) => requestAnimationFrame(() => requestAnimationFrame(done)));
  const ending = document
    .getAnimations()
    .filter(({ effect }) => Number.isFinite(effect?.getComputedTiming().endTime));
  await Promise.allSettled(ending.map(({ finished }) => finished));
}

async function expectNoSlide(page: Page, screen: string): Promise<void> {
  const beyond = await page.evaluate(() => {
    const { scrollWidth, clientWidth } = document.documentElement;
    return scrollWidth - clientWidth;
  });
  expect.soft(beyond, `${screen}: pixels beyond the edge at ${SMALLEST.width}`).toBeLessThanOrEqual(0);
}
