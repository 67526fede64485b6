import { existsSync, readFileSync } from "node:fs";

/**
 * @typedef {object} Tally
 * @property {number} passed
 * @property {number} failed
 * @property {number} skipped
 */

/**
 * Counts vitest's JSON report. A file that could not even be loaded, a run that failed without a failed test (an unhandled
 * error, a crash) and a run without any test each count as one failure.
 * @param {string} file
 * @param {string | undefined} fault how the run itself ended
 * @returns {Tally}
 */
export function countVitest(file, fault) {
  const report = readReport(file);
  if (!report) return crashed();
  /** @type {{ status: string, assertionResults: { status: string }[] }[]} */
  const files = report.testResults;
  const tests = files.flatMap((one) => one.assertionResults.map((test) => test.status));
  const passed = tests.filter((status) => status === "passed").length;
  const failedTests = tests.filter((status) => status === "failed").length;
  const unloaded = files.filter(
    (one) => one.status === "failed" && !one.assertionResults.some((test) => test.status === "failed"),
  );
  return settle({ passed, failed: failedTests + unloaded.length, skipped: tests.length - passed - failedTests }, fault);
}

/**
 * Counts Playwright's JSON report. A test that passed only when repeated counts as failed.
 * @param {string} file
 * @param {string | undefined} fault
 * @returns {Tally}
 */
export function countPlaywright(file, fault) {
  const report = readReport(file);
  if (!report) return crashed();
  const { expected, unexpected, flaky, skipped } = report.stats;
  return settle({ passed: expected, failed: unexpected + flaky, skipped }, fault);
}

/** @returns {Tally} */
export function crashed() {
  return { passed: 0, failed: 1, skipped: 0 };
}

/**
 * @param {Tally} tally
 * @param {string | undefined} fault
 * @returns {Tally}
 */
function settle(tally, fault) {
  const isSilentFailure = tally.failed === 0 && (fault !== undefined || tally.passed === 0);
  return isSilentFailure ? { ...tally, failed: 1 } : tally;
}

/** @param {string} file */
function readReport(file) {
  if (!existsSync(file)) return undefined;
  try {
    return JSON.parse(readFileSync(file, "utf8"));
  } catch {
    return undefined;
  }
}
