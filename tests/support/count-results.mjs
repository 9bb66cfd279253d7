// From what a suite reported to how many of its tests passed, failed and were skipped.

/** A suite that is one test: it passed when its program ended well. */
export function countExitCode(code) {
  return code === 0 ? { passed: 1, failed: 0, skipped: 0 } : { passed: 0, failed: 1, skipped: 0 };
}

/** Counts a report of Vitest's json reporter. A file that failed before its first test counts as one failed. */
export function countVitest(report) {
  const brokenFiles = report.testResults.filter(
    (file) => file.status === 'failed' && !file.assertionResults.some((test) => test.status === 'failed'),
  );
  return {
    passed: report.numPassedTests,
    failed: report.numFailedTests + brokenFiles.length,
    skipped: report.numPendingTests + report.numTodoTests,
  };
}

/** Counts a report of Playwright's json reporter. A test that passed only when tried again has failed. */
export function countPlaywright({ stats, errors }) {
  return {
    passed: stats.expected,
    failed: stats.unexpected + stats.flaky + errors.length,
    skipped: stats.skipped,
  };
}

/**
 * What a suite counts for. One that left no report, ended badly without a failed test, or ran no test at
 * all, has one failed test more: silence is never a pass.
 *
 * @param count a function from the report to its counts
 * @param report the parsed report, or null when there is none
 */
export function countSuite(count, report, exitCode) {
  const counted = report === null ? { passed: 0, failed: 0, skipped: 0 } : count(report);
  const ranNothing = counted.passed + counted.failed === 0;
  const endedBadly = exitCode !== 0 && counted.failed === 0;
  return ranNothing || endedBadly ? { ...counted, failed: counted.failed + 1 } : counted;
}

/** The sum of the counts of all suites. */
export function sumCounts(counts) {
  return counts.reduce(
    (sum, each) => ({
      passed: sum.passed + each.passed,
      failed: sum.failed + each.failed,
      skipped: sum.skipped + each.skipped,
    }),
    { passed: 0, failed: 0, skipped: 0 },
  );
}

/** The last line of `npm test`. */
export function countsLine({ passed, failed, skipped }) {
  return `${passed} passed, ${failed} failed${skipped > 0 ? `, ${skipped} skipped` : ''}`;
}
