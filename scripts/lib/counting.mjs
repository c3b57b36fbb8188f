/**
 * What one jest run came to, from its --json report: {passed, failed, notes}. Whatever keeps tests from
 * having run counts as failed: a suite that broke, a skipped test, no test at all, a bad exit code.
 */
export function countJest(report, exitCode) {
  if (!report) return { passed: 0, failed: 1, notes: ['jest left no report'] };
  const notes = [];
  const broken = report.numRuntimeErrorTestSuites ?? 0;
  const skipped = (report.numPendingTests ?? 0) + (report.numTodoTests ?? 0);
  let failed = report.numFailedTests + broken + skipped;
  if (broken > 0) notes.push(`${broken} suites could not run`);
  if (skipped > 0) notes.push(`${skipped} tests were skipped`);
  if (report.numPassedTests === 0 && failed === 0) {
    failed = 1;
    notes.push('no test ran');
  }
  if (exitCode !== 0 && failed === 0) {
    failed = 1;
    notes.push(`jest ended with code ${exitCode}`);
  }
  return { passed: report.numPassedTests, failed, notes };
}

/** The sum of all parts; `ok` only when something passed and nothing failed. */
export function total(results) {
  const passed = results.reduce((sum, result) => sum + result.passed, 0);
  const failed = results.reduce((sum, result) => sum + result.failed, 0);
  return { passed, failed, ok: failed === 0 && passed > 0 };
}

export function lastLine({ passed, failed }) {
  return `${passed} passed, ${failed} failed`;
}
