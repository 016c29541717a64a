import { defineConfig } from 'playwright/test';
import { chromiumLaunch } from './scripts/setup/chromium.mjs';

const baseURL = process.env.E2E_BASE_URL;
if (!baseURL)
  throw new Error('Run the journeys by "npm run test:e2e": it serves the product that they go through.');

export default defineConfig({
  testDir: 'e2e',
  outputDir: '.data/journeys',
  workers: 2,
  forbidOnly: true,
  // A crowded machine can stall one step; where nobody watches, a journey may be walked twice, and that is said.
  retries: process.env.CI ? 1 : 0,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  use: {
    baseURL,
    viewport: { width: 1180, height: 820 },
    actionTimeout: 10_000,
    navigationTimeout: 20_000,
    trace: 'retain-on-failure',
    launchOptions: chromiumLaunch,
  },
});
