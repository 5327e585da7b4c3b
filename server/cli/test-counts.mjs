/**
 * What the JSON report of vitest holds of interest here; the names are vitest's.
 *
 * @typedef {object} VitestReport
 * @property {number} numPassedTests
 * @property {number} numFailedTests
 * @property {number} numPendingTests tests that were left out
 * @property {number} numTodoTests
 * @property {{ name: string, status: string, message?: string, assertionResults: { status: string }[] }[]} testResults
 */

/**
 * Counts a run of vitest so that nothing that went wrong counts as nothing: a file that does not load has no tests to
 * fail, an unhandled rejection belongs to no test, and a run of no tests at all proves nothing.
 *
 * @param {VitestReport | null} report null when vitest wrote none
 * @param {number} exitCode
 * @param {{ whole: boolean }} options whole: nobody asked for a part, so a test that was not run is a failure too
 * @returns {{ passed: number, failed: number, notes: string[] }}
 */
export function countVitest(report, exitCode, { whole }) {
  if (!report)
    return { passed: 0, failed: 1, notes: [`vitest ended with code ${exitCode} and wrote no report`] }
  const notes = []
  const passed = report.numPassedTests
  let failed = report.numFailedTests
  for (const file of report.testResults) {
    if (file.status !== 'failed' || file.assertionResults.some((test) => test.status === 'failed')) continue
    failed += 1
    notes.push(`${file.name} failed outside of its tests`)
  }
  const notRun = report.numPendingTests + report.numTodoTests
  if (notRun > 0) {
    notes.push(`${notRun} not run`)
    if (whole) failed += notRun
  }
  if (exitCode !== 0 && failed === 0) {
    failed = 1
    notes.push(
      `vitest ended with code ${exitCode} though no test failed: see its output for an unhandled error`,
    )
  }
  if (passed === 0 && failed === 0) {
    failed = 1
    notes.push('no test was run')
  }
  return { passed, failed, notes }
}

/** Whether a lock file names no host to download from, so that it serves behind any registry. @param {string} lock */
export function lockNamesNoHost(lock) {
  return lock.includes('"integrity"') && !lock.includes('"resolved"')
}
