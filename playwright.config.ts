import { defineConfig } from '@playwright/test';
import { findChromium } from './scripts/chromium.mjs';

const port = process.env.E2E_PORT ?? '4317';
const address = `http://127.0.0.1:${port}`;
const report = process.env.PLAYWRIGHT_JSON_OUTPUT_FILE;

export default defineConfig({
  testDir: 'e2e',
  workers: 2,
  fullyParallel: true,
  forbidOnly: true,
  // a machine may be busy with other work: slow is not wrong
  timeout: 180_000,
  expect: { timeout: 20_000 },
  reporter: report ? [['list'], ['json', { outputFile: report }]] : [['list']],
  use: {
    baseURL: address,
    viewport: { width: 1440, height: 900 },
    trace: 'retain-on-failure',
    launchOptions: {
      executablePath: findChromium(),
      args: [
        '--no-sandbox',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
        '--no-first-run',
      ],
    },
  },
  webServer: {
    command: 'exec node scripts/stage.mjs',
    url: `${address}/sign-in`,
    env: { E2E_PORT: port, STAGE: 'e2e' },
    reuseExistingServer: false,
    timeout: 240_000,
    stdout: 'pipe',
    gracefulShutdown: { signal: 'SIGTERM', timeout: 8000 },
  },
});
