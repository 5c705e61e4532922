import { defineConfig } from '@playwright/test';

/**
 * Journeys through the real server, database and fakes in Debian's Chromium. `npm test` starts a Bookmatch of its own
 * and says where it is.
 */
export default defineConfig({
  testDir: 'e2e',
  outputDir: 'test-results',
  timeout: 180_000,
  expect: { timeout: 15_000 },
  // One waits for the server while the other draws.
  workers: 2,
  retries: 0,
  use: {
    baseURL: process.env['BOOKMATCH_E2E_ADDRESS'],
    viewport: { width: 1360, height: 900 },
    actionTimeout: 20_000,
    navigationTimeout: 30_000,
    locale: 'en-US',
    timezoneId: 'America/Chicago',
    // A journey must see what the server says, not what an earlier one left in a cache.
    serviceWorkers: 'block',
    screenshot: 'only-on-failure',
    trace: 'retain-on-failure',
    launchOptions: {
      executablePath: process.env['BOOKMATCH_E2E_CHROMIUM'] ?? '/usr/bin/chromium',
      args: [
        '--no-sandbox',
        '--disable-gpu',
        '--disable-quic',
        '--no-first-run',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
      ],
    },
  },
});
