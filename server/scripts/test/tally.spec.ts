import { add, tallyOfExit, tallyOfJest, tallyOfPlaywright } from './tally';

describe('the tally of a test run', () => {
  it('counts the tests of a jest report', () => {
    expect(tallyOfJest({ numPassedTests: 7, numFailedTests: 2, numRuntimeErrorTestSuites: 1 }, 1)).toEqual({
      passed: 7,
      failed: 3,
    });
  });

  it('counts a flaky or skipped browser test as failed', () => {
    const report = { stats: { expected: 5, unexpected: 0, flaky: 1, skipped: 1 } };
    expect(tallyOfPlaywright(report, 0)).toEqual({ passed: 5, failed: 2 });
  });

  it.each([
    ['no report', undefined, 0],
    ['a report without a test', { numPassedTests: 0, numFailedTests: 0 }, 0],
    ['an exit code that the report does not explain', { numPassedTests: 3, numFailedTests: 0 }, 1],
  ])('does not take %s for success', (_what, report, exitCode) => {
    expect(tallyOfJest(report, exitCode).failed).toBe(1);
  });

  it('counts a step without tests of its own as one', () => {
    expect(add(tallyOfExit(0), tallyOfExit(2))).toEqual({ passed: 1, failed: 1 });
  });
});
