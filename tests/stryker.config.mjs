/*
 * Mutation testing of the numbers: every operator, condition and constant of regression, calibration and
 * uncertainty is altered in turn, and a test must notice. Run by `npm run mutate`; it takes a while.
 */
const config = {
  testRunner: 'vitest',
  plugins: ['@stryker-mutator/vitest-runner'],
  vitest: { configFile: 'tests/vitest.engine.config.ts', related: false },
  mutate: [
    'lib/engine/regression/**/*.ts',
    'lib/engine/calibration/**/*.ts',
    'lib/engine/uncertainty/**/*.ts',
  ],
  // Texts are looked at by people and by the tests of reports; a changed word is no wrong number.
  mutator: { excludedMutations: ['StringLiteral'] },
  ignorePatterns: ['.next', 'data', 'app', 'components', 'public', 'tests/e2e', 'mutation-report'],
  coverageAnalysis: 'perTest',
  concurrency: Number(process.env.MUTATE_WORKERS ?? 2),
  timeoutMS: 20_000,
  reporters: ['clear-text', 'progress-append-only', 'json'],
  jsonReporter: { fileName: 'mutation-report/report.json' },
  clearTextReporter: { allowColor: false, reportTests: false },
  thresholds: { high: 95, low: 90, break: 90 },
  tempDirName: 'mutation-report/sandbox',
  cleanTempDir: 'always',
};

export default config;
