import { describe, expect, test } from 'vitest';
import { countPlaywright, countVitest } from '../../.ci/lib/counts.mjs';

const report = (
  passed: number,
  failed: number,
  files: { status: string; assertionResults: { status: string }[] }[] = [],
) => ({
  numPassedTests: passed,
  numFailedTests: failed,
  numPendingTests: 0,
  numTodoTests: 0,
  testResults: files,
});
const stats = (expected: number, unexpected = 0, flaky = 0, skipped = 0) => ({
  stats: { expected, unexpected, flaky, skipped },
});

describe('counts of vitest', () => {
  test('passed and failed tests', () => {
    expect(countVitest(report(7, 0), 0)).toMatchObject({ passed: 7, failed: 0 });
    expect(
      countVitest(report(7, 2, [{ status: 'failed', assertionResults: [{ status: 'failed' }] }]), 1),
    ).toMatchObject({
      passed: 7,
      failed: 2,
    });
  });

  test('a file that does not load is a failure', () => {
    expect(countVitest(report(7, 0, [{ status: 'failed', assertionResults: [] }]), 1).failed).toBe(1);
  });

  test('a bad end without a failed test is a failure, and so is no report', () => {
    expect(countVitest(report(7, 0), 1)).toMatchObject({ passed: 7, failed: 1 });
    expect(countVitest(null, 0).failed).toBe(1);
  });

  test('no test at all is a failure', () => {
    expect(countVitest(report(0, 0), 0).failed).toBe(1);
  });
});

describe('counts of playwright', () => {
  test('passed, failed and flaky', () => {
    expect(countPlaywright(stats(5), 0)).toEqual({ passed: 5, failed: 0, skipped: 0 });
    expect(countPlaywright(stats(5, 1, 1, 3), 1)).toEqual({ passed: 5, failed: 2, skipped: 3 });
  });

  test('nothing run, or a bad end, is a failure', () => {
    expect(countPlaywright(stats(0), 0).failed).toBe(1);
    expect(countPlaywright(stats(0, 0, 0, 4), 0).failed).toBe(1);
    expect(countPlaywright(stats(5), 1).failed).toBe(1);
    expect(countPlaywright(null, 1).failed).toBe(1);
  });
});
