/** Median of at least one number. */
function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? NaN;
}

function millisecondsOf(work: () => void): number {
  const start = performance.now();
  work();
  return performance.now() - start;
}

export interface SideBySide {
  readonly subjectMs: number;
  readonly yardstickMs: number;
  /** Median over the rounds of subject over yardstick. */
  readonly ratio: number;
}

/**
 * Times two pieces of work in turn, round by round, so that whatever else the machine does falls on both; medians. Both
 * are warmed up first: the compiler's own work is not measured.
 */
export function sideBySide(subject: () => void, yardstick: () => void, rounds = 31): SideBySide {
  for (let i = 0; i < 6; i++) {
    subject();
    yardstick();
  }
  const pairs = Array.from({ length: rounds }, () => ({
    yardstickMs: millisecondsOf(yardstick),
    subjectMs: millisecondsOf(subject),
  }));
  return {
    subjectMs: median(pairs.map((pair) => pair.subjectMs)),
    yardstickMs: median(pairs.map((pair) => pair.yardstickMs)),
    ratio: median(pairs.map((pair) => pair.subjectMs / pair.yardstickMs)),
  };
}
