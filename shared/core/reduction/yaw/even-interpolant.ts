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

/**
 * Shape-preserving cubic Hermite interpolation of an even function given at 0 = x_0 < x_1 < … < x_n, n ≥ 2: the values are
 * mirrored to −x, so the slope at 0 is 0. Slopes after Fritsch and Butland (SIAM J. Sci. Stat. Comput. 5 (1984) 300); the same
 * numbers as SciPy's PchipInterpolator on the mirrored nodes. No extrapolation: beyond x_n the answer is not defined.
 */
export function evenInterpolant(x: readonly number[], y: readonly number[]): (at: number) => number {
  const last = x.length - 1;
  const width = (i: number): number => (x[i + 1] as number) - (x[i] as number);
  const secant = (i: number): number => ((y[i + 1] as number) - (y[i] as number)) / width(i);
  const slopes = x.map((_, i) => {
    if (i === 0) return 0;
    if (i === last) return endSlope(width(i - 1), width(i - 2), secant(i - 1), secant(i - 2));
    return innerSlope(width(i - 1), width(i), secant(i - 1), secant(i));
  });
  return (at) => {
    const position = Math.abs(at);
    let i = 0;
    while (i < last - 1 && position > (x[i + 1] as number)) i++;
    const h = width(i);
    const t = (position - (x[i] as number)) / h;
    const d0 = slopes[i] as number;
    const d1 = slopes[i + 1] as number;
    const m = secant(i);
    const c2 = 3 * m - 2 * d0 - d1;
    const c3 = d0 + d1 - 2 * m;
    return (y[i] as number) + h * t * (d0 + t * (c2 + t * c3));
  };
}
