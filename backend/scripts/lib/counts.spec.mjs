import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { countReport, countReportFile, countTap, sum } from './counts.mjs';

const file = (name, status, ...tests) => ({ name, status, assertionResults: tests.map((one) => ({ title: one, status: one })) });

describe('counting tests', () => {
  it('adds up what passed and failed', () => {
    const report = { testResults: [file('a', 'passed', 'passed', 'passed'), file('b', 'failed', 'failed', 'passed')] };
    assert.deepEqual(countReport(report, 1), { passed: 3, failed: 1, remarks: [] });
  });

  it('counts a file that does not load as a failure', () => {
    const { passed, failed, remarks } = countReport({ testResults: [file('a', 'passed', 'passed'), file('b', 'failed')] }, 1);
    assert.deepEqual({ passed, failed }, { passed: 1, failed: 1 });
    assert.match(remarks[0], /b$/);
  });

  it('counts a test that was left out as a failure', () => {
    for (const status of ['pending', 'skipped', 'todo', 'disabled']) {
      const { passed, failed } = countReport({ testResults: [file('a', 'passed', 'passed', status)] }, 0);
      assert.deepEqual({ passed, failed }, { passed: 1, failed: 1 }, status);
    }
  });

  it('counts a run of nothing, a missing report and an unexplained exit as failures', () => {
    assert.equal(countReport({ testResults: [] }, 0).failed, 1);
    assert.equal(countReportFile('/nowhere/report.json', 1).failed, 1);
    assert.deepEqual(countReport({ testResults: [file('a', 'passed', 'passed')] }, 1).failed, 1);
  });

  it('reads a TAP report of the Node test runner', () => {
    const tap = '# tests 5\n# suites 1\n# pass 3\n# fail 1\n# cancelled 0\n# skipped 1\n# todo 0\n';
    const { passed, failed } = countTap(tap, 1);
    assert.deepEqual({ passed, failed }, { passed: 3, failed: 2 });
    assert.equal(countTap('', 1).failed, 1);
  });

  it('sums steps', () => {
    assert.deepEqual(sum([{ passed: 1, failed: 0, remarks: ['a'] }, { passed: 2, failed: 3, remarks: [] }]), { passed: 3, failed: 3, remarks: ['a'] });
  });
});
