/** One drag-area axis, shared by all rows of a picture. */
export interface DragAxis {
  readonly from: number;
  readonly to: number;
  readonly ticks: readonly number[];
  /** Digits with which the ticks are written. */
  readonly digits: number;
}

const STEPS = [1, 2, 2.5, 4, 5, 10];

/**
 * An axis that holds all the values with a little air at both ends and round ticks. It does not begin at 0: the rows are
 * compared by where they lie, not by a length.
 */
export function dragAxis(values: Iterable<number>, wantedTicks = 7): DragAxis {
  let low = Infinity;
  let high = -Infinity;
  for (const value of values) {
    if (!Number.isFinite(value)) continue;
    low = Math.min(low, value);
    high = Math.max(high, value);
  }
  if (low > high) return dragAxis([0, 1], wantedTicks);
  if (high - low < 1e-9) return dragAxis([low - 0.01, high + 0.01], wantedTicks);

  const air = (high - low) * 0.06;
  const from = low - air;
  const to = high + air;
  const step = roundStep((to - from) / wantedTicks);
  const digits = Math.max(0, -Math.floor(Math.log10(step) + 1e-9) + (isWhole(step) ? 0 : 1));
  const ticks: number[] = [];
  for (let index = Math.ceil(from / step); index * step <= to; index++) {
    ticks.push(Number((index * step).toPrecision(12)));
  }
  return { from, to, ticks, digits };
}

function roundStep(raw: number): number {
  const power = 10 ** Math.floor(Math.log10(raw));
  const leading = STEPS.find((step) => step >= raw / power - 1e-9) ?? 10;
  return leading * power;
}

/** Whether the step's leading figure has no decimals of its own, as 2.5 has. */
function isWhole(step: number): boolean {
  const leading = step / 10 ** Math.floor(Math.log10(step) + 1e-9);
  return Math.abs(leading - Math.round(leading)) < 1e-9;
}

/** Where a value lies on the axis, as a percentage of its width. */
export function alongAxis(value: number, axis: Pick<DragAxis, 'from' | 'to'>): number {
  return ((value - axis.from) / (axis.to - axis.from)) * 100;
}
