import { defineConfig, devices } from '@playwright/test';

const executablePath = process.env.CHROMIUM || undefined;

export default defineConfig({
  testDir: '../test/e2e',
  outputDir: '../test-results',
  forbidOnly: true,
  fullyParallel: false,
  workers: 1,
  retries: 0,
  timeout: 90_000,
  globalTimeout: 780_000,
  expect: { timeout: 10_000 },
  use: {
    ...devices['Desktop Chrome'],
    baseURL: process.env.LINTFREE_ADDRESS ?? 'http://localhost:4173',
    viewport: { width: 1280, height: 800 },
    hasTouch: true,
    serviceWorkers: 'allow',
    trace: 'off',
    launchOptions: {
      ...(executablePath === undefined ? {} : { executablePath }),
      args: [
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-quic',
        '--disable-sync',
        '--no-first-run',
      ],
    },
  },
});
