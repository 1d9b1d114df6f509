import { defineConfig, devices } from '@playwright/test';
import { CHROMIUM_PROGRAM } from './scripts/services/debian-packages.js';

/** Set by `npm test -- e2e`, or by hand to the address of a product that runs. */
const baseURL = process.env.QUARTERPOISE_URL;
if (!baseURL)
  throw new Error('QUARTERPOISE_URL is not set: the address of the running product, as "npm start" prints it');

export default defineConfig({
  testDir: 'apps/web/e2e',
  testMatch: '**/*.e2e.ts',
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
    baseURL,
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
