import { defineConfig } from '@playwright/test';

/** The browser talks to nobody but the server under test. */
const quiet = [
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

const baseURL = process.env['BASE_URL'];
if (!baseURL) throw new Error('BASE_URL is not set. Run the end-to-end tests with: npm test -- --only e2e');

export default defineConfig({
  testDir: 'test/e2e',
  testMatch: '**/*.e2e.ts',
  outputDir: 'test-results/browser',
  workers: 1,
  timeout: 60_000,
  use: {
    baseURL,
    locale: 'en-GB',
    timezoneId: 'UTC',
    screenshot: 'only-on-failure',
    trace: 'retain-on-failure',
    launchOptions: {
      executablePath: process.env['CHROMIUM_PATH'] ?? '/usr/bin/chromium',
      args: quiet,
      // Chromium's sandbox refuses to run as root.
      chromiumSandbox: process.getuid?.() !== 0,
    },
  },
});
