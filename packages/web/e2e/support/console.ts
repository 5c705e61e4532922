import type { Page } from '@playwright/test';

/** What a browser writes when an answer is a refusal; the journeys that provoke one say so. */
const REFUSAL = /Failed to load resource/;

/**
 * Listens for what a visitor never sees and nobody may cause: errors in the console, broken scripts, and whatever the
 * Content Security Policy had to stop.
 *
 * @param refused whether refusals of the API, which the browser notes as well, are part of the journey
 */
export function troubleOn(page: Page, { refused = false } = {}): string[] {
  const found: string[] = [];
  page.on('console', (message) => {
    if (message.type() !== 'error' || (refused && REFUSAL.test(message.text()))) return;
    found.push(`${message.text()} (${message.location().url})`);
  });
  page.on('pageerror', (error) => found.push(error.stack ?? error.message));
  return found;
}
