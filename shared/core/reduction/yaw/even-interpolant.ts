/** Weighted harmonic mean of the slopes beside a node, 0 where they turn: Fritsch and Butland (1984), the scheme of SciPy. */
function innerSlope(hBefore: number, hAfter: number, before: number, after: number): number {
  if (!(before * after > 0)) return 0;
  const w1 = 2 * hAfter + hBefore;
  const w2 = hAfter + 2 * hBefore;
  return (w1 + w2) / (w1 / before + w2 / after);
}

/** One-sided three-point slope at an end, limited so that the shape is kept. */
function endSlope(hEnd: number, hNext: number, end: number, next: number): number {
  const slope = ((2 * hEnd + hNext) * end - hEnd * next) / (hEnd + hNext);
  if (Math.sign(slope) !== Math.sign(end)) return 0;
  if (Math.sign(end) !== Math.sign(next) && Math.abs(slope) > 3 * Math.abs(end)) return 3 * end;
  return slope;
}

const width = (x: readonly number[], i: number): number => (x[i + 1] as number) - (x[i] as number);

const secant = (x: readonly number[], y: readonly number[], i: number): number =>
  ((y[i + 1] as number) - (y[i] as number)) / width(x, i);

/** Slopes of the interpolant at its nodes, put into `slopes`: a sweep is interpolated again for each of its points. */
export function evenSlopesInto(slopes: number[], x: readonly number[], y: readonly number[]): void {
  const last = x.length - 1;
  slopes[0] = 0;
  for (let i = 1; i < last; i++) {
    slopes[i] = innerSlope(width(x, i - 1), width(x, i), secant(x, y, i - 1), secant(x, y, i));
  }
  slopes[last] = endSlope(
    width(x, last - 1),
    width(x, last - 2),
    secant(x, y, last - 1),
    secant(x, y, last - 2),
  );
}

/** The interpolant at a position, from nodes and slopes. */
export function evenValueAt(
  at: number,
  x: readonly number[],
  y: readonly number[],
  slopes: readonly number[],
): number {
  const position = Math.abs(at);
  const last = x.length - 1;
  let i = 0;
  while (i < last - 1 && position > (x[i + 1] as number)) i++;
  const h = width(x, i);
  const t = (position - (x[i] as number)) / h;
  const d0 = slopes[i] as number;
  const d1 = slopes[i + 1] as number;
  const m = secant(x, y, i);
  const c2 = 3 * m - 2 * d0 - d1;
  const c3 = d0 + d1 - 2 * m;
  return (y[i] as number) + h * t * (d0 + t * (c2 + t * c3));
}

/**
 * Shape-preserving cubic Hermite interpolation of an even function given at 0 = x_0 < x_1 < … < x_n, n ≥ 2: the values are
 * mirrored to −x, so the slope at 0 is 0. Slopes after Fritsch and Butland (SIAM J. Sci. Stat. Comput. 5 (1984) 300); the same
 * numbers as SciPy's PchipInterpolator on the mirrored nodes. No extrapolation: beyond x_n the answer is not defined.
 */
export function evenInterpolant(x: readonly number[], y: readonly number[]): (at: number) => number {
  const slopes: number[] = [];
  evenSlopesInto(slopes, x, y);
  return (at) => evenValueAt(at, x, y, slopes);
}
