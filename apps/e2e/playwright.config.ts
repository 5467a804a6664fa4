import { join } from 'node:path';
import { defineConfig } from '@playwright/test';

/** Where reports go: what npm test says, else a folder of their own. */
const results = process.env.E2E_RESULTS ?? join(import.meta.dirname, '../../.local/e2e');

export default defineConfig({
  testDir: 'journeys',
  testMatch: '**/*.e2e.ts',
  outputDir: join(results, 'browser'),
  reporter: [
    ['line'],
    ['json', { outputFile: process.env.PLAYWRIGHT_JSON_OUTPUT_FILE ?? join(results, 'browser.json') }],
  ],
  // A journey starts a server and a database of its own, and two cores carry one of them well.
  workers: 1,
  retries: 0,
  forbidOnly: true,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  use: {
    locale: 'en-GB',
    timezoneId: process.env.E2E_ZONE ?? 'Europe/Dublin',
    trace: 'off',
    actionTimeout: 10_000,
    navigationTimeout: 15_000,
    launchOptions: {
      executablePath: process.env.CHROMIUM_PATH ?? process.env.E2E_CHROMIUM ?? '/usr/bin/chromium',
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
