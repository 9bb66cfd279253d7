import { defineConfig } from 'vitest/config';
import everything from './vitest.config';

/** The tests of the calculation alone: what a mutated engine is held against. */
export default defineConfig({
  ...everything,
  test: { ...everything.test, include: ['tests/unit/lib/engine/**/*.test.ts'] },
});
