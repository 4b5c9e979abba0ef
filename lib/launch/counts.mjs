/** Adds up outcomes of steps, each { passed, failed, skipped }. */
export function addCounts(all) {
  const sum = { passed: 0, failed: 0, skipped: 0 };
  for (const counts of all) for (const key of Object.keys(sum)) sum[key] += counts[key];
  return sum;
}

export const closingLine = ({ passed, failed, skipped }) =>
  `${passed} passed, ${failed} failed, ${skipped} skipped`;

/** A step that is a single check. */
export const single = (ok) => ({ passed: ok ? 1 : 0, failed: ok ? 0 : 1, skipped: 0 });

/** Counts of a vitest JSON report; a run that ended badly without a failed test counts as one. */
export function vitestCounts(report, code) {
  if (!report) return single(false);
  const failed = report.numFailedTests;
  return {
    passed: report.numPassedTests,
    failed: failed === 0 && (code !== 0 || report.numTotalTests === 0) ? 1 : failed,
    skipped: report.numPendingTests + report.numTodoTests,
  };
}

/** Counts of a Playwright JSON report; a flaky test is not a passed one. */
export function playwrightCounts(report, code) {
  if (!report) return single(false);
  const { expected, unexpected, flaky, skipped } = report.stats;
  const failed = unexpected + flaky;
  return {
    passed: expected,
    failed: failed === 0 && (code !== 0 || expected === 0) ? 1 : failed,
    skipped,
  };
}
