import { tmpdir } from 'node:os';
import path from 'node:path';
import { defineConfig, type ReporterDescription } from '@playwright/test';
import { findChromium } from './support/find-chromium.mjs';

const executablePath = findChromium();
if (!executablePath) {
  throw new Error(
    'The tests in a browser need Chromium or Chrome: install one, or set CHROMIUM_PATH to where it is.',
  );
}

const reportFile = process.env.HALFLIGHT_E2E_REPORT;
const reporter: ReporterDescription[] = [['list']];
if (reportFile) reporter.push(['json', { outputFile: reportFile }]);

export default defineConfig({
  testDir: './e2e',
  testMatch: '**/*.spec.ts',
  globalSetup: './support/global-setup.ts',
  outputDir: process.env.HALFLIGHT_E2E_OUTPUT ?? path.join(tmpdir(), 'halflight-e2e'),
  reporter,
  workers: 2,
  retries: 0,
  forbidOnly: true,
  timeout: 120_000,
  expect: { timeout: 20_000 },
  use: {
    baseURL: process.env.HALFLIGHT_E2E_URL,
    // a trace films every page: on two cores that costs more than the tests themselves
    trace: 'off',
    screenshot: 'only-on-failure',
    launchOptions: {
      executablePath,
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
