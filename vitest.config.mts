import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('.', import.meta.url));
const alias = {
  '@': root,
  'server-only': `${root}tests/support/server-only.ts`,
};

export default defineConfig({
  resolve: { alias },
  test: {
    setupFiles: ['tests/support/fail-on-console-error.ts', 'tests/support/law-seed.ts'],
    projects: [
      {
        extends: true,
        test: { name: 'domain', include: ['tests/domain/**/*.test.ts', 'tests/*.test.ts'] },
      },
      {
        extends: true,
        test: { name: 'reference', include: ['tests/reference/**/*.test.ts'], testTimeout: 60_000 },
      },
      {
        extends: true,
        test: {
          name: 'server',
          include: ['tests/server/**/*.test.ts'],
          globalSetup: ['tests/support/database.ts'],
          fileParallelism: false,
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          include: ['tests/e2e/**/*.e2e.ts'],
          globalSetup: ['tests/support/browser-server.ts'],
          fileParallelism: false,
          testTimeout: 180_000,
          hookTimeout: 180_000,
        },
      },
    ],
  },
});
