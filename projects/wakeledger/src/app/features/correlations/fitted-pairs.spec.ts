import type { CorrelationPair } from '#shared/contracts/correlations';
import { bandAt, fittedPairs, noticeableDistance } from './fitted-pairs';

const pair = (dragAreaM2: number, referenceDragAreaM2: number, change: Partial<CorrelationPair> = {}) => ({
  geometry: `Body ${dragAreaM2}`,
  dragAreaM2,
  uM2: 0.004,
  referenceDragAreaM2,
  referenceUM2: 0.003,
  ...change,
});
const RISING = [0.5, 0.55, 0.6, 0.65, 0.7].map((x) => pair(x, 0.01 + x));
const codeOf = (pairs: readonly CorrelationPair[]): string => {
  const fitted = fittedPairs(pairs);
  return fitted.kind === 'refused' ? fitted.code : 'fitted';
};

describe('the line through pairs', () => {
  it('leaves out what was left out, and keeps each pair’s place in the list', () => {
    const fitted = fittedPairs([pair(0.9, 0.2, { leftOutReason: 'Wet floor' }), ...RISING]);
    expect(fitted.kind).toBe('fitted');
    if (fitted.kind !== 'fitted') return;
    expect(fitted.used.map(({ place }) => place)).toEqual([1, 2, 3, 4, 5]);
    expect(fitted.leftOut).toHaveLength(1);
    expect(fitted.fit.slope).toBeCloseTo(1, 12);
  });

  it.each([
    [
      'a falling line',
      RISING.map((one) => ({ ...one, referenceDragAreaM2: 1.2 - one.dragAreaM2 })),
      'correlation-negative-slope',
    ],
    ['an uncertainty of zero', [...RISING, pair(0.8, 0.81, { referenceUM2: 0 })], 'uncertainty-zero'],
    ['one drag area for all', RISING.map((one) => ({ ...one, dragAreaM2: 0.6 })), 'correlation-no-spread'],
    ['two equal drag areas', [pair(0.6, 0.61), pair(0.6, 0.62)], 'correlation-no-spread'],
    ['a single pair', [pair(0.6, 0.61)], 'correlation-too-few-pairs'],
  ])('is refused with %s, before anything is saved', (_about, pairs, code) => {
    expect(codeOf(pairs)).toBe(code);
  });

  it('has a band that is narrowest at the centroid and holds level, slope and scatter', () => {
    const fitted = fittedPairs(
      RISING.map((one, i) => ({ ...one, referenceDragAreaM2: one.referenceDragAreaM2 + (i % 2) * 0.03 })),
    );
    if (fitted.kind !== 'fitted') throw new Error('a line was expected');
    const { fit } = fitted;
    const centre = bandAt(fit, fit.centroidM2);
    expect(centre.yM2).toBeCloseTo(fit.referenceCentroidM2, 12);
    expect(bandAt(fit, fit.validFromM2).halfWidthM2).toBeGreaterThan(centre.halfWidthM2);
    // Student's t at 0.97725 with 3 degrees of freedom: 3.307, printed in JCGM 100, table G.2, 95.45 %.
    expect(
      centre.halfWidthM2 / Math.hypot(fit.levelUncertaintyM2, fit.betweenPairsStandardDeviationM2),
    ).toBeCloseTo(3.31, 2);
  });

  it('takes a pair for noticeable by four over the number of pairs', () => {
    expect(noticeableDistance(8)).toBe(0.5);
  });
});
