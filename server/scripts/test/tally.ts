/** How many things passed and failed: tests of a runner, or one for a step that has no tests of its own. */
export interface Tally {
  readonly passed: number;
  readonly failed: number;
}

export const NOTHING: Tally = { passed: 0, failed: 0 };

export function add(a: Tally, b: Tally): Tally {
  return { passed: a.passed + b.passed, failed: a.failed + b.failed };
}

/** A step without tests of its own counts as one. */
export function tallyOfExit(exitCode: number): Tally {
  return exitCode === 0 ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 };
}

/**
 * Reads jest's JSON report. A suite that could not run, and a run without a report or without a test, is a failure:
 * silence must not look like success.
 */
export function tallyOfJest(report: unknown, exitCode: number): Tally {
  const passed = numberAt(report, 'numPassedTests');
  const failed = numberAt(report, 'numFailedTests') + numberAt(report, 'numRuntimeErrorTestSuites');
  return notSilent({ passed, failed }, exitCode);
}

/** Reads Playwright's JSON report; a flaky test counts as failed, for it did fail once. */
export function tallyOfPlaywright(report: unknown, exitCode: number): Tally {
  const stats = isRecord(report) ? report['stats'] : undefined;
  const passed = numberAt(stats, 'expected');
  const failed = numberAt(stats, 'unexpected') + numberAt(stats, 'flaky') + numberAt(stats, 'skipped');
  return notSilent({ passed, failed }, exitCode);
}

function notSilent(tally: Tally, exitCode: number): Tally {
  const silent = tally.failed === 0 && (exitCode !== 0 || tally.passed === 0);
  return silent ? { passed: tally.passed, failed: 1 } : tally;
}

function numberAt(value: unknown, key: string): number {
  const found = isRecord(value) ? value[key] : undefined;
  return typeof found === 'number' ? found : 0;
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}
