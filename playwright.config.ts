import { defineConfig } from '@playwright/test';
import { findChromium } from './server/scripts/chromium.mjs';

export default defineConfig({
  testDir: 'tests/e2e',
  globalSetup: './tests/support/e2e-global-setup.ts',
  // One application and one database serve all tests, on two cores.
  workers: 1,
  retries: 0,
  forbidOnly: true,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  outputDir: 'test-results',
  reporter: 'line',
  use: {
    baseURL: process.env['FERRULE_E2E_ORIGIN'],
    trace: 'retain-on-failure',
    screenshot: 'only-on-failure',
    launchOptions: {
      executablePath: findChromium(process.env) ?? '/usr/bin/chromium',
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
