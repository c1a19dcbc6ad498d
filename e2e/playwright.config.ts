import { defineConfig } from '@playwright/test';

const PORT = Number(process.env['E2E_PORT'] ?? 4390);
const baseURL = `http://127.0.0.1:${PORT}`;

/** The built product on a throwaway installation with the bare demo; Debian's Chromium; nothing fetched from outside. */
export default defineConfig({
  testDir: '.',
  testMatch: '**/*.spec.ts',
  outputDir: '../test-results',
  fullyParallel: false,
  workers: 2,
  retries: 0,
  forbidOnly: true,
  // Time for two cores under load: a journey that hangs is found by its expectations, which wait far less.
  timeout: 180_000,
  expect: { timeout: 15_000 },
  reporter: [
    ['list'],
    ['json', { outputFile: process.env['PLAYWRIGHT_JSON_OUTPUT_FILE'] ?? '../test-results/report.json' }],
  ],
  use: {
    baseURL,
    locale: 'en-GB',
    timezoneId: 'Europe/London',
    viewport: { width: 1440, height: 900 },
    screenshot: 'only-on-failure',
    trace: 'retain-on-failure',
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
        '--disable-extensions',
        '--disable-dev-shm-usage',
        // Debian's package asks for drawing by graphics card; in software that costs more than the tests themselves.
        '--disable-gpu-rasterization',
        '--disable-software-rasterizer',
      ],
    },
  },
  webServer: {
    command: 'node server/scripts/start.mjs --throwaway',
    cwd: '..',
    env: { PORT: String(PORT) },
    url: `${baseURL}/readyz`,
    reuseExistingServer: false,
    timeout: 600_000,
    gracefulShutdown: { signal: 'SIGTERM', timeout: 20_000 },
    stdout: 'pipe',
  },
});
