/** Reads what the test runners report, and adds it up. */

/**
 * @typedef {{ passed: number, failed: number, skipped: number }} Totals
 */

/**
 * @param {{ testResults: { status: string, assertionResults: { status: string }[] }[] }} report of
 *   Vitest's JSON reporter
 * @returns {Totals} a file that could not be loaded counts as one failure
 */
export function fromVitest(report) {
  const counts = { passed: 0, failed: 0, skipped: 0 };
  for (const file of report.testResults) {
    const states = file.assertionResults.map((test) => test.status);
    counts.passed += states.filter((state) => state === 'passed').length;
    counts.failed += states.filter((state) => state === 'failed').length;
    counts.skipped += states.filter((state) => state !== 'passed' && state !== 'failed').length;
    if (file.status === 'failed' && !states.includes('failed')) counts.failed += 1;
  }
  return counts;
}

/**
 * @param {{ stats: { expected: number, unexpected: number, flaky: number, skipped: number },
 *   errors?: unknown[] }} report of Playwright's JSON reporter
 * @returns {Totals} an error outside a test counts as one failure
 */
export function fromPlaywright({ stats, errors = [] }) {
  return { passed: stats.expected, failed: stats.unexpected + stats.flaky + errors.length, skipped: stats.skipped };
}

/**
 * @param {string} report of Node's own TAP reporter
 * @returns {Totals}
 */
export function fromTap(report) {
  const count = (name) => Number(new RegExp(`^# ${name} (\\d+)$`, 'm').exec(report)?.[1] ?? 0);
  return {
    passed: count('pass'),
    failed: count('fail') + count('cancelled'),
    skipped: count('skipped') + count('todo'),
  };
}

/**
 * Makes sure that a runner that died, or had nothing to run, is not taken for a success.
 *
 * @param {Totals | undefined} totals undefined when there is no readable report
 * @param {number} code the runner's exit code
 * @returns {Totals & { problem?: string }}
 */
export function judge(totals, code) {
  if (!totals) return { passed: 0, failed: 1, skipped: 0, problem: `died without a report (code ${code})` };
  if (totals.passed + totals.failed + totals.skipped === 0) return { ...totals, failed: 1, problem: 'ran no test' };
  if (code !== 0 && totals.failed === 0) return { ...totals, failed: 1, problem: `ended with code ${code}` };
  return totals;
}

/**
 * @param {readonly Totals[]} all
 * @returns {Totals}
 */
export function sum(all) {
  const add = (key) => all.reduce((total, one) => total + one[key], 0);
  return { passed: add('passed'), failed: add('failed'), skipped: add('skipped') };
}

/**
 * @param {Totals} totals
 * @returns {string} such as `12 passed, 0 failed, 1 skipped`
 */
export const totalsLine = ({ passed, failed, skipped }) => `${passed} passed, ${failed} failed, ${skipped} skipped`;
