import { defineConfig, devices } from '@playwright/test';

/** Run by lib/ops/test.mjs, which starts the site and says where it is: `npm run test:e2e`. */
export default defineConfig({
  testDir: 'tests/e2e',
  outputDir: 'test-results',
  // One site and one database: tests that change the same figures take turns.
  workers: 1,
  forbidOnly: true,
  timeout: 60_000,
  reporter: [['list'], ['json']],
  use: {
    ...devices['Desktop Chrome'],
    baseURL: process.env.PUBLIC_ORIGIN,
    screenshot: 'only-on-failure',
    trace: 'retain-on-failure',
    timezoneId: 'Pacific/Chatham',
    launchOptions: {
      executablePath: process.env.CHROMIUM ?? '/usr/bin/chromium',
      // Chromium reaches out on its own otherwise: for updates, for lists, for accounts.
      args: [
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
        '--disable-quic',
        '--no-first-run',
        '--disable-gpu',
      ],
    },
  },
});
