/** Counts tests from what the runners write, so that nothing that went wrong is left out of the sum. */
import { existsSync, readFileSync } from 'node:fs';

/** @typedef {{ passed: number, failed: number, remarks: string[] }} Count */

/** @type {(ok: boolean) => Count} a step that is one check */
export const single = (ok) => ({ passed: ok ? 1 : 0, failed: ok ? 0 : 1, remarks: [] });

/** @type {(remark: string) => Count} */
export const failure = (remark) => ({ passed: 0, failed: 1, remarks: [remark] });

/** @type {(counts: Count[]) => Count} */
export const sum = (counts) => ({
  passed: counts.reduce((total, one) => total + one.passed, 0),
  failed: counts.reduce((total, one) => total + one.failed, 0),
  remarks: counts.flatMap((one) => one.remarks),
});

/** A failed exit that no count explains, and a run of nothing, are failures too. */
function settle({ passed, failed, remarks }, exitCode) {
  if (passed + failed === 0) return failure('There are no tests here.');
  if (exitCode !== 0 && failed === 0) return { passed, failed: 1, remarks: [...remarks, `Every test passed, yet the runner ended with code ${exitCode}.`] };
  return { passed, failed, remarks };
}

/**
 * Reads the JSON report of jest or vitest (one form). A file that does not load counts as a failure, and so does a
 * test that was left out: nothing is skipped silently.
 * @param {any} report @param {number} exitCode @returns {Count}
 */
export function countReport(report, exitCode) {
  let passed = 0;
  let failed = 0;
  const remarks = [];
  for (const file of report.testResults ?? []) {
    const tests = file.assertionResults ?? [];
    const failedHere = tests.filter((test) => test.status === 'failed').length;
    const leftOut = tests.filter((test) => test.status !== 'failed' && test.status !== 'passed');
    passed += tests.length - failedHere - leftOut.length;
    failed += failedHere + leftOut.length;
    for (const test of leftOut) remarks.push(`Left out: ${test.fullName ?? test.title} (${file.name})`);
    if (file.status === 'failed' && failedHere === 0) {
      failed += 1;
      remarks.push(`Could not be run to its end: ${file.name}`);
    }
  }
  return settle({ passed, failed, remarks }, exitCode);
}

/** @param {string} file report of jest or vitest @param {number} exitCode @returns {Count} */
export function countReportFile(file, exitCode) {
  if (!existsSync(file)) return failure(`The runner ended with code ${exitCode} and left no report.`);
  return countReport(JSON.parse(readFileSync(file, 'utf8')), exitCode);
}

/**
 * Reads the closing lines of a TAP report of Node's own test runner.
 * @param {string} text @param {number} exitCode @returns {Count}
 */
export function countTap(text, exitCode) {
  const figure = (name) => Number(new RegExp(`^# ${name} (\\d+)$`, 'm').exec(text)?.[1] ?? 0);
  const leftOut = figure('skipped') + figure('todo') + figure('cancelled');
  const remarks = leftOut > 0 ? [`${leftOut} left out or cut short.`] : [];
  return settle({ passed: figure('pass'), failed: figure('fail') + leftOut, remarks }, exitCode);
}
