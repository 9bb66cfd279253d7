import { defineConfig } from 'vitest/config';
import everything from './vitest.config';

const ENGINE = 'tests/unit/lib/engine';

/**
 * The tests that a mutated engine is held against: those of the numbers of curves and results. The long runs (the
 * second judge, Monte Carlo) and those of texts are left out, or one alteration would take a minute.
 */
export default defineConfig({
  ...everything,
  test: {
    ...everything.test,
    include: [
      `${ENGINE}/{regression,calibration,uncertainty,unknown,limits,weighting,hypothesis}/**/*.test.ts`,
      `${ENGINE}/{golden,published-curves,properties,two-wavelengths}.test.ts`,
    ],
  },
});
