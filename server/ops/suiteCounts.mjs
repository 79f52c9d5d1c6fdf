/**
 * How many tests a vitest run passed and failed, from its JSON report. A file that could not be loaded counts as one
 * failed test: its tests were never seen.
 *
 * @returns {{ passed: number, failed: number, skipped: number }}
 */
export function countVitest(report) {
  const unloaded = report.testResults.filter(
    ({ status, assertionResults }) => status === 'failed' && !assertionResults.some((test) => test.status === 'failed'),
  ).length
  const failed = report.numFailedTests + unloaded
  return {
    passed: report.numPassedTests,
    failed: failed === 0 && !report.success ? 1 : failed,
    skipped: report.numPendingTests + report.numTodoTests,
  }
}

/** The same from a Playwright report; a test that passed only when tried again has passed. */
export function countPlaywright({ stats, errors }) {
  return { passed: stats.expected + stats.flaky, failed: stats.unexpected + errors.length, skipped: stats.skipped }
}

/** The line that ends a run. */
export function closingLine(counts) {
  const sum = (name) => counts.reduce((total, count) => total + count[name], 0)
  const skipped = sum('skipped')
  return `${sum('passed')} passed, ${sum('failed')} failed${skipped > 0 ? `, ${skipped} skipped` : ''}`
}
