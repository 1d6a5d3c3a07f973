/**
 * @typedef {{ passed: number, failed: number, skipped: number }} Counts
 */

/** A runner that left no readable result. @type {Counts} */
const crashed = { passed: 0, failed: 1, skipped: 0 }

/**
 * Results of Vitest's JSON reporter. A file that could not be loaded counts as one failure, and so does an exit code
 * that the results do not explain.
 * @param {string | undefined} text undefined where there is no file
 * @param {number} code exit code of the runner
 * @returns {Counts}
 */
export function countVitest(text, code) {
  const result = parse(text)
  if (result === undefined) return crashed
  const brokenFiles = result.testResults.filter((/** @type {{ status: string, assertionResults: { status: string }[] }} */ file) =>
    file.status === 'failed' && file.assertionResults.every((test) => test.status !== 'failed')).length
  return explained({
    passed: result.numPassedTests,
    failed: result.numFailedTests + brokenFiles,
    skipped: result.numPendingTests + result.numTodoTests,
  }, code)
}

/**
 * Results of Playwright's JSON reporter. A test that passed only when tried again counts as failed.
 * @param {string | undefined} text undefined where there is no file
 * @param {number} code exit code of the runner
 * @returns {Counts}
 */
export function countPlaywright(text, code) {
  const result = parse(text)
  if (result === undefined) return crashed
  const { expected, unexpected, flaky, skipped } = result.stats
  return explained({ passed: expected, failed: unexpected + flaky, skipped }, code)
}

/** @param {readonly Counts[]} counts @returns {Counts} */
export function addCounts(counts) {
  const sum = (/** @type {keyof Counts} */ name) => counts.reduce((total, count) => total + count[name], 0)
  return { passed: sum('passed'), failed: sum('failed'), skipped: sum('skipped') }
}

/** @param {Counts} counts */
export function countsLine({ passed, failed, skipped }) {
  return `${passed} passed, ${failed} failed, ${skipped} skipped`
}

/** @param {string | undefined} text */
function parse(text) {
  try {
    return text === undefined ? undefined : JSON.parse(text)
  } catch {
    return undefined
  }
}

/** @param {Counts} counts @param {number} code @returns {Counts} */
function explained(counts, code) {
  return code !== 0 && counts.failed === 0 ? { ...counts, failed: 1 } : counts
}
