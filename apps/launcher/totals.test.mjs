import assert from 'node:assert/strict';
import { describe, test } from 'node:test';
import { fromPlaywright, fromTap, fromVitest, judge, sum, totalsLine } from './totals.mjs';

describe('totals', () => {
  test('Vitest: a file that could not be loaded counts as a failure', () => {
    const report = {
      testResults: [
        { status: 'passed', assertionResults: [{ status: 'passed' }, { status: 'skipped' }, { status: 'todo' }] },
        { status: 'failed', assertionResults: [{ status: 'failed' }, { status: 'passed' }] },
        { status: 'failed', assertionResults: [] },
      ],
    };
    assert.deepEqual(fromVitest(report), { passed: 2, failed: 2, skipped: 2 });
  });

  test('Playwright: flaky tests and errors outside tests are failures', () => {
    const stats = { expected: 3, unexpected: 1, flaky: 1, skipped: 2 };
    assert.deepEqual(fromPlaywright({ stats, errors: [{}] }), { passed: 3, failed: 3, skipped: 2 });
  });

  test('Node: reads the closing comments of TAP', () => {
    const report = 'ok 1 - a\n# tests 6\n# suites 1\n# pass 2\n# fail 1\n# cancelled 1\n# skipped 1\n# todo 1\n';
    assert.deepEqual(fromTap(report), { passed: 2, failed: 2, skipped: 2 });
  });

  test('a runner without a report, without tests, or with a bad end is no success', () => {
    assert.equal(judge(undefined, 0).failed, 1);
    assert.equal(judge({ passed: 0, failed: 0, skipped: 0 }, 0).failed, 1);
    assert.equal(judge({ passed: 5, failed: 0, skipped: 0 }, 1).failed, 1);
    assert.deepEqual(judge({ passed: 5, failed: 0, skipped: 1 }, 0), { passed: 5, failed: 0, skipped: 1 });
  });

  test('sums up in one line', () => {
    const parts = [
      { passed: 1, failed: 0, skipped: 2 },
      { passed: 10, failed: 1, skipped: 0 },
    ];
    assert.equal(totalsLine(sum(parts)), '11 passed, 1 failed, 2 skipped');
  });
});
