/**
 * Journeys through the built site in Debian's Chromium. Without FELLMARK_TEST_URL the site is started, with a demo
 * world of its own in a folder that goes away with it.
 */
import { defineConfig } from 'playwright/test';

const report = process.env['FELLMARK_TEST_REPORT'];
/** Known in the workers, which read this file again after the site was started. */
const address = process.env['FELLMARK_TEST_URL'];

export default defineConfig({
  testDir: '.',
  testMatch: '**/*.e2e.ts',
  outputDir: '../../test-results/browser',
  globalSetup: './support/start-site.ts',
  // One site serves all; a test that changes what others see makes people of its own.
  workers: 2,
  fullyParallel: true,
  forbidOnly: true,
  retries: 0,
  timeout: 120_000,
  // A busy machine may take a while to wake a page's script; what never comes still fails.
  expect: { timeout: 15_000 },
  reporter: [['list'], ...(report === undefined ? [] : [['json', { outputFile: report }] as const])],
  use: {
    browserName: 'chromium',
    ...(address === undefined ? {} : { baseURL: address }),
    // A trace of everything costs a sixth of the time; `FELLMARK_TEST_TRACE=on` keeps those of what failed.
    trace: process.env['FELLMARK_TEST_TRACE'] === 'on' ? 'retain-on-failure' : 'off',
    screenshot: 'only-on-failure',
    viewport: { width: 1280, height: 900 },
    locale: 'en-GB',
    // Each new browser would fetch all it keeps; the journey without a connection lets it.
    serviceWorkers: 'block',
    launchOptions: {
      executablePath: process.env['FELLMARK_TEST_CHROMIUM'] ?? '/usr/bin/chromium',
      args: ['--no-sandbox', '--disable-gpu', '--disable-quic', '--disable-background-networking', '--disable-component-update', '--disable-sync'],
    },
  },
});
