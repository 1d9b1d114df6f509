import { defineConfig, devices } from '@playwright/test';
import { CHROMIUM_PROGRAM } from './scripts/services/debian-packages.js';

export default defineConfig({
  testDir: 'apps/web/e2e',
  testMatch: '**/*.e2e.ts',
  globalSetup: './scripts/test/running-product.setup.ts',
  outputDir: 'test-results',
  // one after the other: the tests share one product, and the machine's two processors serve browser, product and database
  workers: 1,
  retries: 0,
  forbidOnly: true,
  timeout: 90_000,
  expect: { timeout: 15_000 },
  reporter: [['list'], ...(process.env.E2E_REPORT ? [['json', { outputFile: process.env.E2E_REPORT }] as const] : [])],
  use: {
    ...devices['Desktop Chrome'],
    // from `npm test -- e2e`, or by hand the address of a product that runs
    ...(process.env.QUARTERPOISE_URL ? { baseURL: process.env.QUARTERPOISE_URL } : {}),
    viewport: { width: 1280, height: 800 },
    screenshot: 'only-on-failure',
    launchOptions: {
      executablePath: CHROMIUM_PROGRAM,
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
