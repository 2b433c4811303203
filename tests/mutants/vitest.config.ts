import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

/** Only the tests of the two pure rooms: what a mutant there must not survive. */
export default defineConfig({
  root: fileURLToPath(new URL('../..', import.meta.url)),
  test: { include: ['shared/chemistry/**/*.test.ts', 'shared/marking/**/*.test.ts'], testTimeout: 30_000 },
});
