/** Journeys: a browser works through one person's job against the product as it is started for everybody. */
import { defineConfig } from '@playwright/test';
import { productUrlVariable } from './product-variables.ts';

export default defineConfig({
  testDir: '.',
  testMatch: '**/*.{test,spec}.ts',
  outputDir: '../../test-results/journeys',
  globalSetup: './global-setup.ts',
  // One product and one database for all, so one journey at a time.
  workers: 1,
  fullyParallel: false,
  retries: 0,
  forbidOnly: true,
  timeout: 120_000,
  expect: { timeout: 15_000 },
  use: {
    // Set by the global set-up; the workers read this file again after it.
    ...(process.env[productUrlVariable] === undefined ? {} : { baseURL: process.env[productUrlVariable] }),
    locale: 'en-GB',
    timezoneId: 'Etc/UTC',
    colorScheme: 'light',
    contextOptions: { reducedMotion: 'reduce' },
    screenshot: 'only-on-failure',
    trace: 'off',
    launchOptions: {
      executablePath: '/usr/bin/chromium',
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
