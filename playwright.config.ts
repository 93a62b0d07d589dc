import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { defineConfig } from '@playwright/test';

/** Browser tests drive Debian's Chromium against the whole product, started by the test command (BASE_URL). */
export default defineConfig({
  testDir: 'tests/browser',
  outputDir: join(tmpdir(), 'aftercut-browser-results'),
  workers: 2,
  timeout: 90_000,
  expect: { timeout: 10_000 },
  reporter: [
    ['list'],
    ['json', { outputFile: process.env['BROWSER_REPORT'] ?? join(tmpdir(), 'aftercut-browser.json') }],
  ],
  use: {
    baseURL: process.env['BASE_URL'] ?? 'http://127.0.0.1:3000',
    trace: 'off',
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
      ],
    },
  },
});
