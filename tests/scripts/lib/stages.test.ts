import { expect, it } from 'vitest';
import { tallyOf } from '../../../scripts/lib/stages';

const report = { numPassedTests: 7, numFailedTests: 0, numFailedTestSuites: 0, success: true };

it('counts the tests of a stage', () => {
  expect(tallyOf(report, 0)).toEqual({ passed: 7, failed: 0 });
  expect(tallyOf({ ...report, numFailedTests: 2, success: false }, 1)).toEqual({ passed: 7, failed: 2 });
});

it('counts a stage that broke without a failed test as one failure', () => {
  expect(tallyOf(null, 1)).toEqual({ passed: 0, failed: 1 });
  expect(tallyOf({ ...report, numFailedTestSuites: 1 }, 0)).toEqual({ passed: 7, failed: 1 });
  expect(tallyOf(report, 1)).toEqual({ passed: 7, failed: 1 });
});
