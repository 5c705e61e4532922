import { AxeBuilder } from '@axe-core/playwright';
import { expect, type Page } from '@playwright/test';

const STANDARDS = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
/** What colors and sizes alone decide. */
export const BY_LOOK = ['color-contrast', 'target-size'];

/**
 * Nothing serious stands between this screen and somebody who uses it by keyboard, reader or with weak eyes. Goes on
 * after a finding, so that one run tells all of them.
 *
 * @param rules only these of axe; all of the standards when left out
 */
export async function expectAccessible(page: Page, screen: string, rules?: string[]): Promise<void> {
  // Legacy mode looks at this page alone, in place; there are no frames here.
  const axe = new AxeBuilder({ page }).setLegacyMode();
  const { violations } = await (rules ? axe.withRules(rules) : axe.withTags(STANDARDS)).analyze();
  const serious = violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => target.join(' ')).join(', ')}`);
  expect.soft(serious, screen).toEqual([]);
}
