import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    projects: [
      { test: { name: 'unit', include: ['shared/**/*.test.ts', 'db/**/*.test.ts', 'server/**/*.test.ts', 'tests/simulations/**/*.test.ts'], testTimeout: 30_000 } },
      { test: { name: 'api', include: ['tests/api/**/*.test.ts'], testTimeout: 60_000, hookTimeout: 60_000 } },
      { test: { name: 'sheets', include: ['tests/sheets/**/*.test.ts'], testTimeout: 1_200_000, hookTimeout: 120_000 } },
      {
        test: {
          name: 'browser',
          include: ['tests/browser/**/*.test.ts'],
          testTimeout: 300_000,
          hookTimeout: 300_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
