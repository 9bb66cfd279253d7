import { describe, expect, test } from 'vitest';
import {
  countExitCode,
  countPlaywright,
  countSuite,
  countVitest,
  countsLine,
  sumCounts,
} from '../../support/count-results.mjs';

const vitest = {
  numPassedTests: 7,
  numFailedTests: 2,
  numPendingTests: 1,
  numTodoTests: 1,
  testResults: [
    { status: 'failed', assertionResults: [{ status: 'failed' }, { status: 'failed' }] },
    { status: 'passed', assertionResults: [{ status: 'passed' }] },
  ],
};
const playwright = { stats: { expected: 4, unexpected: 0, flaky: 0, skipped: 0 }, errors: [] };

describe('counting a suite', () => {
  test('a program is one test', () => {
    expect(countExitCode(0)).toEqual({ passed: 1, failed: 0, skipped: 0 });
    expect(countExitCode(2)).toEqual({ passed: 0, failed: 1, skipped: 0 });
  });

  test('every unit test counts, and what is pending or to do is skipped', () => {
    expect(countVitest(vitest)).toEqual({ passed: 7, failed: 2, skipped: 2 });
  });

  test.each([
    ['before any test of it', []],
    ['after tests that passed', [{ status: 'passed' }]],
  ])('a file of unit tests that fails %s is one failure more', (_when, assertionResults) => {
    const testResults = [...vitest.testResults, { status: 'failed', assertionResults }];
    expect(countVitest({ ...vitest, testResults }).failed).toBe(3);
  });

  test('a browser test that passed only at a second try has failed', () => {
    const stats = { expected: 4, unexpected: 1, flaky: 2, skipped: 3 };
    expect(countPlaywright({ stats, errors: [] })).toEqual({ passed: 4, failed: 3, skipped: 3 });
  });

  test('an error outside of every browser test is a failure', () => {
    expect(countPlaywright({ ...playwright, errors: ['global setup'] }).failed).toBe(1);
  });
});

describe('a suite as a whole', () => {
  test('counts as reported when it ended as its tests did', () => {
    expect(countSuite(countPlaywright, playwright, 0)).toEqual({ passed: 4, failed: 0, skipped: 0 });
    expect(countSuite(countVitest, vitest, 1)).toEqual({ passed: 7, failed: 2, skipped: 2 });
  });

  test('has failed when it left no report', () => {
    expect(countSuite(countVitest, null, 0)).toEqual({ passed: 0, failed: 1, skipped: 0 });
  });

  test('has failed when it ran nothing, even if it skipped something', () => {
    const nothing = { stats: { expected: 0, unexpected: 0, flaky: 0, skipped: 2 }, errors: [] };
    expect(countSuite(countPlaywright, nothing, 0)).toEqual({ passed: 0, failed: 1, skipped: 2 });
  });

  test('has failed when it ended badly although every test passed', () => {
    expect(countSuite(countPlaywright, playwright, 137)).toEqual({ passed: 4, failed: 1, skipped: 0 });
  });
});

describe('the last line', () => {
  test('is the sum of all suites', () => {
    const sum = sumCounts([countExitCode(0), countExitCode(1), { passed: 40, failed: 2, skipped: 0 }]);
    expect(countsLine(sum)).toBe('41 passed, 3 failed');
  });

  test('names skipped tests only when there are some', () => {
    expect(countsLine({ passed: 1, failed: 0, skipped: 2 })).toBe('1 passed, 0 failed, 2 skipped');
  });
});
