import { defineConfig } from '@playwright/test';

const port = 4391;

export default defineConfig({
  testDir: 'e2e',
  testMatch: '**/*.spec.ts',
  fullyParallel: false,
  workers: process.env['CI'] === undefined ? 2 : 2,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  retries: 1,
  reporter: 'list',
  outputDir: 'test-results',
  use: {
    baseURL: `http://127.0.0.1:${port}`,
    locale: 'en-GB',
    timezoneId: 'Europe/London',
    trace: 'retain-on-failure',
    screenshot: 'only-on-failure',
    viewport: { width: 1440, height: 900 },
    launchOptions: {
      executablePath: process.env['CHROMIUM_PATH'] ?? '/usr/bin/chromium',
      args: [
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
        '--disable-quic',
        '--no-first-run',
      ],
    },
  },
  webServer: {
    command: 'node --import tsx e2e/serve.ts',
    url: `http://127.0.0.1:${port}/ready`,
    timeout: 180_000,
    reuseExistingServer: false,
    gracefulShutdown: { signal: 'SIGTERM', timeout: 3000 },
    env: { WEFTWAY_PORT: String(port), WEFTWAY_TODAY: '2026-12-01', WEFTWAY_LOG: 'silent' },
  },
});
