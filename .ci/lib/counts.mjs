import { existsSync, readFileSync } from 'node:fs';

/**
 * @typedef {{ passed: number, failed: number, skipped: number }} Counts
 */

/** @param {string} file */
function readReport(file) {
  return existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null;
}

/**
 * A run that ended badly has at least one failure, and a run without a test has tested nothing.
 * @param {Counts} counts
 * @param {number} code
 * @returns {Counts}
 */
export function honest(counts, code) {
  const nothing = counts.passed + counts.failed === 0;
  return counts.failed === 0 && (code !== 0 || nothing) ? { ...counts, failed: 1 } : counts;
}

/**
 * A file that did not even load holds no test in the report: it counts as one failure.
 * @param {{ numPassedTests: number, numFailedTests: number, numPendingTests: number, numTodoTests: number,
 *   testResults: { status: string, assertionResults: { status: string }[] }[] } | null} report
 * @param {number} code
 */
export function countVitest(report, code) {
  if (report === null) return honest({ passed: 0, failed: 0, skipped: 0 }, 1);
  const unloaded = report.testResults.filter(
    ({ status, assertionResults }) => status === 'failed' && !assertionResults.some((each) => each.status === 'failed'),
  );
  const counts = {
    passed: report.numPassedTests,
    failed: report.numFailedTests + unloaded.length,
    skipped: report.numPendingTests + report.numTodoTests,
  };
  return honest(counts, code);
}

/**
 * @param {{ stats: { expected: number, unexpected: number, flaky: number, skipped: number } } | null} report
 * @param {number} code
 */
export function countPlaywright(report, code) {
  if (report === null) return honest({ passed: 0, failed: 0, skipped: 0 }, 1);
  const { expected, unexpected, flaky, skipped } = report.stats;
  return honest({ passed: expected, failed: unexpected + flaky, skipped }, code);
}

/** @param {string} file @param {number} code */
export const readVitest = (file, code) => countVitest(readReport(file), code);
/** @param {string} file @param {number} code */
export const readPlaywright = (file, code) => countPlaywright(readReport(file), code);
