import { defineConfig } from 'playwright/test';

const baseURL = process.env.E2E_BASE_URL;
if (!baseURL)
  throw new Error('Run the journeys by "npm run test:e2e": it serves the product that they go through.');

export default defineConfig({
  testDir: 'e2e',
  outputDir: '.data/journeys',
  workers: 2,
  forbidOnly: true,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  use: {
    baseURL,
    viewport: { width: 1180, height: 820 },
    actionTimeout: 10_000,
    navigationTimeout: 20_000,
    trace: 'retain-on-failure',
    launchOptions: {
      executablePath: '/usr/bin/chromium',
      args: [
        '--no-sandbox',
        '--disable-gpu',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
        '--no-first-run',
      ],
    },
  },
});
