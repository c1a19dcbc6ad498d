/** A quarter of the numbers lie below it. */
function lowerQuartile(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 4)] ?? NaN;
}

function millisecondsOf(work: () => void): number {
  const start = performance.now();
  work();
  return performance.now() - start;
}

export interface SideBySide {
  readonly subjectMs: number;
  readonly yardstickMs: number;
  /** Subject over yardstick. */
  readonly ratio: number;
}

/**
 * Times two pieces of work in turn, so that whatever else the machine does falls on both, and compares their lower
 * quartiles: what slows a round down from outside is never part of the work. Both are warmed up first: the compiler's own
 * work is not measured.
 */
export function sideBySide(subject: () => void, yardstick: () => void, rounds = 60): SideBySide {
  for (let i = 0; i < 15; i++) {
    subject();
    yardstick();
  }
  const subjectTimes: number[] = [];
  const yardstickTimes: number[] = [];
  for (let round = 0; round < rounds; round++) {
    yardstickTimes.push(millisecondsOf(yardstick));
    subjectTimes.push(millisecondsOf(subject));
  }
  const subjectMs = lowerQuartile(subjectTimes);
  const yardstickMs = lowerQuartile(yardstickTimes);
  return { subjectMs, yardstickMs, ratio: subjectMs / yardstickMs };
}
