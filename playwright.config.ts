import { defineConfig } from '@playwright/test';

/** Debian's Chromium as it is, kept off the network: no updates, no reports, no first-run pages. */
const CHROMIUM = {
  executablePath: '/usr/bin/chromium',
  args: [
    '--no-sandbox',
    '--disable-dev-shm-usage',
    '--disable-background-networking',
    '--disable-component-update',
    '--disable-domain-reliability',
    '--disable-sync',
    '--no-default-browser-check',
    '--no-first-run',
    '--no-pings',
    '--metrics-recording-only',
  ],
};

export default defineConfig({
  testDir: 'tests/e2e',
  globalSetup: './tests/support/e2e-setup.ts',
  outputDir: 'test-results',
  workers: 1,
  retries: 0,
  forbidOnly: true,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  reporter: [['list']],
  use: {
    browserName: 'chromium',
    launchOptions: CHROMIUM,
    viewport: { width: 1280, height: 800 },
    locale: 'en-GB',
    video: 'off',
    screenshot: 'only-on-failure',
    trace: 'retain-on-failure',
  },
});
