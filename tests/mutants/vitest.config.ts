import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';
import { BaseSequencer } from 'vitest/node';

/** The cheapest first, which mostly is the nearest to the mutant: the first failure ends a run. */
class LightestFirst extends BaseSequencer {
  override async sort(files: Parameters<BaseSequencer['sort']>[0]): ReturnType<BaseSequencer['sort']> {
    const heavy = ['carried-on', 'verdict', 'conventions', 'mark-paper', 'work', 'watch', 'slips-of'];
    const weight = ({ moduleId }: (typeof files)[number]): number => heavy.findIndex((name) => moduleId.endsWith(`/${name}.test.ts`));
    return [...files].sort((one, other) => weight(one) - weight(other));
  }
}

/** Only the tests of the two pure rooms: what a mutant there must not survive. Sweeps over all elements are thinned. */
export default defineConfig({
  root: fileURLToPath(new URL('../..', import.meta.url)),
  test: {
    include: ['shared/chemistry/**/*.test.ts', 'shared/marking/**/*.test.ts'],
    setupFiles: ['tests/mutants/setup.ts'],
    env: { SWEEP: 'thin' },
    sequence: { sequencer: LightestFirst },
    testTimeout: 30_000,
  },
});
