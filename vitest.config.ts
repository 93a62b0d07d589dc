import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('.', import.meta.url));

/** Four projects, one a kind of test; browser tests are Playwright's (playwright.config.ts). */
export default defineConfig({
  resolve: { alias: { '@': root.replace(/\/$/, '') } },
  oxc: { jsx: { runtime: 'automatic' } },
  test: {
    projects: [
      { extends: true, test: { name: 'unit', include: ['tests/unit/**/*.test.{ts,tsx}'] } },
      {
        extends: true,
        test: { name: 'reference', include: ['tests/reference/**/*.test.ts'], testTimeout: 60_000 },
      },
      {
        extends: true,
        test: {
          name: 'integration',
          include: ['tests/integration/**/*.test.ts'],
          globalSetup: ['tests/integration/setup/server.ts'],
          setupFiles: ['tests/integration/setup/next-headers.ts', 'tests/integration/setup/database.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
          maxWorkers: 2,
        },
      },
    ],
  },
});
